import { chakra, Flex } from '@chakra-ui/react';
import { useEffect, useRef, useState } from 'react';
import { useSearchParams } from 'react-router';
import { Button } from '../../../components/button';
import { RemovableChip } from '../../../components/chip';
import { EmptyState } from '../../../components/empty-state';
import { InputFrame } from '../../../components/field';
import { FindIcon } from '../../../components/icons';
import { ReadProblem } from '../../../components/read-problem';
import { Segmented } from '../../../components/segmented';
import { SkeletonTable } from '../../../components/skeletons';
import { type RunFilters, useRuns } from '../runs.api';
import { RunTable } from './run-table';

const TYPING_PAUSE_MS = 250;
const STATES = [
  { value: 'all', label: 'All' },
  { value: 'started', label: 'Under way' },
  { value: 'finished', label: 'Finished' },
] as const;

/** What the list shows lives in the address. */
export function useRunFilters(): [RunFilters, (change: Partial<Record<keyof RunFilters, string | undefined>>) => void] {
  const [params, setParams] = useSearchParams();
  const filters: RunFilters = {};
  for (const key of ['q', 'state', 'kind', 'jobReference', 'recipeId'] as const) {
    const value = params.get(key);
    if (value !== null && value !== '') filters[key] = value;
  }
  const change = (next: Partial<Record<keyof RunFilters, string | undefined>>) => {
    const changed = new URLSearchParams(params);
    for (const [key, value] of Object.entries(next)) {
      if (value === undefined || value === '') changed.delete(key);
      else changed.set(key, value);
    }
    setParams(changed, { replace: true });
  };
  return [filters, change];
}

export function RunList() {
  const [filters, change] = useRunFilters();
  const [params] = useSearchParams();
  const { pages, error, retry, showMore, hasMore } = useRuns(filters);
  const runs = pages?.flatMap(({ items }) => items);
  const isFiltered = Object.keys(filters).length > 0;
  return (
    <chakra.div display="grid" gap="4" gridTemplateColumns="minmax(0, 1fr)">
      <Flex gap="3" wrap="wrap" align="center">
        <Search value={filters.q ?? ''} onSearch={(q) => change({ q })} />
        <Segmented
          size="glove"
          label="Which runs"
          choices={STATES}
          value={STATES.find(({ value }) => value === filters.state)?.value ?? 'all'}
          onChange={(state) => change({ state: state === 'all' ? undefined : state })}
        />
        {filters.recipeId !== undefined && (
          <RemovableChip label={`recipe ${params.get('recipe') ?? ''}`.trim()} onRemove={() => change({ recipeId: undefined })} />
        )}
        {filters.jobReference !== undefined && (
          <RemovableChip label={`job ${filters.jobReference}`} onRemove={() => change({ jobReference: undefined })} />
        )}
      </Flex>
      {runs === undefined ? (
        error === undefined ? (
          <SkeletonTable rows={8} label="Loading the runs" />
        ) : (
          <ReadProblem problem={error} thing="the runs" onRetry={retry} />
        )
      ) : runs.length === 0 ? (
        <NoRuns
          isFiltered={isFiltered}
          onClear={() => change({ q: undefined, state: undefined, kind: undefined, jobReference: undefined, recipeId: undefined })}
        />
      ) : (
        <>
          {filters.jobReference !== undefined && <JobTotals runs={runs} isWhole={!hasMore} />}
          <RunTable runs={runs} onJob={(jobReference) => change({ jobReference })} />
        </>
      )}
      {runs !== undefined && hasMore && (
        <Button size="glove" justifySelf="start" onClick={showMore}>
          Show more runs
        </Button>
      )}
    </chakra.div>
  );
}

/** What a customer who asks about a job wants to know first. */
function JobTotals({ runs, isWhole }: { runs: readonly { good: number; scrap: number }[]; isWhole: boolean }) {
  const sum = (of: 'good' | 'scrap') => runs.reduce((total, run) => total + run[of], 0);
  return (
    <p role="status">
      <b>{sum('good')} good</b>, {sum('scrap')} scrap in {runs.length} {runs.length === 1 ? 'run' : 'runs'}
      {isWhole ? '' : ' shown so far'}
    </p>
  );
}

function NoRuns({ isFiltered, onClear }: { isFiltered: boolean; onClear: () => void }) {
  if (isFiltered)
    return (
      <EmptyState
        kind="none-match"
        title="No run matches"
        actions={
          <Button size="glove" onClick={onClear}>
            Show all runs
          </Button>
        }
      >
        Take a word or a choice away.
      </EmptyState>
    );
  return (
    <EmptyState kind="none-yet" title="No runs yet">
      A run begins at the machine: find the approved setting, set up, and start it there. It keeps the job, the counts and what went wrong.
    </EmptyState>
  );
}

function Search({ value, onSearch }: { value: string; onSearch: (words: string) => void }) {
  const [typed, setTyped] = useState(value);
  const latest = useRef(onSearch);
  latest.current = onSearch;
  useEffect(() => setTyped(value), [value]);
  useEffect(() => {
    if (typed.trim() === value) return undefined;
    const timer = setTimeout(() => latest.current(typed.trim()), TYPING_PAUSE_MS);
    return () => clearTimeout(timer);
  }, [typed, value]);
  return (
    <chakra.div width={{ base: 'full', sm: '300px' }}>
      <InputFrame size="glove">
        <chakra.span color="fg.muted" lineHeight="none">
          <FindIcon />
        </chakra.span>
        <SearchInput
          type="search"
          aria-label="Find a run by code, job, part, lot or recipe"
          placeholder="Code, job, part, lot or recipe"
          value={typed}
          onChange={(event) => setTyped(event.currentTarget.value)}
        />
      </InputFrame>
    </chakra.div>
  );
}

const SearchInput = chakra('input', {
  base: {
    flex: '1',
    minW: '0',
    alignSelf: 'stretch',
    bg: 'transparent',
    outline: 'none !important',
    _placeholder: { color: 'fg.subtle', opacity: '1' },
  },
});
