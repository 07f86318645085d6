import { couponLayout } from '@proofplate/imaging';
import { cellCut, type Plate } from './cell-cut';

const plate: Plate = { rows: 3, columns: 4, cellMm: 5, gapMm: 1.2, rowIndex: 1, columnIndex: 2 };
const UNIT = [
  { x: 0, y: 0 },
  { x: 1, y: 0 },
  { x: 1, y: 1 },
  { x: 0, y: 1 },
];

describe('cellCut()', () => {
  it('is the place of the cell on the plate when the picture is the plate', () => {
    const layout = couponLayout({ rows: 3, columns: 4, cellMm: 5, gapMm: 1.2, reference: '-' });
    const rect = layout.cells.find(({ address }) => address === 'B3')?.rect;
    const cut = cellCut(plate, UNIT);
    expect(cut?.cell.x).toBeCloseTo((rect?.xMm ?? 0) / layout.plate.widthMm, 12);
    expect(cut?.cell.y).toBeCloseTo((rect?.yMm ?? 0) / layout.plate.heightMm, 12);
    expect(cut?.cell.width).toBeCloseTo(5 / layout.plate.widthMm, 12);
    expect(cut?.plate).toEqual({ x: 0, y: 0, width: 1, height: 1 });
  });

  it('shows a rim of bare ground around the cell', () => {
    const cut = cellCut(plate, UNIT);
    const ratio = (cut?.withGround.width ?? 0) / (cut?.cell.width ?? 1);
    expect(ratio).toBeCloseTo(1.4, 12);
  });

  it('follows a plate that lies turned round in the picture', () => {
    const turned = cellCut(
      plate,
      [UNIT[2], UNIT[3], UNIT[0], UNIT[1]].map((corner) => corner ?? { x: 0, y: 0 }),
    );
    const upright = cellCut(plate, UNIT);
    expect(turned?.cell.x).toBeCloseTo(1 - (upright?.cell.x ?? 0) - (upright?.cell.width ?? 0), 12);
    expect(turned?.cell.y).toBeCloseTo(1 - (upright?.cell.y ?? 0) - (upright?.cell.height ?? 0), 12);
  });

  it('keeps straight lines straight in perspective: the centre lies where the diagonals cross', () => {
    const corners = [
      { x: 0.1, y: 0.1 },
      { x: 0.9, y: 0.2 },
      { x: 0.7, y: 0.8 },
      { x: 0.2, y: 0.7 },
    ];
    const whole = cellCut({ ...plate, rows: 1, columns: 1, rowIndex: 0, columnIndex: 0 }, corners);
    // the cell of a one-cell plate holds the crossing of the diagonals in x
    const t = crossing(corners);
    expect(whole?.cell.x).toBeLessThan(t.x);
    expect((whole?.cell.x ?? 0) + (whole?.cell.width ?? 0)).toBeGreaterThan(t.x);
  });

  it('gives nothing for corners that outline no plate, and for a cell that the plate does not have', () => {
    expect(cellCut(plate, UNIT.slice(0, 3))).toBeUndefined();
    expect(
      cellCut(
        plate,
        [UNIT[0], UNIT[0], UNIT[0], UNIT[0]].map((corner) => corner ?? { x: 0, y: 0 }),
      ),
    ).toBeUndefined();
    expect(cellCut({ ...plate, rowIndex: 9 }, UNIT)).toBeUndefined();
  });
});

function crossing(corners: readonly { x: number; y: number }[]) {
  const [a, b, c, d] = corners.map(({ x, y }) => [x, y] as const);
  if (a === undefined || b === undefined || c === undefined || d === undefined) throw new Error('four corners');
  const cross = (p: readonly [number, number], q: readonly [number, number]) => p[0] * q[1] - p[1] * q[0];
  const [r, s] = [[c[0] - a[0], c[1] - a[1]] as const, [d[0] - b[0], d[1] - b[1]] as const];
  const t = cross([b[0] - a[0], b[1] - a[1]], s) / cross(r, s);
  return { x: a[0] + t * r[0], y: a[1] + t * r[1] };
}
