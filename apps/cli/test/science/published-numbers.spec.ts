import { sciencePage, tableRows } from './science-pages';

type Row = { readonly speedMmPerS: number; readonly raUm: number };

const rows: readonly Row[] = tableRows(sciencePage('roughness.md').text, '| line spacing µm | frequency kHz | speed mm/s | Ra µm |').map(
  ([, , speed, ra]) => ({ speedMmPerS: Number(speed), raUm: Number(ra) }),
);

describe('the published fall of roughness', () => {
  // Lazov et al., Materials 18 (2025) 5037, abstract: "threefold" next to 1.23 and 0.25 µm, which were marked at different speeds.
  it('is threefold at one speed only, as the page says', () => {
    const falls = rows.flatMap((before, index) =>
      rows.slice(index + 1).map((after) => ({ before, after, fall: before.raUm / after.raUm })),
    );
    const threefold = falls.filter(({ fall }) => Math.round(fall) === 3);
    expect(threefold).toHaveLength(1);
    expect(threefold.every(({ before, after }) => before.speedMmPerS === after.speedMmPerS)).toBe(true);
    expect(Math.max(...falls.map(({ fall }) => fall))).toBeGreaterThan(4.9);
  });
});
