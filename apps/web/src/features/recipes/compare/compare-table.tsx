import { chakra } from '@chakra-ui/react';
import { Fragment, useState } from 'react';
import { ChangeTrack } from '../../../components/change-bar';
import { Panel } from '../../../components/page';
import type { Comparison } from '../recipes.api';
import { ColumnHead } from './column-head';
import { type CellView, type ComparisonView, leftOutWords, type RowView } from './comparison-view';
import { ReferenceChoice, WhyAndWho } from './reference-choice';

export type CompareTableProps = {
  comparison: Comparison;
  view: ComparisonView;
  onReference: (revisionId: string) => void;
  /** Absent while only two are compared. */
  onRemove: ((revisionId: string) => void) | undefined;
};

/** Revisions side by side from 600 px; the column that the others are compared with has a line on top and a tint. */
export function CompareTable({ comparison, view, onReference, onRemove }: CompareTableProps) {
  const { revisions, referenceId } = comparison;
  const reference = revisions.find(({ id }) => id === referenceId);
  return (
    <Panel overflowX="auto" display={{ base: 'none', sm: 'block' }} tabIndex={0} aria-label="Comparison">
      <chakra.table
        width="full"
        minW={`${220 + revisions.length * 260}px`}
        tableLayout="fixed"
        borderCollapse="separate"
        borderSpacing="0"
        fontSize="sm"
        lineHeight="sm"
      >
        <colgroup>
          <chakra.col width="220px" />
          {revisions.map(({ id }) => (
            <Fragment key={id}>
              <chakra.col width="104px" />
              <col />
            </Fragment>
          ))}
        </colgroup>
        <thead>
          <tr>
            <chakra.td p="5" verticalAlign="top" borderTop="3px solid transparent">
              <ReferenceChoice revisions={revisions} referenceId={referenceId} onReference={onReference} />
              <chakra.p mt="3" color="fg.muted">
                Bars: change in percent
              </chakra.p>
            </chakra.td>
            {revisions.map((revision) => (
              <chakra.th
                key={revision.id}
                scope="colgroup"
                colSpan={2}
                textAlign="start"
                fontWeight="normal"
                verticalAlign="top"
                p="3"
                pt="4"
                borderTop="3px solid"
                borderColor={revision.id === referenceId ? 'brand.solid' : 'transparent'}
                bg={revision.id === referenceId ? 'bg.subtle' : undefined}
              >
                <ColumnHead revision={revision} reference={reference} onRemove={onRemove} />
              </chakra.th>
            ))}
          </tr>
        </thead>
        {view.groups.map((group) => (
          <tbody key={group.key}>
            <tr>
              <GroupTitle span={1 + revisions.length * 2}>{group.title}</GroupTitle>
            </tr>
            <GroupRows rows={group.rows} span={1 + revisions.length * 2} />
          </tbody>
        ))}
        <tbody>
          <tr>
            <GroupTitle span={1 + revisions.length * 2}>Why, and who signed</GroupTitle>
          </tr>
          <tr>
            <chakra.td px="5" py="2.5" verticalAlign="top" color="fg.muted">
              Reason and approval
            </chakra.td>
            {revisions.map((revision) => (
              <chakra.td
                key={revision.id}
                colSpan={2}
                px="3"
                py="2.5"
                verticalAlign="top"
                bg={revision.id === referenceId ? 'bg.subtle' : undefined}
              >
                <WhyAndWho revision={revision} />
              </chakra.td>
            ))}
          </tr>
        </tbody>
      </chakra.table>
      {view.hidden.length + view.unknown.length > 0 && (
        <chakra.p px="5" py="2.5" fontSize="sm" lineHeight="sm" color="fg.muted" borderTop="hairline">
          {leftOutWords(view)}
        </chakra.p>
      )}
    </Panel>
  );
}

function GroupTitle({ span, children }: { span: number; children: string }) {
  return (
    <chakra.th
      scope="rowgroup"
      colSpan={span}
      textAlign="start"
      px="5"
      pt="3.5"
      pb="1.5"
      fontSize="md"
      fontWeight="semibold"
      borderBottom="hairline"
      borderColor="border.emphasized"
    >
      {children}
    </chakra.th>
  );
}

/** The numbers that are asked for, then one line that opens the others. */
function GroupRows({ rows, span }: { rows: readonly RowView[]; span: number }) {
  const [isOpen, setIsOpen] = useState(false);
  const asides = rows.filter(({ isAside }) => isAside).length;
  const shown = rows.filter(({ isAside }) => isOpen || !isAside);
  return (
    <>
      {shown.map((row) => (
        <Row key={row.key} row={row} />
      ))}
      {asides > 0 && (
        <tr>
          <chakra.td colSpan={span} px="5">
            <chakra.button
              type="button"
              aria-expanded={isOpen}
              onClick={() => setIsOpen(!isOpen)}
              minHeight={{ base: '44px', lg: '30px' }}
              color="brand.fg"
              textDecoration="underline"
              cursor="pointer"
            >
              {isOpen ? 'Fewer numbers' : `${asides} more numbers`}
            </chakra.button>
          </chakra.td>
        </tr>
      )}
    </>
  );
}

function Row({ row: { label, unit, cells } }: { row: RowView }) {
  return (
    <tr>
      <chakra.th scope="row" textAlign="start" fontWeight="normal" height="29px" px="5" borderBottom="hairline">
        {label} <chakra.span color="fg.muted">{unit}</chakra.span>
      </chakra.th>
      {cells.map((cell) => (
        <Fragment key={cell.revisionId}>
          <chakra.td
            textAlign="end"
            px="3"
            borderBottom="hairline"
            fontSize={cell.isMissing ? 'sm' : 'md'}
            fontWeight={cell.isMissing ? 'normal' : 'semibold'}
            color={cell.isMissing ? 'fg.muted' : undefined}
            whiteSpace="nowrap"
            bg={cell.isReference ? 'bg.subtle' : undefined}
          >
            {cell.text}
          </chakra.td>
          <chakra.td px="3" borderBottom="hairline" bg={cell.isReference ? 'bg.subtle' : undefined}>
            <Change cell={cell} />
          </chakra.td>
        </Fragment>
      ))}
    </tr>
  );
}

/** Bar and signed number; a word where there is no number. */
export function Change({ cell: { share, change } }: { cell: CellView }) {
  return (
    <chakra.span display="flex" alignItems="center" gap="2">
      {share !== undefined && (
        <chakra.span flex="0 1 84px" minWidth="32px">
          <ChangeTrack change={share} />
        </chakra.span>
      )}
      <chakra.span color={change === 'same' ? 'fg.muted' : undefined} whiteSpace="nowrap">
        {change}
      </chakra.span>
    </chakra.span>
  );
}
