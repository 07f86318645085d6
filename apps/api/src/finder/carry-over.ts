import { type MarkStep, type PhysicalProfile, SOURCE_KIND_LABELS } from '@proofplate/recipe-model';
import type { SlotKey } from './finder-slots';

export type CarryOver = {
  readonly differs: readonly SlotKey[];
  readonly steps: readonly MarkStep[];
  /** Machine that the recipe was proved on, and the one that is wanted; the latter is null where it is the same. */
  readonly proved: { readonly name: string; readonly physical: PhysicalProfile };
  readonly wanted: { readonly name: string; readonly physical: PhysicalProfile } | null;
  readonly lens: { readonly has: string; readonly wanted: string };
};

const WAVELENGTH_TOLERANCE = 0.02;
const SAME = 1e-9;
/** Setting on the very edge of a range still counts as inside. */
const EDGE = 1 + SAME;

/** Why a near miss can't simply be dialled in: what is impossible on the wanted machine first, else what would have to be proved. */
export function whyNotCarriedOver(over: CarryOver): string {
  const impossible = over.wanted === null ? undefined : impossibleOn(over.steps, over.proved, over.wanted);
  if (impossible !== undefined) return impossible;
  return over.differs.map((slot) => unproved(slot, over)).join(' ');
}

type Machine = { readonly name: string; readonly physical: PhysicalProfile };

function impossibleOn(steps: readonly MarkStep[], proved: Machine, wanted: Machine): string | undefined {
  const [from, to] = [proved.physical, wanted.physical];
  if (Math.abs(from.wavelengthNm - to.wavelengthNm) > WAVELENGTH_TOLERANCE * from.wavelengthNm) {
    return `It was proved at ${from.wavelengthNm} nm. ${wanted.name} marks at ${to.wavelengthNm} nm (${SOURCE_KIND_LABELS[to.sourceKind]}), which the material takes up differently.`;
  }
  for (const { parameters } of steps) {
    const { pulseWidthNs, frequencyKhz, speedMmPerS } = parameters.values;
    const pulse = pulseWidthNs === undefined ? undefined : pulseWidthProblem(pulseWidthNs.physical, wanted);
    if (pulse !== undefined) return pulse;
    const frequency = frequencyKhz === undefined ? undefined : frequencyProblem(frequencyKhz.physical, wanted);
    if (frequency !== undefined) return frequency;
    if (speedMmPerS !== undefined && to.topSpeedMmPerS !== undefined && speedMmPerS.physical > to.topSpeedMmPerS * EDGE)
      return `It needs a speed of ${speedMmPerS.physical} mm/s. ${wanted.name} reaches ${to.topSpeedMmPerS} mm/s, so the same mark is not possible there.`;
    const { watts } = parameters.power;
    if (watts !== null && watts > to.ratedPowerW * EDGE)
      return `It needs ${Number(watts.toPrecision(3))} W. ${wanted.name} is rated at ${to.ratedPowerW} W, so the same mark is not possible there.`;
  }
  return undefined;
}

function pulseWidthProblem(neededNs: number, { name, physical }: Machine): string | undefined {
  const { pulseWidthsNs, pulseWidthRangeNs } = physical;
  const need = `It needs a pulse width of ${neededNs} ns.`;
  if (pulseWidthsNs !== undefined && pulseWidthsNs.length > 0) {
    if (pulseWidthsNs.some((width) => Math.abs(width - neededNs) <= SAME * neededNs)) return undefined;
    const offered =
      pulseWidthsNs.length === 1 ? `has one fixed pulse width, ${pulseWidthsNs[0]} ns` : `offers ${pulseWidthsNs.join(', ')} ns`;
    return `${need} ${name} ${offered}, so the same mark is not possible there.`;
  }
  if (pulseWidthRangeNs !== undefined) {
    if (neededNs >= pulseWidthRangeNs.from / EDGE && neededNs <= pulseWidthRangeNs.to * EDGE) return undefined;
    return `${need} ${name} offers ${pulseWidthRangeNs.from} to ${pulseWidthRangeNs.to} ns, so the same mark is not possible there.`;
  }
  return physical.sourceKind === 'fibre-q-switched'
    ? `${need} ${name} has one fixed pulse width, so the same mark is not possible there.`
    : undefined;
}

function frequencyProblem(neededKhz: number, { name, physical }: Machine): string | undefined {
  const range = physical.frequencyRangeKhz;
  if (range === undefined || (neededKhz >= range.from / EDGE && neededKhz <= range.to * EDGE)) return undefined;
  return `It needs a pulse frequency of ${neededKhz} kHz. ${name} offers ${range.from} to ${range.to} kHz, so the same mark is not possible there.`;
}

function unproved(slot: SlotKey, { proved, wanted, lens }: CarryOver): string {
  switch (slot) {
    case 'machine':
      return `Its numbers were proved on ${proved.name}; the beam of ${wanted?.name ?? 'the other machine'} differs, so it needs a coupon there.`;
    case 'lens':
      return `${lens.has} and ${lens.wanted} have different spots, so the same numbers put another energy on the work.`;
    case 'finish':
      return 'The finish decides how much of the beam is taken up; this one was not proved.';
    case 'effect':
      return 'It makes another mark than the one asked for.';
    case 'material':
      return 'It is of the same family, but this grade was not proved and may take heat differently.';
  }
}
