import { chakra } from '@chakra-ui/react';
import { StateMark } from '../../../../components/state-mark';
import { TextLink } from '../../../../components/text-link';
import { formatCount, formatDate, formatDay, formatLength, formatTime } from '../../../../lib/format';
import { paths } from '../../../../lib/paths';
import { couponMark } from '../../coupon-words';
import type { Coupon } from '../../coupons.api';
import type { Inspection } from '../log.api';

const Fact = chakra('span', { base: { display: { base: 'none', sm: 'inline' } } });

/** The facts under the title; on a phone only who marked it and how far the rating is. */
export function CouponMeta({ coupon, inspection, timeZone }: { coupon: Coupon; inspection: Inspection | undefined; timeZone: string }) {
  const { shape, word } = couponMark(coupon.state);
  const { marked, profile, machine, lens, calibration, confirms } = coupon;
  const ground = [coupon.lot === '' ? '' : `Lot ${coupon.lot}`, coupon.thicknessMm === null ? '' : formatLength(coupon.thicknessMm)];
  return (
    <>
      <StateMark state={shape}>{word}</StateMark>
      <span>{markedWords(coupon, timeZone)}</span>
      <Fact>
        {machine.name} profile {profile.number}, {lens.name}
      </Fact>
      <Fact>{calibration === null ? 'No power table' : `Power table of ${formatDay(calibration.measuredOn)}`}</Fact>
      {ground.some((part) => part !== '') && <Fact>{ground.filter((part) => part !== '').join(', ')}</Fact>}
      {coupon.storedAt !== '' && <Fact>Kept in {coupon.storedAt}</Fact>}
      {coupon.sourceNote !== '' && <chakra.span overflowWrap="anywhere">Source: {coupon.sourceNote}</chakra.span>}
      {coupon.isInvented && <Fact>Invented for the demo shop</Fact>}
      {confirms !== null && (
        <span>
          Proves <TextLink to={paths.recipeRevision(confirms.recipeCode, confirms.id)}>{confirms.recipeCode}</TextLink>{' '}
          {confirms.number === null ? 'draft' : `revision ${confirms.number}`}
        </span>
      )}
      {marked !== null && inspection !== undefined && (
        <chakra.b color="fg">
          {ratedCount(inspection)} of {formatCount(coupon.cells.filter(({ markState }) => markState !== 'skipped').length, 'cell')} rated
        </chakra.b>
      )}
      {coupon.sealed !== null && (
        <span>
          Sealed by {coupon.sealed.by}, {formatTime(coupon.sealed.at, timeZone)}
        </span>
      )}
    </>
  );
}

function markedWords({ marked, isImported, createdBy, createdAt }: Coupon, timeZone: string): string {
  if (marked === null) return `Planned by ${createdBy}, ${formatDate(createdAt, timeZone)}`;
  if (isImported) return `Burnt before it was entered here by ${createdBy}`;
  return `Marked by ${marked.by ?? 'somebody'}, ${formatTime(marked.at, timeZone)}`;
}

const ratedCount = ({ verdicts }: Inspection) => verdicts.filter(({ meanRating }) => meanRating !== null).length;
