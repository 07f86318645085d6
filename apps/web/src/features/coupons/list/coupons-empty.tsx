import { couponLayout } from '@proofplate/imaging';
import { Button, ButtonLink } from '../../../components/button';
import { EmptyState } from '../../../components/empty-state';
import { PlusIcon, UploadIcon } from '../../../components/icons';
import { Plate } from '../../../components/plate/plate';
import { formatCount } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import type { FilterToDrop } from './coupon-filters';

const EMPTY_PLATE = couponLayout({ rows: 5, columns: 6, reference: 'C-0001' });

/** A shop without coupons: what one is for, and the first act. */
export function NoCouponsYet() {
  return (
    <EmptyState
      kind="none-yet"
      title="No coupons yet"
      drawing={<Plate layout={EMPTY_PLATE} cells={{}} label="An empty plate" />}
      actions={
        <>
          <ButtonLink kind="primary" to={paths.planCoupon} icon={<PlusIcon />}>
            Plan a coupon
          </ButtonLink>
          <ButtonLink to={paths.importCoupon} icon={<UploadIcon />}>
            Enter a plate burnt earlier
          </ButtonLink>
        </>
      }
      note="Plates from the drawer count as well: what nobody remembers stays marked as unknown."
    >
      A coupon is a small plate of test squares, each burnt with another setting. Mark it, photograph it, rate every square: the best one
      becomes the draft of a recipe.
    </EmptyState>
  );
}

export type NoCouponMatchesProps = {
  toDrop: FilterToDrop | undefined;
  /** Words that are searched for, and what the filters yield without them. */
  words: string;
  withoutWords: number | undefined;
  onDrop: (key: string) => void;
  onDropWords: () => void;
  onClear: () => void;
};

/** Nothing fits: which filter to drop, and what that yields. */
export function NoCouponMatches({ toDrop, words, withoutWords = 0, onDrop, onDropWords, onClear }: NoCouponMatchesProps) {
  const dropsWords = words !== '' && withoutWords > (toDrop?.yields ?? 0);
  const dropped = dropsWords ? { name: `“${words}”`, count: withoutWords } : { name: toDrop?.label, count: toDrop?.yields ?? 0 };
  const handleDrop = () => {
    if (dropsWords) onDropWords();
    else if (toDrop === undefined) onClear();
    else onDrop(toDrop.key);
  };
  return (
    <EmptyState
      kind="none-match"
      title="No coupon matches"
      actions={
        <>
          <Button kind="primary" onClick={handleDrop}>
            {dropped.name === undefined ? 'Clear all' : `Drop ${dropped.name}`}
          </Button>
          <ButtonLink to={paths.planCoupon} icon={<PlusIcon />}>
            Plan a coupon
          </ButtonLink>
        </>
      }
    >
      {dropped.name === undefined ? (
        'No single filter is to blame: the shop has no coupon near this.'
      ) : (
        <>
          Without <b>{dropped.name}</b> there {dropped.count === 1 ? 'is' : 'are'} {formatCount(dropped.count, 'coupon')}.
        </>
      )}
    </EmptyState>
  );
}
