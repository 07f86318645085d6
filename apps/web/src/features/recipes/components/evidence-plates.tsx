import { chakra } from '@chakra-ui/react';
import { couponLayout } from '@proofplate/imaging';
import { type Fact, FactList } from '../../../components/fact-list';
import { CellCloseUp, EvidencePlate } from '../../../components/plate/evidence-plate';
import { platePhotoOf } from '../../../components/plate/plate-photo';
import { ProofMarks, shapeOf } from '../../../components/plate/proof-marks';
import { TextLink } from '../../../components/text-link';
import { formatNumber } from '../../../lib/format';
import { decimalsOf, methodWord, quantityWords } from '../../../lib/measurement-words';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/session';
import type { EvidenceCell, Revision } from '../recipes.api';

/** Plates that the setting rests on, side by side in one scale, and the marks that proved it again. */
export function EvidencePlates({ evidence }: { evidence: Revision['evidence'] }) {
  const { shop } = useSession();
  const { basis, confirmation, runs } = evidence;
  const widestMm = Math.max(0, ...basis.map(plateWidthMm));
  if (basis.length + confirmation.length + runs.length === 0) {
    return <chakra.p color="fg.muted">It rests on no coupon. Its route and grounds say why it may be used.</chakra.p>;
  }
  return (
    <chakra.div display="grid" gap="4">
      <chakra.ul display="grid" gap="5">
        {basis.map((cell) => (
          <chakra.li key={cell.cellId} display="grid" gridTemplateColumns="minmax(0, 240px) minmax(0, 148px)" gap="3.5" alignItems="start">
            <div>
              <EvidencePlate shape={shapeOf(cell)} photo={platePhotoOf(cell.photo, 'large')} chosen={cell.address} widestMm={widestMm} />
              <CellLink cell={cell} />
            </div>
            <div>
              <CellCloseUp shape={shapeOf(cell)} photo={platePhotoOf(cell.photo, 'large')} address={cell.address} />
              <FactList facts={measuredFacts(cell)} />
            </div>
          </chakra.li>
        ))}
      </chakra.ul>
      {confirmation.length > 0 && <ProofMarks cells={confirmation} timeZone={shop.timeZone} />}
      {runs.map(({ runId, code, pieceCount, meetingCount, lot }) => (
        <p key={runId}>
          Proved on <TextLink to={paths.run(code)}>{code}</TextLink>: {meetingCount} of {pieceCount} pieces within the criteria
          {lot === '' ? '' : `, lot ${lot}`}
        </p>
      ))}
    </chakra.div>
  );
}

function CellLink({ cell: { couponCode, address } }: { cell: EvidenceCell }) {
  return (
    <chakra.p fontSize="sm" lineHeight="sm" pt="1.5">
      <TextLink to={`${paths.coupon(couponCode)}?cell=${address}`} color="fg.muted">
        {couponCode}, cell {address}
      </TextLink>
    </chakra.p>
  );
}

export function plateWidthMm(cell: EvidenceCell): number {
  const { code, ...shape } = shapeOf(cell);
  return couponLayout({ ...shape, reference: code }).plate.widthMm;
}

/** Rating and the newest value of each measured quantity, with how it was measured where that was not the photo. */
export function measuredFacts({ measurements, meanRating }: EvidenceCell): Fact[] {
  const newest = new Map(measurements.toReversed().map((measurement) => [measurement.quantity, measurement]));
  const rating = meanRating === null ? [] : [{ label: 'Rating', value: formatNumber(Number(meanRating.toFixed(1))) }];
  return [
    ...rating,
    ...[...newest.values()].map(({ quantity, value, grade, unit, method }) => ({
      label: method === 'photo' ? quantityWords(quantity) : `${quantityWords(quantity)}, ${methodWord(method)}`,
      value: grade ?? (value === null ? '—' : formatNumber(value, { decimals: decimalsOf(quantity) })),
      ...(unit === '1' ? {} : { unit }),
    })),
  ];
}
