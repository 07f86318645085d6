import fc from 'fast-check';
import { expectWithin, referenceRecords } from '../../test/expect-reference';
import { percentForPower } from './percent-for-power';
import { powerAtPercent } from './power-at-percent';
import { type CalibrationPoint, powerCalibration } from './power-calibration';

type Inputs = {
  readonly percent: readonly number[];
  readonly watts: readonly number[];
  readonly query_percent: readonly number[];
  readonly query_watts: readonly number[];
};
type Expected = {
  readonly watts: readonly number[];
  readonly percent_for_watts: readonly number[];
  readonly slopes_W_per_percent: readonly number[];
};

const RELATIVE = 1e-9;
const pointsOf = ({ percent, watts }: Inputs): CalibrationPoint[] =>
  percent.map((value, index) => ({ percent: value, powerW: watts[index] }));
const records = referenceRecords<Inputs, Expected>('power calibration: percent to watts and back (monotone PCHIP)');
const dead = powerCalibration([
  { percent: 0, powerW: 0 },
  { percent: 10, powerW: 0 },
  { percent: 50, powerW: 8 },
  { percent: 70, powerW: 8 },
  { percent: 100, powerW: 12 },
]);

describe('power calibration', () => {
  it.each(records.map((record) => [record.inputs.percent.length, record] as const))(
    'follows the reference table of %d points both ways',
    (_n, record) => {
      const calibration = powerCalibration(pointsOf(record.inputs));
      const { expected, inputs } = record;
      for (const [index, slope] of expected.slopes_W_per_percent.entries())
        expectWithin(calibration.slopesWPerPercent[index], slope, RELATIVE);
      for (const [index, watts] of expected.watts.entries())
        expectWithin(powerAtPercent(calibration, inputs.query_percent[index]), watts, RELATIVE);
      for (const [index, percent] of expected.percent_for_watts.entries()) {
        expectWithin(percentForPower(calibration, inputs.query_watts[index]), percent, RELATIVE);
      }
    },
  );

  it('returns the lowest percent on a flat part', () => {
    expect(percentForPower(dead, 0)).toBe(0);
    expect(percentForPower(dead, 8)).toBe(50);
    expect(powerAtPercent(dead, 60)).toBe(8);
    expect(powerAtPercent(dead, 5)).toBe(0);
  });

  it('comes back to the same power from any rising table', () => {
    const steps = fc.array(fc.tuple(fc.double({ min: 1, max: 20, noNaN: true }), fc.double({ min: 0, max: 5, noNaN: true })), {
      minLength: 3,
      maxLength: 9,
    });
    fc.assert(
      fc.property(steps, fc.double({ min: 0, max: 1, noNaN: true }), (pairs, share) => {
        let percent = 0;
        let powerW = 0;
        const points = pairs.map(([percentStep, powerStep]) => {
          percent += percentStep;
          powerW += powerStep;
          return { percent, powerW };
        });
        const calibration = powerCalibration(points);
        const wantedW = points[0].powerW + share * (powerW - points[0].powerW);
        const setting = percentForPower(calibration, Math.min(wantedW, powerW));
        expect(powerAtPercent(calibration, setting)).toBeCloseTo(wantedW, 9);
      }),
    );
  });

  it('does not extrapolate', () => {
    const calibration = powerCalibration(pointsOf(records[0].inputs));
    expect(() => powerAtPercent(calibration, 4)).toThrow('percent must lie in the measured range of 5 to 100, but is 4');
    expect(() => percentForPower(calibration, 19.3)).toThrow('powerW must lie in the measured range of 0.1 to 19.2, but is 19.3');
    expect(() => percentForPower(calibration, Number.NaN)).toThrow(RangeError);
  });

  it('names the pair of points that breaks the order', () => {
    const good = { percent: 10, powerW: 1 };
    expect(() => powerCalibration([good, { percent: 20, powerW: 3 }, { percent: 30, powerW: 2.9 }])).toThrow(
      'powerW must not fall with the percent, but does between points 2 and 3 (20 % 3 W, 30 % 2.9 W)',
    );
    expect(() => powerCalibration([good, { percent: 10, powerW: 3 }, { percent: 30, powerW: 4 }])).toThrow(
      'percent must rise from point to point, but does not between points 1 and 2 (10 % 1 W, 10 % 3 W)',
    );
  });

  it('needs three points and no negative value', () => {
    expect(() =>
      powerCalibration([
        { percent: 0, powerW: 0 },
        { percent: 100, powerW: 20 },
      ]),
    ).toThrow('a calibration needs at least 3 points, but has 2');
    expect(() =>
      powerCalibration([
        { percent: -1, powerW: 0 },
        { percent: 50, powerW: 5 },
        { percent: 100, powerW: 9 },
      ]),
    ).toThrow('points[0].percent must be a finite number of at least 0, but is -1');
  });
});
