import { Box, chakra } from '@chakra-ui/react';
import type { DerivedNumber } from '@proofplate/physics';
import { METHOD_LABELS, type MeasurementQuantity, QUANTITIES } from '@proofplate/recipe-model';
import { useMemo } from 'react';
import { type Fact, FactList } from '../../../../components/fact-list';
import { Swatch } from '../../../../components/swatch';
import { cssColour } from '../../../../lib/colour-difference';
import { formatNumber, formatQuantity } from '../../../../lib/format';
import type { Coupon, CouponCell } from '../../coupons.api';
import { derivedNumbersOf } from '../cell-numbers';
import type { Inspection, Measurement } from '../log.api';

const COLOUR: readonly MeasurementQuantity[] = ['lightness', 'a', 'b'];
const FIRST: readonly MeasurementQuantity[] = ['contrast', 'evenness'];
const DERIVED = [
  { key: 'arealDose', label: 'Dose', isShare: false },
  { key: 'pulseOverlap', label: 'Pulse overlap', isShare: true },
  { key: 'lineOverlap', label: 'Line overlap', isShare: true },
  { key: 'pulseEnergy', label: 'Pulse energy', isShare: false },
  { key: 'peakFluence', label: 'Peak fluence', isShare: false },
  { key: 'spotAtWork', label: 'Spot at the work', isShare: false },
] as const;
const ALWAYS_SHOWN = 2;
const DIGITS = 3;
const SHORT_LABELS: Partial<Readonly<Record<MeasurementQuantity, string>>> = { contrast: 'Contrast to bare ground' };

type CellFactsProps = { coupon: Coupon; cell: CouponCell; inspection: Inspection };

/** Measured numbers first, then what follows from the setting; where each comes from is one press away. */
export function CellFacts({ coupon, cell, inspection }: CellFactsProps) {
  const derived = useMemo(() => derivedNumbersOf(cell, coupon), [cell, coupon]);
  const own = inspection.measurements.filter(({ cellId }) => cellId === cell.id);
  const counting = new Map(own.filter(({ counts }) => counts).map((row) => [row.quantity, row]));
  const others = [...counting.values()].filter(({ quantity }) => !COLOUR.includes(quantity) && !FIRST.includes(quantity));
  const facts: Fact[] = [
    colourFact(counting),
    ...FIRST.map((quantity) => measuredFact(quantity, counting.get(quantity))),
    ...others.map((row) => measuredFact(row.quantity, row)),
    ...DERIVED.slice(0, ALWAYS_SHOWN).map((each) => derivedFact(each, derived.get(each.key))),
  ];
  return (
    <Box minW="0">
      <FactList facts={facts} />
      <chakra.details fontSize="sm" lineHeight="sm" mt="1">
        <chakra.summary cursor="pointer" color="brand.fg" py="1.5" width="fit-content">
          Where the numbers come from
        </chakra.summary>
        <DerivedList derived={derived} />
        <MeasuredList rows={own} />
      </chakra.details>
    </Box>
  );
}

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

function derivedFact({ label, isShare }: (typeof DERIVED)[number], number: DerivedNumber | undefined): Fact {
  if (number?.value === undefined) return { label, value: <chakra.span fontWeight="normal">not known</chakra.span> };
  if (isShare) return { label, value: formatNumber(number.value * 100, { decimals: 1 }), unit: '%' };
  return { label, value: formatNumber(number.value, { significantDigits: DIGITS }), unit: number.unit };
}

function NotMeasured() {
  return (
    <chakra.span fontWeight="normal" color="fg.muted">
      not measured
    </chakra.span>
  );
}

function DerivedList({ derived }: { derived: ReadonlyMap<string, DerivedNumber> }) {
  return (
    <chakra.dl display="grid" gap="1.5" mt="1">
      {DERIVED.map((each) => {
        const number = derived.get(each.key);
        if (number === undefined || (number.value === undefined && number.isRuledOutByMode)) return null;
        return (
          <div key={each.key}>
            <chakra.dt fontWeight="semibold">
              {each.label} {number.value === undefined ? '' : shownValue(number.value, number.unit, each.isShare)}
            </chakra.dt>
            <chakra.dd color="fg.muted" overflowWrap="anywhere">
              {number.value === undefined ? `Not known: ${number.missingBecause}.` : `${number.formula}. ${number.source}.`}
              {number.value !== undefined && number.outOfRange !== undefined && ` Outside the formula’s range: ${number.outOfRange}.`}
            </chakra.dd>
          </div>
        );
      })}
    </chakra.dl>
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

function shownValue(value: number, unit: string, isShare: boolean): string {
  if (isShare) return formatQuantity(value * 100, '%', { decimals: 1 });
  return formatQuantity(value, unit === '1' ? '' : unit, { significantDigits: DIGITS });
}
