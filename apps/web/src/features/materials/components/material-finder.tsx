import { chakra } from '@chakra-ui/react';
import { type ReactNode, useEffect, useState } from 'react';
import { Button } from '../../../components/button';
import { EmptyState } from '../../../components/empty-state';
import { ActiveFilters, Facets } from '../../../components/facets';
import { TextField } from '../../../components/field';
import { FindIcon } from '../../../components/icons';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonTable } from '../../../components/skeletons';
import { formatCount } from '../../../lib/format';
import { type MaterialFilter, useMaterialFacets, useMaterials } from '../materials.api';
import { MaterialTable } from './material-table';

/** Long enough that a word is typed, short enough to feel at once. */
const TYPING_PAUSE_MS = 250;

export type MaterialFinderProps = {
  /** From the address. */
  filter: MaterialFilter;
  onFilter: (filter: MaterialFilter) => void;
  addButton: ReactNode;
};

/** The materials of the shop with facets by family; what is chosen lives in the address. */
export function MaterialFinder({ filter, onFilter, addButton }: MaterialFinderProps) {
  const { data, error, mutate } = useMaterials(filter);
  const { data: counts } = useMaterialFacets();
  const families = (counts?.families ?? []).map(({ family, label, count }) => ({ value: family, label, count }));
  const facets = [{ key: 'family', title: 'Family', values: families }];
  const chosen = { family: filter.family ?? [] };
  const isFiltered = (filter.family ?? []).length > 0 || (filter.q ?? '') !== '';
  if (data !== undefined && data.items.length === 0 && !isFiltered && filter.archived !== true)
    return <NoMaterials addButton={addButton} onShowArchived={() => onFilter({ archived: true })} />;
  const handleFacets = (next: Readonly<Record<string, readonly string[]>>) => onFilter({ ...filter, family: next.family ?? [] });
  return (
    <chakra.div display="grid" gap="6" gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: '200px minmax(0, 1fr)' }} alignItems="start">
      <chakra.div display="grid" gap="4">
        <WordField words={filter.q ?? ''} onWords={(q) => onFilter({ ...filter, q })} />
        <FoldedOnPhone>
          <Facets facets={facets} chosen={chosen} onChange={handleFacets} />
        </FoldedOnPhone>
      </chakra.div>
      <chakra.div display="grid" gap="3" minW="0">
        <ActiveFilters facets={facets} chosen={chosen} onChange={handleFacets} onClear={() => onFilter({})} />
        <chakra.p role="status" fontSize="sm" color="fg.muted">
          {data !== undefined && `${formatCount(data.items.length, 'material')}${data.nextCursor === null ? '' : ' and more'}`}
        </chakra.p>
        {data === undefined && error === undefined && <SkeletonTable rows={6} label="Loading the materials" />}
        {data === undefined && error !== undefined && <ReadProblem problem={error} thing="the materials" onRetry={() => void mutate()} />}
        {data?.items.length === 0 && (
          <EmptyState
            kind="none-match"
            title="No material matches"
            actions={<Button onClick={() => onFilter({})}>Show all materials</Button>}
          >
            Take away a family, or search for fewer letters.
          </EmptyState>
        )}
        {data !== undefined && data.items.length > 0 && (
          <MaterialTable materials={data.items} label={filter.archived === true ? 'Archived materials' : 'Materials'} />
        )}
        <div>
          <Button kind="quiet" ml="-4" onClick={() => onFilter(filter.archived === true ? {} : { archived: true })}>
            {filter.archived === true ? 'Show the materials in use' : 'Show archived materials'}
          </Button>
        </div>
      </chakra.div>
    </chakra.div>
  );
}

function NoMaterials({ addButton, onShowArchived }: { addButton: ReactNode; onShowArchived: () => void }) {
  return (
    <EmptyState
      kind="none-yet"
      title="No material yet"
      actions={
        <>
          {addButton}
          <Button kind="quiet" onClick={onShowArchived}>
            Show archived materials
          </Button>
        </>
      }
    >
      Name what the shop marks, as it stands on the rack. Its family brings the cautions that belong to it; some families must never be
      marked, and then no coupon can be planned for them.
    </EmptyState>
  );
}

/** On a phone the families stand behind one tap, so that the list comes first. */
function FoldedOnPhone({ children }: { children: ReactNode }) {
  return (
    <>
      <chakra.details display={{ base: 'block', lg: 'none' }}>
        <chakra.summary py="2.5" fontWeight="semibold" cursor="pointer">
          Filter by family
        </chakra.summary>
        {children}
      </chakra.details>
      <chakra.div display={{ base: 'none', lg: 'block' }}>{children}</chakra.div>
    </>
  );
}

function WordField({ words, onWords }: { words: string; onWords: (words: string) => void }) {
  const [typed, setTyped] = useState(words);
  useEffect(() => setTyped(words), [words]);
  useEffect(() => {
    if (typed === words) return undefined;
    const timer = setTimeout(() => onWords(typed), TYPING_PAUSE_MS);
    return () => clearTimeout(timer);
  }, [typed, words, onWords]);
  return (
    <TextField
      name="q"
      type="search"
      label="Find a material"
      icon={<FindIcon />}
      autoComplete="off"
      value={typed}
      onChange={(event) => setTyped(event.currentTarget.value)}
    />
  );
}
