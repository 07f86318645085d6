import { chakra } from '@chakra-ui/react';
import { formatNumber, formatUnit } from '../../../lib/format';
import { derivedLabel, inputWords, isShownFirst } from '../derived-words';
import type { DerivedNumber } from '../recipes.api';

/** Numbers that follow from a step; each opens to its formula, its inputs and its source. */
export function DerivedNumbers({ numbers, label }: { numbers: readonly DerivedNumber[]; label: string }) {
  const first = numbers.filter(isShownFirst);
  const rest = numbers.filter((number) => !isShownFirst(number));
  return (
    <chakra.section aria-label={label}>
      <NumberList numbers={first} />
      {rest.length > 0 && (
        <chakra.details mt="1">
          <chakra.summary py="2" fontSize="sm" color="brand.fg" cursor="pointer">
            {rest.length} more numbers
          </chakra.summary>
          <NumberList numbers={rest} />
        </chakra.details>
      )}
    </chakra.section>
  );
}

function NumberList({ numbers }: { numbers: readonly DerivedNumber[] }) {
  return (
    <chakra.ul fontSize="sm" lineHeight="sm">
      {numbers.map((number) => (
        <chakra.li key={number.key} borderTop="hairline" _first={{ borderTop: 'none' }}>
          <chakra.details>
            <chakra.summary display="flex" justifyContent="space-between" gap="3" py="1.5" cursor="pointer">
              <chakra.span color="fg.muted">{derivedLabel(number.key)}</chakra.span>
              <ShownNumber number={number} />
            </chakra.summary>
            <chakra.p color="fg.muted" pb="2">
              {number.formula}. {inputWords(number.inputs)}Source: {number.source}
            </chakra.p>
          </chakra.details>
          {number.outOfRange !== null && (
            <chakra.p color="straw.fg" pb="1.5">
              Outside the formula’s range: {number.outOfRange}
            </chakra.p>
          )}
        </chakra.li>
      ))}
    </chakra.ul>
  );
}

function ShownNumber({ number: { value, unit, missingBecause } }: { number: DerivedNumber }) {
  if (value === null) {
    return (
      <chakra.span textAlign="right" color="fg.muted">
        not known because {missingBecause}
      </chakra.span>
    );
  }
  return (
    <chakra.b whiteSpace="nowrap">
      {formatNumber(Number(value.toPrecision(3)))}
      {unit !== '1' && <chakra.span fontWeight="normal" color="fg.muted">{`\u00A0${formatUnit(unit)}`}</chakra.span>}
    </chakra.b>
  );
}
