import fc from 'fast-check';
import type { PanelField } from '../panel/panel';
import { isShowable } from '../panel/showable';
import { type LevelRequest, levels } from './levels';

const SPEED: PanelField = { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', minimum: 1, maximum: 7000, step: 1 };
const POWER: PanelField = { parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero', minimum: 0, maximum: 100, step: 0.5 };
const WIDTH: PanelField = { parameter: 'pulseWidthNs', label: 'Pulse', unit: 'ns', choices: [4, 8, 14, 20, 30, 50, 100, 200] };

function shown(request: LevelRequest): number[] | string {
  const got = levels(request);
  return got.kind === 'levels' ? got.values.map((value) => value.entered.value) : got.message;
}

describe('levels', () => {
  it('gives equal steps', () => {
    expect(shown({ from: 200, to: 1000, count: 5, spacing: 'steps', field: SPEED })).toEqual([200, 400, 600, 800, 1000]);
    expect(shown({ from: 100, to: 40, count: 3, spacing: 'steps', field: POWER })).toEqual([100, 70, 40]);
    expect(shown({ from: 30, to: 30, count: 1, spacing: 'steps', field: POWER })).toEqual([30]);
  });

  it('gives equal ratios rounded to what the panel shows', () => {
    expect(shown({ from: 100, to: 1600, count: 5, spacing: 'ratios', field: SPEED })).toEqual([100, 200, 400, 800, 1600]);
    expect(shown({ from: 10, to: 80, count: 4, spacing: 'ratios', field: { ...SPEED, step: 15, minimum: 10 } })).toContain(
      'the panel cannot show 80 mm/s',
    );
    expect(shown({ from: 10, to: 75, count: 3, spacing: 'ratios', field: { ...POWER, step: 5 } })).toEqual([10, 25, 75]);
    expect(shown({ from: 4, to: 200, count: 4, spacing: 'ratios', field: WIDTH })).toEqual([4, 14, 50, 200]);
  });

  it('refuses levels that would fall together on the panel', () => {
    expect(shown({ from: 10, to: 11, count: 5, spacing: 'steps', field: POWER })).toBe(
      'Power: the panel cannot show 5 different levels from 10 to 11. Take fewer levels or a wider range.',
    );
  });

  it('refuses ends that the panel cannot show instead of moving them', () => {
    expect(levels({ from: 10.2, to: 20, count: 3, spacing: 'steps', field: POWER })).toMatchObject({
      kind: 'refused',
      nearest: [{ value: 10 }, { value: 10.5 }],
    });
    expect(shown({ from: 100, to: 9000, count: 3, spacing: 'steps', field: SPEED })).toContain('Speed must be 1 to 7000 mm/s');
  });

  it('refuses requests that make no levels', () => {
    expect(shown({ from: 1, to: 2, count: 0, spacing: 'steps', field: SPEED })).toBe('A factor has 1 to 50 levels.');
    expect(shown({ from: 1, to: 2, count: 2.5, spacing: 'steps', field: SPEED })).toBe('A factor has 1 to 50 levels.');
    expect(shown({ from: 5, to: 5, count: 3, spacing: 'steps', field: SPEED })).toContain('are the same');
    expect(shown({ from: 5, to: 6, count: 1, spacing: 'steps', field: SPEED })).toContain('one level');
    expect(shown({ from: 0, to: 50, count: 3, spacing: 'ratios', field: POWER })).toContain('above zero');
    expect(shown({ from: Number.NaN, to: 50, count: 3, spacing: 'steps', field: POWER })).toContain('must be a number');
  });

  it('is always strictly monotone, showable, and starts and ends as asked', () => {
    const requests = fc.record({
      from: fc.integer({ min: 1, max: 200 }).map((half) => half / 2),
      to: fc.integer({ min: 1, max: 200 }).map((half) => half / 2),
      count: fc.integer({ min: 2, max: 12 }),
      spacing: fc.constantFrom('steps' as const, 'ratios' as const),
    });
    fc.assert(
      fc.property(requests, (request) => {
        const got = shown({ ...request, field: POWER });
        if (typeof got === 'string') {
          // Far enough apart for a half percent between neighbours, equal steps must never be refused.
          const isWide =
            request.spacing === 'steps' && Math.abs(request.to - request.from) >= 0.5 * (request.count - 1) && request.to !== request.from;
          expect(isWide).toBe(false);
          return;
        }
        expect([got[0], got[got.length - 1], got.length]).toEqual([request.from, request.to, request.count]);
        const sign = Math.sign(request.to - request.from);
        for (const [index, level] of got.entries()) {
          expect(isShowable(POWER, level)).toBe(true);
          if (index > 0) expect(Math.sign(level - got[index - 1])).toBe(sign);
        }
      }),
    );
  });
});
