import { type LoggedMark, markingOverheadFit } from './marking-overhead-fit';
import { rectangleScanning, type ScannedRectangle } from './rectangle-scanning';

const square = { lineSpacingUm: 50, speedMmPerS: 1000, jumpSpeedMmPerS: 5000, passes: 1, fill: 'both directions' } as const;

/** Marks clocked on a head that takes 0.4 ms a line and 30 ms a scan; errors of the clock are added. */
function clocked(
  marks: readonly Partial<ScannedRectangle>[],
  { lineS = 0.0004, scanS = 0.03, clockS = [] as readonly number[] } = {},
): LoggedMark[] {
  return marks.map((mark, i) => {
    const scanning = rectangleScanning({ widthMm: 10, heightMm: 10, ...square, ...mark });
    const { beamOnS, jumpTravelS, lines, scans } = scanning;
    return { ...scanning, loggedS: beamOnS + jumpTravelS + lines * lineS + scans * scanS + (clockS[i] ?? 0) };
  });
}

const VARIED: readonly Partial<ScannedRectangle>[] = [
  { widthMm: 40, heightMm: 60 },
  { widthMm: 20, heightMm: 10, passes: 8 },
  { heightMm: 5, passes: 20 },
  { widthMm: 60, heightMm: 40, fill: 'crossed', lineSpacingUm: 30 },
  { widthMm: 30, heightMm: 80, lineSpacingUm: 25 },
  { widthMm: 12, heightMm: 8, passes: 12, fill: 'one direction' },
];

function fittedOf(logs: readonly LoggedMark[]) {
  const fit = markingOverheadFit(logs);
  if (fit.kind === 'not known') throw new Error(fit.because);
  return fit;
}

describe('markingOverheadFit', () => {
  it('finds both constants of exactly clocked marks, without any error', () => {
    const fit = fittedOf(clocked(VARIED));
    expect(fit.n).toBe(6);
    expect(fit.lineMs).toBeCloseTo(0.4, 9);
    expect(fit.scanMs).toBeCloseTo(30, 7);
    expect(fit.lineStandardErrorMs).toBeCloseTo(0, 9);
    expect(fit.scanMissingBecause).toBeNull();
    expect(fit.marks.some(({ isOutlier }) => isOutlier)).toBe(false);
  });

  it('holds the true constants within two standard errors when the clock scatters', () => {
    const fit = fittedOf(clocked(VARIED, { clockS: [0.12, -0.2, 0.05, 0.18, -0.09, -0.14] }));
    expect(Math.abs(fit.lineMs - 0.4)).toBeLessThan(2 * fit.lineStandardErrorMs);
    expect(Math.abs((fit.scanMs ?? 0) - 30)).toBeLessThan(2 * (fit.scanStandardErrorMs ?? 0));
    expect(fit.spreadS).toBeGreaterThan(0.05);
    expect(fit.spreadS).toBeLessThan(0.3);
  });

  it('gives the slope and error of a line through the origin where the lines are fitted alone', () => {
    // y = 1, 2.2, 2.8 s over x = 1000, 2000, 3000 lines: b = 13.8 / 14, r = 0.2 / 14 (1, 16, ...) by hand
    const logs = [1, 2.2, 2.8].map((overheadS, i) => ({
      beamOnS: 10,
      jumpTravelS: 0,
      lines: 1000 * (i + 1),
      scans: 1,
      loggedS: 10 + overheadS,
    }));
    const fit = fittedOf(logs);
    expect(fit.lineMs).toBeCloseTo(13.8 / 14, 12);
    const squares = [1, 2.2, 2.8].reduce((sum, y, i) => sum + (y - ((i + 1) * 13.8) / 14) ** 2, 0);
    expect(fit.lineStandardErrorMs).toBeCloseTo(Math.sqrt(squares / 2 / 14), 12);
    expect(fit.scanMs).toBeNull();
    expect(fit.scanMissingBecause).toBe('time per scan and time per line need 4 logs');
  });

  it('fits the lines alone, and says so, where lines and scans rise together', () => {
    const fit = fittedOf(clocked([{ passes: 1 }, { passes: 2 }, { passes: 4 }, { passes: 8 }, { passes: 3 }]));
    expect(fit.scanMs).toBeNull();
    expect(fit.scanMissingBecause).toMatch(/rise together/);
    // 201 lines a scan carry the 30 ms of the scan
    expect(fit.lineMs).toBeCloseTo(0.4 + 30 / 201, 9);
  });

  it('fits the lines alone where the time per scan is below zero by chance only', () => {
    const fit = fittedOf(clocked(VARIED, { scanS: 0, clockS: [0.1, -0.15, -0.1, 0.05, -0.05, 0.1] }));
    expect(fit.scanMs).toBeNull();
    expect(fit.scanMissingBecause).toMatch(/does not differ from none/);
  });

  it('knows nothing from two logs, from marks faster than their beam, and from a time per scan clearly below zero', () => {
    expect(markingOverheadFit([])).toEqual({ kind: 'not known', n: 0, because: 'no time is logged; it takes 3' });
    expect(markingOverheadFit(clocked(VARIED.slice(0, 2)))).toMatchObject({
      kind: 'not known',
      because: 'only 2 times are logged; it takes 3',
    });
    expect(markingOverheadFit(clocked(VARIED, { lineS: -0.0005, scanS: 0 }))).toMatchObject({ kind: 'not known', n: 6 });
    expect(markingOverheadFit(clocked(VARIED, { lineS: 0.002, scanS: -0.03 }))).toMatchObject({
      kind: 'not known',
      because: expect.stringMatching(/below zero, −30 ms/),
    });
  });

  it('names a mistyped time and counts it all the same', () => {
    const clockS = [0.1, -0.1, 0.05, -0.05, 0.1, 20];
    const fit = fittedOf(clocked(VARIED, { clockS }));
    expect(fit.marks.map(({ isOutlier }) => isOutlier)).toEqual([false, false, false, false, false, true]);
    expect(fit.n).toBe(6);
  });

  it('refuses values that no mark has', () => {
    const [log] = clocked(VARIED);
    expect(() => markingOverheadFit([{ ...log, loggedS: 0 }])).toThrow('loggedS must be a finite number above 0, but is 0');
    expect(() => markingOverheadFit([{ ...log, jumpTravelS: -1 }])).toThrow('jumpTravelS must be a finite number of at least 0, but is -1');
  });
});

describe('rectangleScanning', () => {
  it('counts 201 lines in a scan of the sheet’s rectangle and 401 more across it', () => {
    const mark = { ...square, widthMm: 20, heightMm: 10 };
    expect(rectangleScanning(mark)).toMatchObject({ lines: 201, scans: 1 });
    expect(rectangleScanning({ ...mark, fill: 'crossed', passes: 2 })).toMatchObject({ lines: 2 * 602, scans: 4 });
    expect(rectangleScanning(mark).beamOnS).toBeCloseTo(4.02, 12);
    expect(rectangleScanning(mark).jumpTravelS).toBeCloseTo(200 * 0.00001, 12);
  });
});
