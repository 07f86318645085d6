import { chakra, Flex } from '@chakra-ui/react';
import { useSearchParams } from 'react-router';
import { Button } from '../../../components/button';
import { FacetTray } from '../../../components/facet-tray';
import { ActiveFilters, type Facet, type FacetChoice } from '../../../components/facets';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonTable } from '../../../components/skeletons';
import { formatCount } from '../../../lib/format';
import { useCouponFacets, useCoupons } from '../coupons.api';
import {
  addressWith,
  addressWithWords,
  choiceFromAddress,
  facetsOf,
  filtersFromAddress,
  filterToDrop,
  withoutFilters,
} from './coupon-filters';
import { CouponTable } from './coupon-table';
import { NoCouponMatches, NoCouponsYet } from './coupons-empty';
import { SearchBox } from './search-box';

/** The logbook with its filters; all of its state stands in the address. */
export function CouponList() {
  const [search, setSearch] = useSearchParams();
  const filters = filtersFromAddress(search);
  const chosen = choiceFromAddress(search);
  const { pages, error, retry, showMore, hasMore, isValidating } = useCoupons(filters);
  const facetRead = useCouponFacets(filters);
  const problem = error ?? facetRead.error;
  if (pages === undefined || facetRead.data === undefined) {
    if (problem !== undefined) return <ReadProblem problem={problem} thing="the list of coupons" onRetry={retry} />;
    return <SkeletonTable label="Loading the coupons" />;
  }
  const { matchCount, totalCount } = facetRead.data;
  if (totalCount === 0) return <NoCouponsYet />;

  const facets = facetsOf(facetRead.data);
  const rows = pages.flatMap(({ items }) => items);
  const handleChange = (next: FacetChoice) => setSearch(addressWith(search, next));
  return (
    <chakra.div display="grid" gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: '184px minmax(0, 1fr)' }} gap={{ base: '3', lg: '7' }}>
      <FacetTray facets={facets} chosen={chosen} onChange={handleChange} resultText={formatCount(matchCount, 'coupon')} />
      <chakra.section aria-label="Coupons" minW="0">
        <Flex gap="3" align="center" justify="space-between" wrap="wrap" mb="3">
          <SearchBox value={filters.q ?? ''} onSearch={(words) => setSearch(addressWithWords(search, words), { replace: true })} />
          <chakra.span fontSize="sm" color="fg.muted" role="status">
            {matchCount === totalCount
              ? `${formatCount(totalCount, 'coupon')}, newest first`
              : `${matchCount} of ${formatCount(totalCount, 'coupon')}`}
          </chakra.span>
        </Flex>
        <chakra.div mb={Object.values(chosen).some((values) => values.length > 0) ? '3' : '0'}>
          <ActiveFilters facets={facets} chosen={chosen} onChange={handleChange} onClear={() => setSearch(withoutFilters(search))} />
        </chakra.div>
        {rows.length === 0 ? <NoMatch facets={facets} chosen={chosen} /> : <CouponTable coupons={rows} />}
        {hasMore && rows.length > 0 && (
          <Flex justify="center" mt="4">
            <Button onClick={showMore} isBusy={isValidating}>
              Show more
            </Button>
          </Flex>
        )}
      </chakra.section>
    </chakra.div>
  );
}

function NoMatch({ facets, chosen }: { facets: readonly Facet[]; chosen: FacetChoice }) {
  const [search, setSearch] = useSearchParams();
  const { q = '', ...others } = filtersFromAddress(search);
  const withoutWords = useCouponFacets(q === '' ? null : others).data?.matchCount;
  return (
    <NoCouponMatches
      toDrop={filterToDrop(facets, chosen)}
      words={q}
      withoutWords={withoutWords}
      onDrop={(key) => setSearch(addressWith(search, { ...chosen, [key]: [] }))}
      onDropWords={() => setSearch(addressWithWords(search, ''))}
      onClear={() => setSearch(withoutFilters(search))}
    />
  );
}
