import { emptyPanelFor } from '../panel/empty-panel';
import { acceptEntered } from '../panel/enter-value';
import type { Panel } from '../panel/panel';
import type { ParameterKey } from '../vocabulary/parameters';
import type { MarkStep, ParameterSet, ParameterValues } from '../vocabulary/setting';
import type { TransferCalibration, TransferPlace } from './transfer-ground';
import { isDraftable, transferSetting } from './transfer-setting';

// Expected values of pulses, spacings and intervals are those of packages/physics/test/reference/transfer.json.

const table = (fullW: number, frequencyKhz: number | null = 40, pulseWidthNs: number | null = null): TransferCalibration => ({
  ...{ id: `table ${frequencyKhz}`, measuredOn: '2026-08-17', frequencyKhz, pulseWidthNs },
  points: [1, 50, 100].map((percent) => ({ percent, powerW: (percent / 100) * fullW })),
});

type Given = Omit<Partial<TransferPlace>, 'profile'> & { profile?: Partial<TransferPlace['profile']> };
const place = (given: Given = {}): TransferPlace => ({
  ...{ machineName: 'Bench A', lensName: 'F160', focalLengthMm: 160, measuredSpotUm: 40, panel: emptyPanelFor('fibre-q-switched') },
  calibrations: [table(40)],
  ...given,
  profile: {
    ...{ sourceKind: 'fibre-q-switched', wavelengthNm: 1064, ratedPowerW: 40, m2: 1.5, pulseWidthsNs: [100], topSpeedMmPerS: 8000 },
    maxPulseEnergyMj: [{ pulseWidthNs: null, energyMj: 1.5 }],
    frequencyRangeKhz: { from: 20, to: 400 },
    ...given.profile,
  },
});

const target = (profile: Partial<TransferPlace['profile']> = {}, given: Given = {}): TransferPlace =>
  place({ machineName: 'Bench B', measuredSpotUm: 60, calibrations: [table(60)], ...given, profile: { ratedPowerW: 60, ...profile } });

type Typed = Partial<Record<ParameterKey, number>>;

function stepOf(
  typed: Typed,
  { panel = emptyPanelFor('fibre-q-switched'), ...given }: Partial<ParameterSet> & { panel?: Panel } = {},
): MarkStep {
  const values: ParameterValues = {};
  for (const field of panel.fields) {
    const value = typed[field.parameter];
    if (value === undefined) continue;
    const entry = acceptEntered(field, { value, unit: field.unit });
    if (entry.kind === 'refused') throw new Error(entry.message);
    values[field.parameter] = entry.value;
  }
  const power = { watts: null, reason: 'not asked for' };
  return { purpose: 'engrave', pauseAfterS: 0, parameters: { values, fill: 'both directions', assist: 'none', power, ...given } };
}

/** 20 W, 40 kHz, 400 mm/s, 20 µm: the source of the reference. */
const SOURCE: Typed = { powerPercent: 50, speedMmPerS: 400, frequencyKhz: 40, lineSpacingUm: 0.02, passes: 1, focusOffsetMm: 0 };
const fromReference = (to: TransferPlace, typed: Typed = SOURCE, from = place()) =>
  transferSetting({ steps: [stepOf(typed)], source: from, target: to });
const shownBy = (values: ParameterValues | undefined, key: ParameterKey) => values?.[key]?.entered.value;

describe('a pulsed setting on another machine', () => {
  it('keeps fluence, pitch, overlap and dose, and gives what the panel shows', () => {
    const result = fromReference(target());
    const [step] = result.steps;
    expect(result.outcome).toBe('equivalent');
    expect(step?.interval?.highestKhz).toBeCloseTo(53.333333, 6);
    const values = step?.proposal?.parameters.values;
    expect(shownBy(values, 'powerPercent')).toBe(75);
    expect(shownBy(values, 'speedMmPerS')).toBe(600);
    expect(shownBy(values, 'lineSpacingUm')).toBe(0.03);
    expect(step?.proposal?.kept.map(({ key, deviation }) => [key, Number(deviation.toFixed(9))])).toEqual([
      ['peakFluence', 0],
      ['pitchPerSpot', 0],
      ['spacingPerSpot', 0],
      ['arealDose', 0],
    ]);
    expect(step?.proposal?.kept[0]?.source).toBeCloseTo(79.577472, 6);
    expect(step?.proposal?.timeRatio).toBeCloseTo(0.44444444, 8);
    expect(isDraftable(result)).toBe(true);
  });

  it('follows a frequency that somebody chose inside the interval and refuses one outside', () => {
    const steps = [stepOf(SOURCE)];
    const at = (frequencyKhz: number) =>
      transferSetting({
        steps,
        source: place(),
        target: target({}, { calibrations: [table(60), table(60, 25)] }),
        choices: [{ frequencyKhz }],
      });
    expect(at(25).steps[0]?.proposal?.parameters.values.speedMmPerS?.physical).toBe(375);
    expect(at(60)).toMatchObject({ outcome: 'not known', steps: [{ reasons: [{ code: 'frequency outside interval' }], proposal: null }] });
  });

  it('rounds to the steps of the panel and says how far that moves each number', () => {
    const panel = {
      fields: emptyPanelFor('fibre-q-switched').fields.map((field) =>
        field.parameter === 'powerPercent' ? { ...field, step: 10 } : field,
      ),
    };
    const [step] = fromReference(target({}, { panel })).steps;
    expect(shownBy(step?.proposal?.parameters.values, 'powerPercent')).toBe(70);
    expect(step?.outcome).toBe('not equivalent');
    expect(step?.reasons.map(({ text }) => text)).toEqual([
      'Peak fluence comes out −6.7 % by the steps of the panel of Bench B.',
      'Dose of all scans comes out −6.7 % by the steps of the panel of Bench B.',
    ]);
  });

  it('names the pulse energy that the source does not give, and what comes nearest by dose', () => {
    const [step] = fromReference(target({ maxPulseEnergyMj: [{ pulseWidthNs: null, energyMj: 1 }] }, { measuredSpotUm: 70 })).steps;
    expect(step?.outcome).toBe('not equivalent');
    expect(step?.reasons[0]?.text).toBe('The spot asks for pulses of 1.53 mJ; Bench B gives at most 1 mJ at this pulse width.');
    const dose = step?.proposal?.kept.find(({ key }) => key === 'arealDose');
    const fluence = step?.proposal?.kept.find(({ key }) => key === 'peakFluence');
    expect(Math.abs(dose?.deviation ?? 1)).toBeLessThan(0.005);
    expect(fluence?.deviation).toBeCloseTo(1 / 1.53125 - 1, 3);
  });

  it('says what ends the interval where it is empty', () => {
    const [step] = fromReference(target({ ratedPowerW: 20 }, { calibrations: [table(20)] })).steps;
    expect(step?.interval).toMatchObject({ isEmpty: true, endsBy: 'rated power' });
    expect(step?.interval?.highestKhz).toBeCloseTo(17.777778, 6);
    expect(step?.reasons[0]).toEqual({
      code: 'frequency interval empty',
      text: 'With pulses of 1.13 mJ, the rated 20 W ends the frequencies at 17.8 kHz, below the 20 kHz where Bench B begins.',
    });
  });

  it('carries nothing over to another wavelength', () => {
    const result = fromReference(target({ wavelengthNm: 355 }));
    expect(result).toMatchObject({ outcome: 'not equivalent', steps: [], reasons: [{ code: 'wavelength' }] });
    expect(isDraftable(result)).toBe(false);
  });

  it('never calls another pulse width equivalent, and offers the dose alone', () => {
    const [step] = fromReference(target({ pulseWidthsNs: [200] })).steps;
    expect(step).toMatchObject({ outcome: 'not equivalent', reasons: [{ code: 'pulse width' }] });
    expect(step?.proposal?.kept.find(({ key }) => key === 'arealDose')?.deviation).toBeCloseTo(0, 2);
  });

  it('scales a focus offset with the Rayleigh length and rounds it to the panel', () => {
    const [step] = fromReference(target(), { ...SOURCE, focusOffsetMm: 0.4 }).steps;
    // both spots measured with the same M²: the Rayleigh lengths stand as 60² to 40²
    expect(step?.proposal?.parameters.values.focusOffsetMm?.physical).toBe(0.9);
  });

  it('draws the outline with the same pulses and has no dose of an area', () => {
    const [step] = transferSetting({
      steps: [stepOf({ ...SOURCE, lineSpacingUm: undefined }, { fill: 'outline' })],
      source: place(),
      target: target(),
    }).steps;
    expect(step?.proposal?.kept.map(({ key }) => key)).toEqual(['peakFluence', 'pitchPerSpot']);
    expect(step?.proposal?.parameters.values.lineSpacingUm).toBeUndefined();
  });
});

describe('what is missing', () => {
  const bare = { measuredSpotUm: null };
  it.each([
    ['the beam of the target', target({ beamDiameterMm: undefined }, bare), 'spot unknown', 'target'],
    ['M² of the target', target({ beamDiameterMm: 7, m2: undefined }, bare), 'spot unknown', 'target'],
    ['the table of the target', target({}, { calibrations: [] }), 'calibration missing', 'target'],
    ['a table at its frequency', target({}, { calibrations: [table(60, 200)] }), 'calibration missing', 'target'],
    ['its largest pulse energy', target({ maxPulseEnergyMj: [] }), 'limit unknown', 'target'],
    ['its pulse width', target({ pulseWidthsNs: undefined }), 'limit unknown', 'target'],
  ] as const)('gives a reason and no number without %s', (_, to, code, side) => {
    const result = fromReference(to);
    expect(result.outcome).toBe('not known');
    expect(result.steps[0]?.proposal).toBeNull();
    expect(result.steps[0]?.reasons).toEqual([expect.objectContaining({ code, side })]);
    expect(result.steps[0]?.reasons[0]?.text).toContain('on the machine’s page');
  });

  it.each([
    ['beam', place({ measuredSpotUm: null }), 'spot unknown'],
    ['power table', place({ calibrations: [] }), 'calibration missing'],
    ['pulse width', place({ profile: { pulseWidthsNs: undefined } }), 'limit unknown'],
  ] as const)('says the same of the source: no %s', (_, from, code) => {
    const result = fromReference(target(), SOURCE, from);
    expect(result.outcome).toBe('not known');
    expect(result.steps[0]?.reasons).toEqual([expect.objectContaining({ code, side: 'source' })]);
  });

  it('lists every reason of both sides at once', () => {
    const result = fromReference(target({}, bare), SOURCE, place({ calibrations: [] }));
    expect(result.steps[0]?.reasons.map(({ side }) => side)).toEqual(['source', 'target']);
  });

  it('wants one table for all steps of a draft', () => {
    const two = place({ calibrations: [table(40), table(40, 100)] });
    const steps = [stepOf(SOURCE), stepOf({ ...SOURCE, powerPercent: 10, frequencyKhz: 100 })];
    const to = target({}, { calibrations: [table(60), table(60, 100)] });
    const result = transferSetting({ steps, source: two, target: to });
    expect(result).toMatchObject({ outcome: 'not known', calibrationId: null, reasons: [{ code: 'several calibrations' }] });
    expect(isDraftable(result)).toBe(false);
  });

  it('does not describe a wobbled line', () => {
    const step = stepOf(SOURCE);
    const values = { ...step.parameters.values, wobbleDiameterUm: { entered: { value: 50, unit: 'um' as const }, physical: 50 } };
    const wobbled = { ...step, parameters: { ...step.parameters, values } };
    const result = transferSetting({ steps: [wobbled], source: place(), target: target() });
    expect(result).toMatchObject({ outcome: 'not equivalent', steps: [{ reasons: [{ code: 'wobble' }], proposal: null }] });
  });
});

describe('a continuous setting on another machine', () => {
  const diode = (given: Given = {}, profile: Partial<TransferPlace['profile']> = {}): TransferPlace =>
    place({
      ...{ panel: emptyPanelFor('diode'), measuredSpotUm: 60, calibrations: [table(60, null)], ...given },
      profile: { sourceKind: 'diode', wavelengthNm: 450, ratedPowerW: 60, topSpeedMmPerS: 1000, ...profile },
    });
  // 30 W, 100 mm/s, 80 µm at 60 µm to 90 µm: the reference asks for 67.5 W, 150 mm/s, 120 µm
  const step = stepOf(
    { powerPercent: 50, speedMmPerS: 100, lineSpacingUm: 0.08, passes: 1, focusOffsetMm: 0 },
    { panel: emptyPanelFor('diode') },
  );
  const to = (given: Given, profile: Partial<TransferPlace['profile']>) =>
    transferSetting({ steps: [step], source: diode(), target: diode({ machineName: 'Bench B', measuredSpotUm: 90, ...given }, profile) });

  it('keeps irradiance, interaction time and dose', () => {
    const result = to({ calibrations: [table(100, null)] }, { ratedPowerW: 100 });
    const proposal = result.steps[0]?.proposal;
    expect(result.outcome).toBe('equivalent');
    expect(proposal?.parameters.values).toMatchObject({
      powerPercent: { physical: 67.5 },
      speedMmPerS: { physical: 150 },
      lineSpacingUm: { physical: 120 },
    });
    expect(proposal?.kept.map(({ key, source }) => [key, Number(source.toPrecision(7))])).toEqual([
      ['averageIrradiance', 10610.33],
      ['interactionTime', 600],
      ['spacingPerSpot', 1.333333],
      ['arealDose', 3.75],
    ]);
  });

  it('offers the dose where the power is out of reach', () => {
    const [found] = to({ calibrations: [table(60, null)] }, { ratedPowerW: 60 }).steps;
    expect(found).toMatchObject({ outcome: 'not equivalent', reasons: [{ code: 'power above limit' }] });
    const kept = new Map(found?.proposal?.kept.map(({ key, deviation }) => [key, deviation]));
    expect(kept.get('arealDose')).toBeCloseTo(0, 2);
    expect(kept.get('averageIrradiance')).toBeCloseTo(60 / 67.5 - 1, 6);
  });

  it('does not become pulses', () => {
    const result = transferSetting({ steps: [step], source: diode(), target: place({ profile: { wavelengthNm: 450 } }) });
    expect(result).toMatchObject({ outcome: 'not equivalent', steps: [{ reasons: [{ code: 'beam mode' }] }] });
  });
});
