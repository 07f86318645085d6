import { filledRectangleTime } from '@proofplate/physics';
import { markAreaOf } from '../numbers/mark-area';
import type { PhysicalProfile } from '../vocabulary/profile';
import type { MarkStep, ParameterSet } from '../vocabulary/setting';
import { overheadsFromMarks } from './clocked-mark';
import { type HeadOverheads, headOverheads } from './head-overheads';
import { markTime, settingTime } from './mark-time';
import { markedAreas } from './marked-area';

const physical: PhysicalProfile = {
  ...{ sourceKind: 'fibre-mopa', wavelengthNm: 1064, ratedPowerW: 60, jumpSpeedMmPerS: 5000, jumpSettleMs: 0.5, laserOnDelayUs: 300 },
};
const value = (amount: number) => ({ entered: { value: amount, unit: 'mm/s' as const }, physical: amount });
const parameters = (given: { speed?: number; passes?: number; fill?: ParameterSet['fill'] } = {}): ParameterSet => ({
  ...{ fill: given.fill ?? 'both directions', assist: 'none', power: { watts: 10, basis: 'calibration' } },
  values: { speedMmPerS: value(given.speed ?? 1000), lineSpacingUm: value(50), passes: value(given.passes ?? 1) },
});
const step = (given = {}, pauseAfterS = 0): MarkStep => ({ purpose: 'fill', parameters: parameters(given), pauseAfterS });
const NOBODY = overheadsFromMarks([], 5000);
const AREA = { widthMm: 20, heightMm: 10 };
const fitted: HeadOverheads = {
  ...{
    basis: 'fitted',
    jumpSpeedMmPerS: 5000,
    n: 6,
    lineMs: 0.8,
    lineStandardErrorMs: 0.05,
    scanMs: 20,
    scanStandardErrorMs: 5,
    spreadS: 0.1,
  },
  scanMissingBecause: null,
};

describe('headOverheads()', () => {
  it('takes the fitted overheads, else the profile with the reason, else the reason alone', () => {
    const fit = overheadsFromMarks(
      [4.3, 4.4, 4.2].map((seconds) => ({ areas: areasOf([parameters()]), pausesS: 0, seconds })),
      5000,
    );
    expect(headOverheads(physical, fit)).toMatchObject({ basis: 'fitted', n: 3, scanMs: null });
    expect(headOverheads(physical, NOBODY)).toEqual({
      ...{ basis: 'profile', jumpSpeedMmPerS: 5000, notFittedBecause: 'no time is logged; it takes 3' },
    });
    expect(headOverheads({}, fit)).toEqual({ basis: 'not known', because: 'the machine’s page gives no jump speed' });
  });
});

const areasOf = (settings: readonly ParameterSet[]) => {
  const marked = markedAreas(settings.map((one) => ({ parameters: one, areaMm: AREA })));
  if ('unknownBecause' in marked) throw new Error(marked.unknownBecause);
  return marked.areas;
};

describe('markedAreas()', () => {
  it('counts rectangles that are alike', () => {
    expect(areasOf([parameters(), parameters({ speed: 500 }), parameters()])).toEqual([
      { ...AREA, lineSpacingUm: 50, speedMmPerS: 1000, passes: 1, fill: 'both directions', count: 2 },
      { ...AREA, lineSpacingUm: 50, speedMmPerS: 500, passes: 1, fill: 'both directions', count: 1 },
    ]);
  });

  it('says why the time of an outline is not known', () => {
    expect(markedAreas([{ parameters: parameters({ fill: 'outline' }), areaMm: AREA }])).toMatchObject({
      unknownBecause: expect.stringMatching(/outline only/),
    });
  });
});

describe('settingTime()', () => {
  it('is the time of the sheet’s rectangle for the delays of the profile', () => {
    const time = settingTime([step()], AREA, { physical, overheads: headOverheads(physical, NOBODY) });
    // process-numbers 2.3: 0.3 ms a line, 0.5 ms a jump
    expect(time.totalS).toBeCloseTo(4.1823, 12);
    expect(time.errorS).toBeNull();
  });

  it('adds fitted lines and scans, their error, and pauses between the steps only', () => {
    const time = settingTime([step({}, 3), step({ passes: 2 }, 9)], AREA, { physical, overheads: fitted });
    // beam 3 x 4.02 s, jumps 3 x 200 x 10 µs, 603 lines, 3 scans, one pause
    expect(time.totalS).toBeCloseTo(12.06 + 0.006 + 603 * 0.0008 + 3 * 0.02 + 3, 9);
    expect(time.errorS).toBeCloseTo(Math.hypot(0.1, 603 * 0.00005, 3 * 0.005), 12);
  });

  it('agrees with the number that stands beside the setting', () => {
    const { jumpSpeedMmPerS, ...area } = markAreaOf(parameters({ passes: 2 }), physical, { ...AREA, overheads: fitted });
    const speeds = { lineSpacingUm: 50, speedMmPerS: 1000, passes: 2, fill: 'both directions' } as const;
    expect(jumpSpeedMmPerS).toBe(5000);
    const beside = filledRectangleTime({ ...area, ...speeds, jumpSpeedMmPerS: 5000 }).totalS;
    expect(settingTime([step({ passes: 2 })], AREA, { physical, overheads: fitted }).totalS).toBeCloseTo(beside, 12);
  });

  it('gives the reason in place of a time', () => {
    const overheads = headOverheads({}, NOBODY);
    expect(settingTime([step()], AREA, { physical, overheads })).toMatchObject({
      ...{ totalS: null, missingBecause: 'the machine’s page gives no jump speed' },
    });
  });
});

describe('overheadsFromMarks()', () => {
  it('finds again the overheads that the times were made with, pauses left out', () => {
    const ground = { physical, overheads: fitted };
    const marks = [
      parameters(),
      parameters({ passes: 30 }),
      parameters({ fill: 'crossed' }),
      parameters({ speed: 400, fill: 'one direction' }),
    ]
      .map((one, index) => [one, { widthMm: 20 + 30 * index, heightMm: 2 + 12 * index }] as const)
      .map(([one, areaMm]) => markedAreas([{ parameters: one, areaMm }]))
      .flatMap((marked) => ('areas' in marked ? [{ areas: marked.areas, pausesS: 2 }] : []))
      .map((mark) => ({ ...mark, seconds: markTime(mark, ground).totalS ?? 0 }));
    const fit = overheadsFromMarks(marks, 5000);
    expect(fit).toMatchObject({ kind: 'fitted', n: 4, scanMissingBecause: null });
    if (fit.kind === 'fitted') expect([fit.lineMs, fit.scanMs]).toEqual([expect.closeTo(0.8, 9), expect.closeTo(20, 6)]);
  });
});
