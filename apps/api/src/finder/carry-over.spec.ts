import type { MarkStep, PhysicalProfile } from '@proofplate/recipe-model';
import { type CarryOver, whyNotCarriedOver } from './carry-over';

const fibre: PhysicalProfile = {
  sourceKind: 'fibre-mopa',
  wavelengthNm: 1064,
  ratedPowerW: 20,
  frequencyRangeKhz: { from: 1, to: 4000 },
  pulseWidthRangeNs: { from: 2, to: 350 },
  topSpeedMmPerS: 7000,
};
const set = (physical: number, unit: 'ns' | 'kHz' | 'mm/s') => ({ entered: { value: physical, unit }, physical });
const step = (watts: number | null = 10): MarkStep => ({
  purpose: 'fill',
  pauseAfterS: 0,
  parameters: {
    values: { pulseWidthNs: set(30, 'ns'), frequencyKhz: set(100, 'kHz'), speedMmPerS: set(2000, 'mm/s') },
    fill: 'both directions',
    assist: 'none',
    power: watts === null ? { watts: null, reason: 'not known' } : { watts, basis: 'not calibrated' },
  },
});
const why = (wanted: Partial<PhysicalProfile> | null, more: Partial<CarryOver> = {}) =>
  whyNotCarriedOver({
    differs: ['machine'],
    steps: [step()],
    proved: { name: 'Bench 2', physical: fibre },
    wanted: wanted === null ? null : { name: 'Bench 1', physical: { ...fibre, ...wanted } },
    lens: { has: 'F160', wanted: 'F254' },
    ...more,
  });

describe('whyNotCarriedOver()', () => {
  it.each<[string, Partial<PhysicalProfile>, RegExp]>([
    ['a fixed pulse width', { pulseWidthsNs: [120] }, /^It needs a pulse width of 30 ns\. Bench 1 has one fixed pulse width, 120 ns/],
    ['a list of pulse widths', { pulseWidthsNs: [100, 200] }, /Bench 1 offers 100, 200 ns/],
    ['a range of pulse widths', { pulseWidthRangeNs: { from: 100, to: 200 } }, /Bench 1 offers 100 to 200 ns/],
    [
      'a frequency range',
      { frequencyRangeKhz: { from: 20, to: 80 } },
      /It needs a pulse frequency of 100 kHz\. Bench 1 offers 20 to 80 kHz/,
    ],
    ['a top speed', { topSpeedMmPerS: 1000 }, /It needs a speed of 2000 mm\/s\. Bench 1 reaches 1000 mm\/s/],
    ['a rated power', { ratedPowerW: 5 }, /It needs 10 W\. Bench 1 is rated at 5 W/],
    ['another wavelength', { wavelengthNm: 10600, sourceKind: 'co2' }, /It was proved at 1064 nm\. Bench 1 marks at 10600 nm \(CO₂\)/],
  ])('says that it is impossible by %s', (_, wanted, expected) => {
    expect(why(wanted)).toMatch(expected);
  });

  it('asks for a coupon where nothing forbids it', () => {
    expect(why({ pulseWidthsNs: [30, 120] })).toBe(
      'Its numbers were proved on Bench 2; the beam of Bench 1 differs, so it needs a coupon there.',
    );
  });

  it('does not take unknown watts for too many', () => {
    expect(why({ ratedPowerW: 5 }, { steps: [step(null)] })).toMatch(/needs a coupon/);
  });

  it('gives the reason of every slot that differs', () => {
    const text = why(null, { differs: ['lens', 'finish'] });
    expect(text).toMatch(/F160 and F254 have different spots/);
    expect(text).toMatch(/The finish decides/);
  });
});
