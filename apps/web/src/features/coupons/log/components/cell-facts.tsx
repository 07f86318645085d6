import { Box, chakra } from '@chakra-ui/react';
import { METHOD_LABELS, type MeasurementQuantity, QUANTITIES } from '@proofplate/recipe-model';
import { useMemo } from 'react';
import { type Fact, FactList } from '../../../../components/fact-list';
import { FoldedNumbers } from '../../../../components/numbers-panel/folded-numbers';
import type { ShownNumber } from '../../../../components/numbers-panel/shown-number';
import { numbersGroups } from '../../../../components/setting-numbers';
import { Swatch } from '../../../../components/swatch';
import { cssColour } from '../../../../lib/colour-difference';
import { formatNumber, formatQuantity } from '../../../../lib/format';
import type { Coupon, CouponCell } from '../../coupons.api';
import { cellNumbers } from '../cell-numbers';
import type { Inspection, Measurement } from '../log.api';

const COLOUR: readonly MeasurementQuantity[] = ['lightness', 'a', 'b'];
const FIRST: readonly MeasurementQuantity[] = ['contrast', 'evenness'];
/** Two that are asked for beside what was measured; the panel below holds all. */
const BESIDE = ['arealDose', 'pulseOverlap'];
const SHORT_LABELS: Partial<Readonly<Record<MeasurementQuantity, string>>> = { contrast: 'Contrast to bare ground' };

type CellFactsProps = { coupon: Coupon; cell: CouponCell; inspection: Inspection };

/** Measured numbers first, then what follows from the setting; where each comes from is one press away. */
export function CellFacts({ coupon, cell, inspection }: CellFactsProps) {
  const groups = useMemo(() => numbersGroups([cellNumbers(cell, coupon)]), [cell, coupon]);
  const own = inspection.measurements.filter(({ cellId }) => cellId === cell.id);
  const counting = new Map(own.filter(({ counts }) => counts).map((row) => [row.quantity, row]));
  const others = [...counting.values()].filter(({ quantity }) => !COLOUR.includes(quantity) && !FIRST.includes(quantity));
  const derived = groups.flatMap(({ numbers }) => numbers).filter(({ key }) => BESIDE.includes(key));
  const facts: Fact[] = [
    colourFact(counting),
    ...FIRST.map((quantity) => measuredFact(quantity, counting.get(quantity))),
    ...others.map((row) => measuredFact(row.quantity, row)),
    ...derived.sort((one, other) => BESIDE.indexOf(one.key) - BESIDE.indexOf(other.key)).map(derivedFact),
  ];
  return (
    <Box minW="0">
      <FactList facts={facts} />
      {COLOUR_AND_EVENNESS.some((quantity) => !counting.has(quantity)) && (
        <chakra.p mt="1.5" fontSize="sm" lineHeight="sm" color="fg.muted">
          {HOW_MEASURED}
        </chakra.p>
      )}
      <Box fontSize="sm" lineHeight="sm">
        <FoldedNumbers summary="Numbers of this cell" label={`Numbers of ${cell.address}`} groups={groups} />
        {own.length > 0 && (
          <chakra.details>
            <chakra.summary cursor="pointer" color="brand.fg" py="1.5" width="fit-content">
              Where the measurements come from
            </chakra.summary>
            <MeasuredList rows={own} />
          </chakra.details>
        )}
      </Box>
    </Box>
  );
}

const COLOUR_AND_EVENNESS = ['lightness', 'contrast', 'evenness'] as const;
const HOW_MEASURED =
  'Colour, contrast and evenness are not worked out from a photo here yet: measure them, or judge them by hand, and enter them under “Enter measurements”. Dose and overlap follow from the setting.';

function colourFact(counting: ReadonlyMap<string, Measurement>): Fact {
  const [l, a, b] = COLOUR.map((quantity) => counting.get(quantity)?.value ?? undefined);
  if (l === undefined) return { label: 'Colour, L*a*b*', value: <NotMeasured /> };
  if (a === undefined || b === undefined) return { label: 'Lightness, L*', value: formatNumber(l, { decimals: 1 }) };
  return { label: 'Colour, L*a*b*', value: <Swatch colour={cssColour({ lightness: l, a, b })} lab={{ l, a, b }} /> };
}

function measuredFact(quantity: MeasurementQuantity, row: Measurement | undefined): Fact {
  const { unit } = QUANTITIES[quantity];
  const label = SHORT_LABELS[quantity] ?? QUANTITIES[quantity].label;
  if (row === undefined || row.value === null) return { label, value: <NotMeasured /> };
  const value = row.grade === null ? formatNumber(row.value) : `${row.grade} (${formatNumber(row.value)})`;
  return { label: row.method === 'photo' ? `${label}, from the photo` : label, value, ...(unit === '1' ? {} : { unit }) };
}

function derivedFact({ label, text, unit }: ShownNumber): Fact {
  if (text === undefined) return { label, value: <chakra.span fontWeight="normal">not known</chakra.span> };
  return { label, value: text, unit };
}

function NotMeasured() {
  return (
    <chakra.span fontWeight="normal" color="fg.muted">
      not measured
    </chakra.span>
  );
}

function MeasuredList({ rows }: { rows: readonly Measurement[] }) {
  return (
    <chakra.ul display="grid" gap="1.5" mt="1.5">
      {rows.map((row) => (
        <chakra.li key={row.id} color="fg.muted" overflowWrap="anywhere">
          <chakra.span fontWeight="semibold" color="fg" textDecoration={row.isSuperseded ? 'line-through' : undefined}>
            {QUANTITIES[row.quantity].label} {row.value === null ? row.grade : formatQuantity(row.value, row.unit === '1' ? '' : row.unit)}
          </chakra.span>{' '}
          {[
            METHOD_LABELS[row.method],
            row.instrument,
            ...Object.values(row.methodDetail).map(String),
            row.uncertainty === null ? '' : `± ${formatNumber(row.uncertainty)}`,
            row.by,
            row.isSuperseded ? 'superseded' : '',
            row.reason,
          ]
            .filter((part) => part !== '')
            .join(', ')}
        </chakra.li>
      ))}
    </chakra.ul>
  );
}
