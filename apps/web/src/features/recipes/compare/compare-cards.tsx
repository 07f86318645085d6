import { chakra } from '@chakra-ui/react';
import { Panel } from '../../../components/page';
import { revisionName } from '../revision-words';
import { ColumnHead } from './column-head';
import { Change, type CompareTableProps } from './compare-table';
import { leftOutWords } from './comparison-view';
import { ReferenceChoice, WhyAndWho } from './reference-choice';

/** Below 600 px every row is a card with one line for each revision. */
export function CompareCards({ comparison, view, onReference, onRemove }: CompareTableProps) {
  const { revisions, referenceId } = comparison;
  const reference = revisions.find(({ id }) => id === referenceId);
  const nameOf = (revisionId: string) => {
    const revision = revisions.find(({ id }) => id === revisionId);
    return revision === undefined ? '' : revisionName(revision);
  };
  return (
    <chakra.div display={{ base: 'grid', sm: 'none' }} gap="3">
      <ReferenceChoice revisions={revisions} referenceId={referenceId} onReference={onReference} />
      {revisions.map((revision) => (
        <Panel key={revision.id} p="3" bg={revision.id === referenceId ? 'bg.subtle' : 'bg.panel'}>
          <ColumnHead revision={revision} reference={reference} onRemove={onRemove} />
          <chakra.div mt="2" fontSize="sm">
            <WhyAndWho revision={revision} />
          </chakra.div>
        </Panel>
      ))}
      {view.groups.map((group) => (
        <Panel key={group.key} px="4" py="3" aria-label={group.title}>
          <h2>{group.title}</h2>
          {group.rows
            .filter(({ isAside }) => !isAside)
            .map((row) => (
              <chakra.div key={row.key} borderTop="hairline" py="2" fontSize="sm" lineHeight="sm">
                <b>{row.label}</b> <chakra.span color="fg.muted">{row.unit}</chakra.span>
                {row.cells.map((cell) => (
                  <chakra.div
                    key={cell.revisionId}
                    display="grid"
                    gridTemplateColumns="minmax(0, 92px) minmax(0, 76px) minmax(0, 1fr)"
                    gap="2"
                    alignItems="center"
                    minHeight="28px"
                  >
                    <chakra.span color="fg.muted">{nameOf(cell.revisionId)}</chakra.span>
                    <chakra.span textAlign="end" fontWeight={cell.isMissing ? 'normal' : 'semibold'}>
                      {cell.text}
                    </chakra.span>
                    {cell.isReference ? <chakra.span color="fg.muted">the reference</chakra.span> : <Change cell={cell} />}
                  </chakra.div>
                ))}
              </chakra.div>
            ))}
        </Panel>
      ))}
      {view.hidden.length + view.unknown.length > 0 && (
        <chakra.p fontSize="sm" color="fg.muted">
          {leftOutWords(view)}
        </chakra.p>
      )}
    </chakra.div>
  );
}
