import { expectReference } from '../../test/expect-reference';
import type { Fill } from './fill';
import { filledRectangleTime } from './filled-rectangle-time';

const NAME = 'scan time of a filled rectangle';
const mark = {
  widthMm: 20,
  heightMm: 10,
  lineSpacingUm: 50,
  speedMmPerS: 1000,
  jumpSpeedMmPerS: 5000,
  lineOverheadMs: 0,
  jumpSettleMs: 0,
  pauseBetweenMs: 0,
  passes: 1,
  fill: 'both directions',
} as const;

function timeOf(inputs: Readonly<Record<string, number>>, fill: Exclude<Fill, 'outline'>) {
  return filledRectangleTime({
    widthMm: inputs.W_mm,
    heightMm: inputs.H_mm,
    lineSpacingUm: inputs.h_mm * 1000,
    speedMmPerS: inputs.v_mm_s,
    jumpSpeedMmPerS: inputs.v_jump_mm_s,
    lineOverheadMs: inputs.t_line_ms,
    jumpSettleMs: inputs.t_jump_ms,
    pauseBetweenMs: inputs.t_between_ms,
    passes: inputs.passes,
    fill,
  });
}

describe('filledRectangleTime', () => {
  expectReference(NAME, 't_unidirectional_s', (inputs) => timeOf(inputs, 'one direction').totalS);
  expectReference(NAME, 't_bidirectional_s', (inputs) => timeOf(inputs, 'both directions').totalS);
  expectReference(NAME, 't_crossed_s', (inputs) => timeOf(inputs, 'crossed').totalS);
  expectReference(NAME, 'beam_on_bidirectional_s', (inputs) => timeOf(inputs, 'both directions').beamOnS);
  expectReference(NAME, 'duty_bidirectional', (inputs) => timeOf(inputs, 'both directions').duty);

  it('marks a square twice in a crossed pass', () => {
    const square = { ...mark, heightMm: 20 };
    expect(filledRectangleTime({ ...square, fill: 'crossed' }).totalS).toBeCloseTo(2 * filledRectangleTime(square).totalS, 12);
  });

  it('pauses between passes, not after the last one', () => {
    const one = filledRectangleTime({ ...mark, pauseBetweenMs: 500 }).totalS;
    expect(filledRectangleTime({ ...mark, pauseBetweenMs: 500, passes: 3 }).totalS).toBeCloseTo(3 * one + 1, 12);
  });

  it('leaves pauses out of the duty', () => {
    const paused = filledRectangleTime({ ...mark, pauseBetweenMs: 500, passes: 3 });
    expect(paused.duty).toBeCloseTo(filledRectangleTime(mark).duty, 12);
  });

  it('is never shorter than the beam-on time', () => {
    for (const fill of ['one direction', 'both directions', 'crossed'] as const) {
      const { totalS, beamOnS, duty } = filledRectangleTime({ ...mark, fill });
      expect(totalS).toBeGreaterThan(beamOnS);
      expect(duty).toBeLessThan(1);
    }
  });

  it('refuses a negative delay and half a pass', () => {
    expect(() => filledRectangleTime({ ...mark, jumpSettleMs: -1 })).toThrow(
      'jumpSettleMs must be a finite number of at least 0, but is -1',
    );
    expect(() => filledRectangleTime({ ...mark, passes: 0.5 })).toThrow('passes must be a whole number of at least 1, but is 0.5');
  });
});
