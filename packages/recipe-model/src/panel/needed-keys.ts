import type { Fill } from '@proofplate/physics';
import type { ParameterKey } from '../vocabulary/parameters';
import type { PhysicalProfile } from '../vocabulary/profile';
import type { Panel } from './panel';

/** Continuous beams are usual for these sources, so no frequency is a setting of its own. */
const MAY_BE_CONTINUOUS = ['co2', 'diode'];

/**
 * What a complete setting on a machine cannot do without.
 *
 * @param machine panel and source
 * @param fill    an outline has no line spacing
 * @returns parameters that the panel shows and that must be set
 */
export function neededKeys({ panel, physical }: { readonly panel: Panel; readonly physical: PhysicalProfile }, fill: Fill): ParameterKey[] {
  const needed: ParameterKey[] = ['powerPercent', 'speedMmPerS', 'pulseWidthNs', 'passes'];
  if (!MAY_BE_CONTINUOUS.includes(physical.sourceKind)) needed.push('frequencyKhz');
  if (fill !== 'outline') needed.push('lineSpacingUm');
  return needed.filter((key) => panel.fields.some(({ parameter }) => parameter === key));
}
