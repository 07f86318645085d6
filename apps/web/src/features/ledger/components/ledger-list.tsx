import { chakra, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { useSearchParams } from 'react-router';
import { Button } from '../../../components/button';
import { RemovableChip } from '../../../components/chip';
import { Dialog } from '../../../components/dialog';
import { EmptyState } from '../../../components/empty-state';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonTable } from '../../../components/skeletons';
import { formatCount, formatDay } from '../../../lib/format';
import { wordsOf } from '../action-words';
import { type LedgerActor, type LedgerEvent, useLedger, useLedgerActors } from '../ledger.api';
import { addressWith, FILTER_NAMES, type FilterName, filtersFromAddress, type LedgerFilters, withoutFilters } from '../ledger-filters';
import { EventTable } from './event-table';
import { LedgerFiltersForm } from './ledger-filters-form';

/** What happened in the shop, newest first, narrowed by what stands in the address. */
export function LedgerList() {
  const [search, setSearch] = useSearchParams();
  const filters = filtersFromAddress(search);
  const { pages, error, isValidating, retry, showMore, hasMore } = useLedger(filters);
  const events = pages?.flatMap(({ items }) => items) ?? [];
  const setFilter = (name: FilterName, value: string) => setSearch(addressWith(search, name, value), { replace: true });
  return (
    <chakra.section aria-label="Events" display="grid" gap="3">
      <Filters filters={filters} onFilter={setFilter} onClear={() => setSearch(withoutFilters(search))} />
      {error !== undefined && <ReadProblem problem={error} thing="the ledger" onRetry={retry} />}
      {error === undefined && pages === undefined && <SkeletonTable label="Loading the ledger" />}
      {error === undefined && pages !== undefined && (
        <Found
          events={events}
          hasMore={hasMore}
          isFiltered={Object.keys(filters).length > 0}
          onClear={() => setSearch(withoutFilters(search))}
        />
      )}
      {hasMore && error === undefined && events.length > 0 && (
        <Flex justify="center">
          <Button onClick={showMore} isBusy={isValidating}>
            Show earlier events
          </Button>
        </Flex>
      )}
    </chakra.section>
  );
}

type FoundProps = { events: readonly LedgerEvent[]; hasMore: boolean; isFiltered: boolean; onClear: () => void };

function Found({ events, hasMore, isFiltered, onClear }: FoundProps) {
  if (events.length > 0) {
    return (
      <>
        <chakra.p role="status" fontSize="sm" color="fg.muted">
          {hasMore ? `The newest ${formatCount(events.length, 'event')}` : formatCount(events.length, 'event')}
        </chakra.p>
        <EventTable events={events} />
      </>
    );
  }
  if (!isFiltered) {
    return (
      <EmptyState kind="none-yet" title="Nothing has happened yet">
        Every plan, mark, rating, draft and signature will stand here, with who did it and when, and nobody can change it afterwards.
      </EmptyState>
    );
  }
  return (
    <EmptyState
      kind="none-match"
      title="No event matches"
      actions={
        <Button kind="primary" onClick={onClear}>
          Show every event
        </Button>
      }
    >
      Take a filter away, or look at a longer time.
    </EmptyState>
  );
}

type FiltersProps = { filters: LedgerFilters; onFilter: (name: FilterName, value: string) => void; onClear: () => void };

/** Open beside the list on a wide screen; on a phone they come up from a button. */
function Filters({ filters, onFilter, onClear }: FiltersProps) {
  const [isOpen, setIsOpen] = useState(false);
  const { data: actors } = useLedgerActors();
  const active = FILTER_NAMES.flatMap((name) => {
    const value = filters[name];
    return value === undefined ? [] : [{ name, label: filterWords(name, value, actors?.items ?? []) }];
  });
  return (
    <>
      <chakra.div display={{ base: 'none', sm: 'block' }}>
        <LedgerFiltersForm idPrefix="list" filters={filters} onFilter={onFilter} />
      </chakra.div>
      <chakra.div display={{ base: 'block', sm: 'none' }}>
        <Button onClick={() => setIsOpen(true)}>{active.length === 0 ? 'Filters' : `Filters, ${active.length} on`}</Button>
      </chakra.div>
      {isOpen && (
        <Dialog
          title="Filters"
          onClose={() => setIsOpen(false)}
          actions={
            <Button kind="primary" size="touch" shape="wide" onClick={() => setIsOpen(false)}>
              Show the events
            </Button>
          }
        >
          <LedgerFiltersForm idPrefix="dialog" filters={filters} onFilter={onFilter} />
        </Dialog>
      )}
      {active.length > 0 && (
        <Flex gap="2" wrap="wrap" align="center">
          {active.map(({ name, label }) => (
            <RemovableChip key={name} label={label} onRemove={() => onFilter(name, '')} />
          ))}
          <Button kind="quiet" onClick={onClear}>
            Clear all
          </Button>
        </Flex>
      )}
    </>
  );
}

function filterWords(name: FilterName, value: string, actors: readonly LedgerActor[]): string {
  switch (name) {
    case 'actorMemberId':
      return actors.find(({ memberId }) => memberId === value)?.name ?? 'one person';
    case 'action':
      return wordsOf(value).label;
    case 'subjectCode':
      return value;
    case 'subjectId':
      return 'one thing';
    case 'fromDay':
      return `from ${formatDay(value)}`;
    case 'toDay':
      return `to ${formatDay(value)}`;
  }
}
