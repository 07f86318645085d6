import { chakra } from '@chakra-ui/react';
import { formatCount, formatDate, formatNumber } from '../../lib/format';
import { decimalsOf, symbolOf } from '../../lib/measurement-words';
import { paths } from '../../lib/paths';
import { StateMark } from '../state-mark';
import { TextLink } from '../text-link';
import { CellCloseUp, type EvidencePlateShape } from './evidence-plate';
import { platePhotoOf, type StoredPhoto } from './plate-photo';

/** A cell that is cited as evidence, as far as it is shown. */
export type CitedCell = {
  cellId: string;
  address: string;
  couponId: string;
  couponCode: string;
  lot: string;
  markedAt: string | null;
  measurements: readonly { quantity: string; value: number | null }[];
  meets: boolean | null;
  plate: { rows: number; columns: number; cellMm: number; gapMm: number };
  photo: StoredPhoto | null;
};

export function shapeOf({
  plate: { rows, columns, cellMm, gapMm },
  couponCode,
}: Pick<CitedCell, 'plate' | 'couponCode'>): EvidencePlateShape {
  return { rows, columns, cellMm, gapMm, code: couponCode };
}

/** The marks that proved a setting again, each with its first measured number and whether it is within the criteria. */
export function ProofMarks({ cells, timeZone }: { cells: readonly CitedCell[]; timeZone: string }) {
  const coupons = [...new Map(cells.map((cell) => [cell.couponId, cell])).values()];
  return (
    <chakra.div display="flex" flexWrap="wrap" columnGap="5" rowGap="2" alignItems="center">
      <chakra.div flex="1 1 180px">
        <b>Proved again on </b>
        {coupons.map(({ couponCode, couponId }, index) => (
          <span key={couponId}>
            {index > 0 && ', '}
            <TextLink to={paths.coupon(couponCode)} fontWeight="semibold" color="fg">
              {couponCode}
            </TextLink>
          </span>
        ))}
        <chakra.span display="block" fontSize="sm" lineHeight="sm" color="fg.muted">
          {[formatCount(cells.length, 'mark'), ...coupons.map((coupon) => whereAndWhen(coupon, timeZone))].join(', ')}
        </chakra.span>
      </chakra.div>
      <chakra.ul display="flex" flexWrap="wrap" gap="2">
        {cells.map((cell) => (
          <Mark key={cell.cellId} cell={cell} />
        ))}
      </chakra.ul>
    </chakra.div>
  );
}

function whereAndWhen({ lot, markedAt }: CitedCell, timeZone: string): string {
  const where = lot === '' ? 'lot not recorded' : `lot ${lot}`;
  return markedAt === null ? where : `${where}, ${formatDate(markedAt, timeZone)}`;
}

function Mark({ cell }: { cell: CitedCell }) {
  const { address, measurements, meets } = cell;
  const numbers = measurements.filter(({ value }) => value !== null);
  const first = numbers.find(({ quantity }) => quantity === 'lightness') ?? numbers[0];
  return (
    <chakra.li display="grid" gridTemplateColumns="52px auto" gap="2" alignItems="center" minW="96px" fontSize="sm" lineHeight="sm">
      <CellCloseUp shape={shapeOf(cell)} photo={platePhotoOf(cell.photo, 'small')} address={address} />
      <span>
        <chakra.span color="fg.muted">
          {address}
          {first !== undefined && `, ${symbolOf(first.quantity)}`}
        </chakra.span>
        {first?.value != null && <chakra.b display="block">{formatNumber(first.value, { decimals: decimalsOf(first.quantity) })}</chakra.b>}
        {meets === false && <StateMark state="fails">outside</StateMark>}
        {meets === null && <chakra.span display="block">no criteria</chakra.span>}
      </span>
    </chakra.li>
  );
}
