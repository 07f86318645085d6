import { chakra, Flex } from '@chakra-ui/react';
import { type FormEvent, useEffect, useRef, useState } from 'react';
import { useSearchParams } from 'react-router';
import { Button } from '../../../components/button';
import { FacetTray } from '../../../components/facet-tray';
import { ActiveFilters, type FacetChoice } from '../../../components/facets';
import { InputFrame } from '../../../components/field';
import { FindIcon } from '../../../components/icons';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonTable } from '../../../components/skeletons';
import { formatCount } from '../../../lib/format';
import { addressWith, choiceFromAddress, countChosen, facetsOf, filtersFromAddress, filterToDrop, withoutFilters } from '../recipe-filters';
import { type RecipeFilters, useRecipeCount, useRecipes } from '../recipes.api';
import { RecipeTable } from './recipe-table';
import { NoRecipeMatches, NoRecipesYet } from './recipes-empty';

const TYPING_PAUSE_MS = 250;

/** The list with its filters; all of its state stands in the address. */
export function RecipeList({ mayPlan }: { mayPlan: boolean }) {
  const [search, setSearch] = useSearchParams();
  const filters = filtersFromAddress(search);
  const chosen = choiceFromAddress(search);
  const { pages, error, retry, showMore, hasMore, isValidating } = useRecipes(filters);
  const first = pages?.[0];
  if (error !== undefined && first === undefined) return <ReadProblem problem={error} thing="the list of recipes" onRetry={retry} />;
  if (first === undefined) return <SkeletonTable label="Loading the recipes" />;
  if (first.facets.totalCount === 0) return <NoRecipesYet mayPlan={mayPlan} />;

  const facets = facetsOf(first.facets);
  const rows = (pages ?? []).flatMap(({ items }) => items);
  const { matchCount, totalCount } = first.facets;
  const handleChange = (next: FacetChoice) => setSearch(addressWith(search, next));
  const handleClear = () => setSearch(withoutFilters(search));
  const resultText =
    matchCount === totalCount
      ? `${formatCount(totalCount, 'recipe')}, those that need you first`
      : `${matchCount} of ${formatCount(totalCount, 'recipe')}`;
  return (
    <chakra.div display="grid" gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: '184px minmax(0, 1fr)' }} gap={{ base: '3', lg: '7' }}>
      <FacetTray facets={facets} chosen={chosen} onChange={handleChange} resultText={formatCount(matchCount, 'recipe')} />
      <chakra.section aria-label="Recipes" minW="0">
        <Flex gap="3" align="center" justify="space-between" wrap="wrap" mb="3">
          <SearchBox
            value={filters.q ?? ''}
            onSearch={(words) => {
              const next = new URLSearchParams(search);
              if (words === '') next.delete('q');
              else next.set('q', words);
              setSearch(next, { replace: true });
            }}
          />
          <chakra.span fontSize="sm" color="fg.muted" role="status">
            {resultText}
          </chakra.span>
        </Flex>
        <chakra.div mb={countChosen(chosen) > 0 ? '3' : '0'}>
          <ActiveFilters facets={facets} chosen={chosen} onChange={handleChange} onClear={handleClear} />
        </chakra.div>
        {rows.length === 0 ? (
          <NoMatch filters={filters} chosen={chosen} facets={facets} mayPlan={mayPlan} onChange={setSearch} search={search} />
        ) : (
          <RecipeTable recipes={rows} />
        )}
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

type NoMatchProps = {
  filters: RecipeFilters;
  chosen: FacetChoice;
  facets: ReturnType<typeof facetsOf>;
  mayPlan: boolean;
  search: URLSearchParams;
  onChange: (next: URLSearchParams) => void;
};

function NoMatch({ filters, chosen, facets, mayPlan, search, onChange }: NoMatchProps) {
  const words = filters.q ?? '';
  const withoutSearch = useRecipeCount(words === '' ? null : { ...filters, q: undefined });
  return (
    <NoRecipeMatches
      activeCount={countChosen(chosen) + (words === '' ? 0 : 1)}
      toDrop={filterToDrop(facets, chosen)}
      search={words}
      withoutSearch={withoutSearch}
      mayPlan={mayPlan}
      onDrop={(key) => onChange(addressWith(search, { ...chosen, [key]: [] }))}
      onDropSearch={() => {
        const next = new URLSearchParams(search);
        next.delete('q');
        onChange(next);
      }}
      onClear={() => onChange(withoutFilters(search))}
    />
  );
}

const Input = chakra('input', {
  base: { flex: '1', minW: '0', alignSelf: 'stretch', bg: 'transparent', outline: 'none !important', _placeholder: { color: 'fg.muted' } },
});

/** Results follow the typing; Enter does not wait. */
function SearchBox({ value, onSearch }: { value: string; onSearch: (words: string) => void }) {
  const [typed, setTyped] = useState(value);
  const latest = useRef(onSearch);
  latest.current = onSearch;
  useEffect(() => setTyped(value), [value]);
  useEffect(() => {
    if (typed.trim() === value) return undefined;
    const timer = setTimeout(() => latest.current(typed.trim()), TYPING_PAUSE_MS);
    return () => clearTimeout(timer);
  }, [typed, value]);
  const handleSubmit = (event: FormEvent) => {
    event.preventDefault();
    onSearch(typed.trim());
  };
  return (
    <chakra.form role="search" onSubmit={handleSubmit} width={{ base: 'full', sm: '300px' }}>
      <InputFrame>
        <chakra.span color="fg.muted" lineHeight="none">
          <FindIcon />
        </chakra.span>
        <Input
          type="search"
          aria-label="Code, material or effect"
          placeholder="Code, material or effect"
          value={typed}
          onChange={(event) => setTyped(event.currentTarget.value)}
        />
      </InputFrame>
    </chakra.form>
  );
}
