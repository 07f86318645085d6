import { chakra } from '@chakra-ui/react';
import type { LengthUnit, PartResults } from '@proofplate/recipe-model';
import type { ReactNode } from 'react';
import { formatNumber, formatQuantity } from '../../../lib/format';
import { degrees, findNumber, LIMIT_WORDS, lengthFigure, lengthText, numberValue } from '../part-words';

export type PartFact = { label: string; value: ReactNode; note?: string };
export type PartFactsProps = { results: PartResults; shownIn: LengthUnit; locale: string };

/** What is entered and checked at the machine, in the order in which it is done. */
export function partFacts({ results, shownIn, locale }: PartFactsProps): PartFact[] {
  const both = (mm: number) => `${lengthText(mm, shownIn === 'mm' ? 'in' : 'mm', locale)}`;
  const value = (key: string) => numberValue(results, key) ?? 0;
  const reason = (key: string) => `not known because ${findNumber(results, key)?.missingBecause ?? ''}`;
  const diameter = value('rotaryDiameter');
  const [width, height] = [value('artworkWidth'), value('artworkHeight')];
  const [steps, angle, strip] = ['indexSteps', 'indexAngle', 'stripWidth'].map((key) => numberValue(results, key));
  const focus = numberValue(results, 'focusBelowCrown');
  const ending = results.stripLimit === null ? undefined : LIMIT_WORDS[results.stripLimit];
  return [
    { label: 'Enter on the rotary', value: `Ø ${lengthText(diameter, shownIn, locale)}`, note: both(diameter) },
    {
      label: 'Artwork, width × height',
      value: `${lengthFigure(width, shownIn, locale)} × ${lengthText(height, shownIn, locale)}`,
      note: `${degrees(value('wrapAngle'), 2, locale)} of turn, ${seamWords(results, shownIn, locale)}`,
    },
    results.isMirrored
      ? { label: 'Mirror', value: 'Yes', note: 'Once, in one place: in the artwork or on the control.' }
      : { label: 'Mirror', value: 'No' },
    steps === null || steps === undefined
      ? { label: 'Index steps', value: <NotKnown>{reason('indexSteps')}</NotKnown> }
      : {
          label: 'Index steps',
          value: formatNumber(steps, { locale }),
          ...(angle === null || angle === undefined ? {} : { note: `${degrees(angle, 4, locale)} each` }),
        },
    strip === null || strip === undefined
      ? { label: 'Strip in focus', value: <NotKnown>{reason('stripWidth')}</NotKnown> }
      : {
          label: 'Strip in focus',
          value: lengthText(strip, shownIn, locale),
          ...(ending === undefined ? {} : { note: `at most: ${ending}` }),
        },
    focus === null
      ? { label: 'Set the focus', value: <NotKnown>{reason('focusBelowCrown')}</NotKnown> }
      : {
          label: 'Set the focus',
          value: focusWords(focus, { results, shownIn, locale }),
          note: 'A focus offset of the setting counts from there.',
        },
    ...taperFacts({ results, shownIn, locale }),
  ];
}

export function seamWords(results: PartResults, shownIn: LengthUnit, locale: string): string {
  const [overlap, gap] = [numberValue(results, 'seamOverlap') ?? 0, numberValue(results, 'seamGap') ?? 0];
  const isShown = (mm: number) => Number(mm.toFixed(6)) > 0;
  if (isShown(overlap)) return `overlap ${lengthText(overlap, shownIn, locale)}`;
  return isShown(gap) ? `gap ${lengthText(gap, shownIn, locale)}` : 'edge to edge';
}

function focusWords(focusMm: number, { results, shownIn, locale }: PartFactsProps): string {
  if (focusMm === 0) return 'on the middle of the strip';
  const way = results.isMirrored ? 'above' : 'below';
  return `${lengthText(focusMm, shownIn, locale)} ${way} the strip’s middle`;
}

function taperFacts({ results, shownIn, locale }: PartFactsProps): PartFact[] {
  const [tilt, error] = [numberValue(results, 'tiltAngle'), numberValue(results, 'widthErrorAtEnds')];
  const [sector, inner, outer] = ['sectorAngle', 'sectorInnerRadius', 'sectorOuterRadius'].map((key) => numberValue(results, key) ?? 0);
  if (tilt === null || error === null) return [];
  const radii = `${lengthFigure(inner ?? 0, shownIn, locale)} to ${lengthText(outer ?? 0, shownIn, locale)}`;
  return [
    { label: 'Tilt the part', value: degrees(tilt, 3, locale), note: 'so that the marked line lies level' },
    {
      label: 'Rectangle at its ends',
      value: `± ${formatQuantity(Number((error * 100).toFixed(2)), '%', { locale })} wide`,
      note: `or draw a sector: ${degrees(sector ?? 0, 2, locale)}, radius ${radii}`,
    },
  ];
}

/** Large enough to be read over the machine. */
export function PartFacts(props: PartFactsProps) {
  return (
    <chakra.dl display="grid" gridTemplateColumns={{ base: '1fr', sm: 'repeat(2, minmax(0, 1fr))' }} columnGap="6" rowGap="4">
      {partFacts(props).map(({ label, value, note }) => (
        <chakra.div key={label} minW="0">
          <chakra.dt fontSize="sm" lineHeight="sm" color="fg.muted">
            {label}
          </chakra.dt>
          <chakra.dd fontSize="2xl" lineHeight="title" fontWeight="semibold" overflowWrap="anywhere">
            {value}
            {note !== undefined && (
              <chakra.span display="block" fontSize="sm" lineHeight="sm" fontWeight="normal" color="fg.muted">
                {note}
              </chakra.span>
            )}
          </chakra.dd>
        </chakra.div>
      ))}
    </chakra.dl>
  );
}

function NotKnown({ children }: { children: ReactNode }) {
  return (
    <chakra.span display="block" fontSize="md" lineHeight="md" fontWeight="normal">
      {children}
    </chakra.span>
  );
}
