import { couponLayout } from '@proofplate/imaging';
import { Button, ButtonLink } from '../../../components/button';
import { EmptyState } from '../../../components/empty-state';
import { PlusIcon } from '../../../components/icons';
import { Plate } from '../../../components/plate/plate';
import { formatCount } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import type { FilterToDrop } from '../recipe-filters';

const EMPTY_PLATE = couponLayout({ rows: 5, columns: 6, reference: 'C-0001' });

function PlanACoupon({ kind }: { kind: 'primary' | 'plain' }) {
  return (
    <ButtonLink kind={kind} to={paths.planCoupon} icon={<PlusIcon />}>
      Plan a coupon
    </ButtonLink>
  );
}

/** A shop without recipes: what one is, and the first act. */
export function NoRecipesYet({ mayPlan }: { mayPlan: boolean }) {
  return (
    <EmptyState
      kind="none-yet"
      title="No recipes yet"
      drawing={<Plate layout={EMPTY_PLATE} cells={{}} label="An empty plate" chosen="C4" />}
      actions={
        mayPlan ? (
          <>
            <PlanACoupon kind="primary" />
            <ButtonLink to={paths.newRecipe}>Add a recipe without a coupon</ButtonLink>
          </>
        ) : undefined
      }
      note={
        mayPlan
          ? 'A setting that the shop knows already begins as a draft. Nobody at a machine sees a setting before a lead has signed it.'
          : undefined
      }
    >
      {mayPlan
        ? 'A recipe is a setting that was proved on a coupon and signed by a lead. Mark a coupon, rate its cells, and draft the first recipe from the best one.'
        : 'A recipe is a setting that was proved on a coupon and signed by a lead. As soon as a lead has signed one, it stands here.'}
    </EmptyState>
  );
}

const COUNT_WORDS = ['', 'this', 'both', 'all three', 'all four', 'all five'];

export type NoRecipeMatchesProps = {
  /** Filters and words that are on. */
  activeCount: number;
  toDrop: FilterToDrop | undefined;
  search: string;
  /** Recipes that fit the filters without the words; undefined while that is not known. */
  withoutSearch: number | undefined;
  mayPlan: boolean;
  onDrop: (key: string) => void;
  onDropSearch: () => void;
  onClear: () => void;
};

/** Nothing fits: which filter to drop, and what that yields. */
export function NoRecipeMatches({
  activeCount,
  toDrop,
  search,
  withoutSearch,
  mayPlan,
  onDrop,
  onDropSearch,
  onClear,
}: NoRecipeMatchesProps) {
  const dropsSearch = search !== '' && (withoutSearch ?? 0) > (toDrop?.yields ?? 0);
  return (
    <EmptyState
      kind="none-match"
      title={`No recipe matches ${COUNT_WORDS[activeCount] ?? 'all of them'}`}
      actions={
        <>
          {dropsSearch && (
            <Button kind="primary" onClick={onDropSearch}>
              Drop “{search}”
            </Button>
          )}
          {!dropsSearch && toDrop !== undefined && (
            <Button kind="primary" onClick={() => onDrop(toDrop.key)}>
              Drop {toDrop.label}
            </Button>
          )}
          {!dropsSearch && toDrop === undefined && (
            <Button kind="primary" onClick={onClear}>
              Clear all
            </Button>
          )}
          {mayPlan && <PlanACoupon kind="plain" />}
        </>
      }
    >
      {dropsSearch ? (
        <Yields without={`“${search}”`} count={withoutSearch ?? 0} />
      ) : toDrop === undefined ? (
        'No single filter is to blame: the shop has no recipe near this.'
      ) : (
        <Yields without={toDrop.label} count={toDrop.yields} />
      )}
    </EmptyState>
  );
}

function Yields({ without, count }: { without: string; count: number }) {
  return (
    <>
      Without <b>{without}</b> there {count === 1 ? 'is' : 'are'} {formatCount(count, 'recipe')}.
    </>
  );
}
