import { PARAMETERS, type ParameterKey } from '../vocabulary/parameters';
import type { PhysicalProfile } from '../vocabulary/profile';
import type { ParameterSet, ParameterValues } from '../vocabulary/setting';
import type { CraterCell } from './crater';
import { craterFit } from './crater-fit';
import type { CraterGround } from './read-crater';

const physical: PhysicalProfile = { sourceKind: 'fibre-mopa', wavelengthNm: 1064, ratedPowerW: 30 };
const ground: CraterGround = { optics: { physical, focalLengthMm: 160, measuredSpotUm: null }, unknownFields: [] };
/** 1 kHz, so watts are millijoules; pulses and lines lie 200 µm apart. */
const SINGLE = { powerPercent: 50, speedMmPerS: 200, frequencyKhz: 1, pulseWidthNs: 8, lineSpacingUm: 200, passes: 1 };
/** process-numbers 3.1, exact: w0 15 µm, Eth 3 µJ, Fth 0.84882636 J/cm². */
const ENERGIES_UJ = [4, 5, 6.5, 8, 10, 14, 20, 30];
const DIAMETERS_UM = [11.377914, 15.161515, 18.653028, 21.008883, 23.276335, 26.328697, 29.218213, 32.18949];

function valuesOf(given: Partial<Record<ParameterKey, number>>): ParameterValues {
  const entries = Object.entries(given).map(([key, physicalValue]) => {
    // the keys come from the argument's own type
    const unit = PARAMETERS[key as ParameterKey].unit;
    return [key, { entered: { value: physicalValue, unit }, physical: physicalValue }];
  });
  return Object.fromEntries(entries);
}

type Changed = { values?: Partial<Record<ParameterKey, number>>; rest?: Partial<ParameterSet> };
function crater(address: string, energyUj: number, diameterUm: number, { values = {}, rest = {} }: Changed = {}): CraterCell {
  const power = { watts: energyUj / 1000, basis: 'calibration' } as const;
  const parameters: ParameterSet = { values: valuesOf({ ...SINGLE, ...values }), fill: 'one direction', assist: 'none', power, ...rest };
  return { address, diameterUm, parameters };
}
const craters = (changed: Changed = {}, row = 'A') =>
  ENERGIES_UJ.map((energyUj, index) => crater(`${row}${index + 1}`, energyUj, DIAMETERS_UM[index], changed));
/** Craters of a spot of 15 µm radius at another threshold. */
const ofThreshold = (row: string, thresholdUj: number, values: Changed['values']) =>
  [1.4, 2, 3, 4.5, 7].map((times, index) =>
    crater(`${row}${index + 1}`, times * thresholdUj, Math.sqrt(450 * Math.log(times)), { values: values ?? {} }),
  );
const reasonOf = (cell: CraterCell, on: CraterGround = ground) =>
  craterFit([...craters(), cell], on).points.find(({ address }) => address === cell.address)?.excludedBecause;

describe('craterFit()', () => {
  it('finds spot and threshold of exact craters from watts and frequency', () => {
    const { fit, pointCount, series, refusedBecause, remarks } = craterFit(craters().slice(0, 7), ground);
    expect(fit?.spotRadiusUm).toBeCloseTo(15, 5);
    expect(fit?.thresholdEnergyUj).toBeCloseTo(3, 5);
    expect(fit?.thresholdPeakFluenceJPerCm2).toBeCloseTo(0.848_826_36, 6);
    expect({ pointCount, refusedBecause, remarks }).toEqual({ pointCount: 7, refusedBecause: null, remarks: [] });
    expect(series).toEqual({ pulses: 1, pulseWidthNs: 8, focusOffsetMm: 0 });
  });

  it.each([
    ['touching pulses', { values: { speedMmPerS: 20 } }, 'pulses touch: one every 20 µm, craters of 30 µm'],
    ['touching lines', { values: { lineSpacingUm: 25 } }, 'lines touch: 25 µm apart, craters of 30 µm'],
    ['another number of passes', { values: { passes: 3 } }, '3 pulses per place; the line is of 1'],
    ['another pulse width', { values: { pulseWidthNs: 60 } }, 'pulse width 60 ns; the line is of 8 ns'],
    ['another focus', { values: { focusOffsetMm: 0.5 } }, 'focus offset 0.5 mm; the line is of 0 mm'],
    ['a crossed fill', { rest: { fill: 'crossed' } }, 'crossed fill: the second scan falls between the pulses of the first'],
    ['a wobbled line', { values: { wobbleDiameterUm: 50 } }, 'the line is wobbled: pulses fall where no pitch says'],
    ['watts that nobody knows', { rest: { power: { watts: null, reason: 'No calibration fits.' } } }, 'No calibration fits.'],
  ] as const)('leaves out %s and says so', (_, changed, reason) => {
    expect(reasonOf(crater('B1', 22, 30, changed))).toBe(reason);
    expect(craterFit([...craters(), crater('B1', 22, 30, changed)], ground).fit?.spotRadiusUm).toBeCloseTo(15, 5);
  });

  it('takes craters that just do not touch, and looks at no line spacing where only the outline is marked', () => {
    const edge = { values: { speedMmPerS: 30, lineSpacingUm: 30 } };
    expect(reasonOf(crater('B1', 22, 30, edge))).toBeNull();
    expect(reasonOf(crater('B1', 22, 30, { values: { lineSpacingUm: 10 }, rest: { fill: 'outline' } }))).toBeNull();
  });

  it('leaves out a continuous beam, a pulse without a crater, and what was not written down of an old plate', () => {
    const { frequencyKhz: _, ...continuous } = valuesOf(SINGLE);
    expect(reasonOf(crater('B1', 22, 30, { rest: { values: continuous } }))).toBe('the beam is continuous: there are no single pulses');
    expect(reasonOf(crater('B1', 2, 0))).toBe('no crater: this pulse energy lies below the threshold');
    const unknown = craterFit(craters(), { ...ground, unknownFields: ['passes'] });
    expect(unknown.points[0].excludedBecause).toBe('nobody wrote down the passes of this plate');
    expect(unknown.refusedBecause).toBe('0 craters can be used; the line needs 5.');
  });

  it('refuses four craters, one pulse energy, and craters that shrink', () => {
    expect(craterFit(craters().slice(0, 4), ground)).toMatchObject({
      fit: null,
      refusedBecause: '4 craters can be used; the line needs 5.',
    });
    const equal = [20, 21, 22, 20.5, 21.5].map((diameterUm, index) => crater(`A${index + 1}`, 10, diameterUm));
    expect(craterFit(equal, ground).refusedBecause).toBe('The craters have 1 different pulse energies; the line needs 3. Vary the power.');
    const shrinking = [30, 28, 26, 24, 22].map((diameterUm, index) => crater(`A${index + 1}`, 10 + index, diameterUm));
    expect(craterFit(shrinking, ground)).toMatchObject({ fit: null, refusedBecause: expect.stringContaining('do not grow') });
  });

  it('marks craters of more than ten thresholds, and keeps them in the line', () => {
    const { points, pointCount, remarks } = craterFit([...craters().slice(0, 7), crater('B1', 45, 34.9)], ground);
    expect(points.filter(({ isFarAbove }) => isFarAbove).map(({ address }) => address)).toEqual(['B1']);
    expect(pointCount).toBe(8);
    expect(remarks[0]).toContain('More than 10 thresholds: B1.');
  });

  it('says when passes must meet, watts are not calibrated, and the plate was out of focus', () => {
    const power = { watts: 0.02, basis: 'not calibrated' } as const;
    const three = craters({ values: { passes: 3, focusOffsetMm: 2 } }).slice(0, 7);
    const { remarks } = craterFit([...three, crater('B1', 20, 29.2, { values: { passes: 3, focusOffsetMm: 2 }, rest: { power } })], ground);
    expect(remarks).toEqual([
      expect.stringContaining('3 passes count as 3 pulses on one place only if'),
      expect.stringContaining('the threshold is wrong by the same share as they are, the spot is not'),
      expect.stringContaining('Marked 2 mm out of focus'),
    ]);
  });

  it('fits the larger series, of equal ones that of fewer pulses, and the incubation over three', () => {
    // Fth(N) = Fth(1) N^(S - 1) with S = 0.85
    const series = [1, 4, 16].flatMap((pulses) => ofThreshold(`R${pulses}C`, 3 * pulses ** -0.15, { passes: pulses }));
    const found = craterFit(series, ground);
    expect(found.series?.pulses).toBe(1);
    expect(found.fit?.thresholdEnergyUj).toBeCloseTo(3, 9);
    expect(found.incubation?.incubationCoefficient).toBeCloseTo(0.85, 9);
    expect(found.incubation?.singlePulseThresholdJPerCm2).toBeCloseTo(0.848_826_36, 7);
    expect(found.incubation?.thresholds.map(({ pulses, points }) => [pulses, points])).toEqual([
      [1, 5],
      [4, 5],
      [16, 5],
    ]);
    expect(craterFit(series.slice(0, 10), ground).incubation).toBeNull();
  });
});
