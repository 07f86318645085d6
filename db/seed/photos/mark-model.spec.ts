import { MARK_KINDS, MARK_PROCESSES } from './mark-kinds';
import { groundOfMark, modelMark } from './mark-model';
import { seededRandom } from './noise';

const mark = (kind: (typeof MARK_KINDS)[number], exposure: Parameters<typeof modelMark>[1], seed = 1) =>
  modelMark(kind, exposure, seededRandom(seed));

/** Dose at which the colour comes closest to the wanted one. */
function bestDose(kind: (typeof MARK_KINDS)[number]): number {
  const { path, target } = MARK_PROCESSES[kind];
  const off = ([, lightness, a, b]: (typeof path)[number]) => Math.hypot(lightness - target[0], a - target[1], b - target[2]);
  const [best] = [...path].sort((one, other) => off(one) - off(other));
  return 10 ** (best?.[0] ?? 0);
}

describe('modelMark', () => {
  it.each(MARK_KINDS)('rates %s best near its best dose, and a thirtieth or eight times of it worse', (kind) => {
    const good = mark(kind, { doseJPerMm2: bestDose(kind) });
    expect(good.rating).toBeGreaterThanOrEqual(4);
    expect(good.outcome).toBe('good');
    expect(mark(kind, { doseJPerMm2: bestDose(kind) / 30 }).rating).toBeLessThan(good.rating);
    const burnt = mark(kind, { doseJPerMm2: bestDose(kind) * 8 });
    expect(burnt.rating).toBeLessThan(good.rating);
    expect(burnt.evenness).toBeGreaterThan(good.evenness);
  });

  it.each(MARK_KINDS)('leaves no mark on %s far below its threshold and damage far above', (kind) => {
    expect(mark(kind, { doseJPerMm2: 1e-3 })).toMatchObject({ outcome: 'no mark', rating: 0 });
    expect(mark(kind, { doseJPerMm2: 100 }).outcome).toBe(MARK_PROCESSES[kind].overburnOutcome);
  });

  it('tears steel where the peak power is far above what heating takes', () => {
    const doseJPerMm2 = bestDose('stainless dark anneal');
    const gentle = mark('stainless dark anneal', { doseJPerMm2, peakPowerKw: 1.5 });
    const harsh = mark('stainless dark anneal', { doseJPerMm2, peakPowerKw: 30 });
    expect(harsh.texture.overburn).toBeGreaterThan(gentle.texture.overburn + 0.3);
    expect(harsh.rating).toBeLessThan(gentle.rating);
  });

  it('shows single dots where the pulses lie far apart', () => {
    const doseJPerMm2 = bestDose('anodised black bleach');
    expect(mark('anodised black bleach', { doseJPerMm2, peakPowerKw: 8, pulsePitchUm: 90 }).outcome).toBe('banded');
    expect(mark('anodised black bleach', { doseJPerMm2, peakPowerKw: 8, pulsePitchUm: 10 }).outcome).toBe('good');
  });

  it('darkens steel and lightens black anodising', () => {
    expect(mark('stainless dark anneal', { doseJPerMm2: bestDose('stainless dark anneal') }).lab[0]).toBeLessThan(30);
    expect(mark('anodised black bleach', { doseJPerMm2: bestDose('anodised black bleach') }).lab[0]).toBeGreaterThan(75);
    expect(groundOfMark('anodised black bleach')).toBe('anodised black');
  });

  it('gives the same mark for the same seed', () => {
    expect(mark('slate engrave', { doseJPerMm2: 1.2 }, 4)).toEqual(mark('slate engrave', { doseJPerMm2: 1.2 }, 4));
  });

  it.each([0, -1, Number.NaN])('refuses a dose of %p', (doseJPerMm2) => {
    expect(() => mark('slate engrave', { doseJPerMm2 })).toThrow(/doseJPerMm2/);
  });
});
