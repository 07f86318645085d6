import { chakra } from '@chakra-ui/react';
import { Panel } from '../../../components/page';
import { CellCloseUp, EvidencePlate } from '../../../components/plate/evidence-plate';
import { platePhotoOf } from '../../../components/plate/plate-photo';
import { formatDate, formatNumber, inShopNumbers } from '../../../lib/format';
import { byMethod, decimalsOf, symbolOf } from '../../../lib/measurement-words';
import { useSession } from '../../../lib/session';
import type { ReferenceCell } from '../finder.api';

const MOST_MEASUREMENTS = 4;

/** The cell that the setting comes from: what the first piece is compared with. */
export function MarkToMatch({ reference }: { reference: ReferenceCell }) {
  const { plate, couponCode, address, photo } = reference;
  const shape = { ...plate, code: couponCode };
  return (
    <Panel px="4" py="3.5" aria-label="The mark to match">
      <chakra.div
        display="grid"
        gridTemplateColumns={{
          base: '120px minmax(0, 1fr)',
          sm: '148px minmax(0, 1fr) 104px',
          lg: '120px minmax(0, 1fr)',
          xl: '148px minmax(0, 1fr) 104px',
        }}
        gap={{ base: '4', sm: '4' }}
        alignItems="start"
      >
        <CellCloseUp shape={shape} photo={platePhotoOf(photo, 'large')} address={address} />
        <div>
          <chakra.h2 mb="1">The mark to match</chakra.h2>
          <p>
            <b>{address}</b> of {couponCode}
          </p>
          <chakra.ul fontSize="sm" lineHeight="sm" color="fg.muted" mt="1">
            {reference.measurements.slice(0, MOST_MEASUREMENTS).map((measurement) => (
              <li key={`${measurement.quantity} ${measurement.method}`}>{measurementWords(measurement)}</li>
            ))}
          </chakra.ul>
          <TakenAt reference={reference} />
        </div>
        <chakra.div display={{ base: 'none', sm: 'block', lg: 'none', xl: 'block' }}>
          <EvidencePlate shape={shape} photo={platePhotoOf(photo, 'small')} chosen={address} />
        </chakra.div>
      </chakra.div>
    </Panel>
  );
}

function TakenAt({ reference: { photo, lot } }: { reference: ReferenceCell }) {
  const { shop } = useSession();
  const words = [photo === null ? 'no photo' : `Photo of ${formatDate(photo.takenAt, shop.timeZone)}`, lot === '' ? '' : `lot ${lot}`];
  return (
    <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted" mt="1">
      {words.filter((word) => word !== '').join(', ')}
    </chakra.p>
  );
}

/** "Contrast 0.95, at least 0.9". */
export function measurementWords({ quantity, value, grade, unit, method, criterion }: ReferenceCell['measurements'][number]): string {
  const name = quantity === 'contrast' ? 'Contrast' : symbolOf(quantity);
  const number = value === null ? (grade ?? '') : formatNumber(value, { decimals: decimalsOf(quantity) });
  const ending = unit === '1' || value === null ? '' : ` ${unit}`;
  const by = method === 'photo' ? '' : `, ${byMethod(method)}`;
  return `${name} ${number}${ending}${criterion === null ? '' : `, ${inShopNumbers(criterion)}`}${by}`;
}
