import { type Criterion, QUANTITIES } from '@proofplate/recipe-model';
import { formatNumber } from '../../lib/format';

/** A demand in words: "Depth between 5 and 50 µm". */
export function criterionWords({ quantity, comparison, value, upper, unit }: Criterion, locale: string): string {
  const show = (number: number) => formatNumber(number, { locale });
  const tail = unit === '1' ? '' : `\u202F${unit}`;
  const { label, symbol } = QUANTITIES[quantity];
  const name = quantity === 'lightness' || quantity === 'roughness-ra' ? `${label.replace(' Ra', '')} ${symbol}` : label;
  if (comparison === 'between') return `${name} between ${show(value)} and ${show(upper ?? value)}${tail}`;
  return `${name} ${comparison} ${show(value)}${tail}`;
}
