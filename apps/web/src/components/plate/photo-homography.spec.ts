import { type FlatView, flatteningTransform, plateCoordinates } from './photo-homography';

const TILTED: FlatView['corners'] = [
  { x: 0.12, y: 0.08 },
  { x: 0.9, y: 0.15 },
  { x: 0.84, y: 0.95 },
  { x: 0.06, y: 0.85 },
];
const plate = { widthMm: 80, heightMm: 60 };

/** What a browser does with the sixteen numbers of matrix3d for a point of the plane. */
function applied(transform: string, x: number, y: number) {
  const m = transform.slice('matrix3d('.length, -1).split(',').map(Number);
  const at = (index: number) => m[index] ?? Number.NaN;
  const weight = at(3) * x + at(7) * y + at(15);
  return { x: (at(0) * x + at(4) * y + at(12)) / weight, y: (at(1) * x + at(5) * y + at(13)) / weight };
}

describe('flatteningTransform', () => {
  const view: FlatView = {
    corners: TILTED,
    plate,
    region: { xMm: 0, yMm: 0, widthMm: 80, heightMm: 60 },
    pxPerMm: 5,
    picturePx: { width: 1000, height: 750 },
  };

  it.each([
    [0, 0, 0],
    [1, 400, 0],
    [2, 400, 300],
    [3, 0, 300],
  ] as const)('puts corner %i of the plate into a corner of the box', (corner, x, y) => {
    const point = TILTED[corner];
    const place = applied(flatteningTransform(view) ?? '', point.x * 1000, point.y * 750);
    expect(place.x).toBeCloseTo(x, 4);
    expect(place.y).toBeCloseTo(y, 4);
  });

  it('shows a part of the plate larger, with its own corner at the origin', () => {
    const region = { xMm: 20, yMm: 10, widthMm: 8, heightMm: 8 };
    const transform = flatteningTransform({ ...view, region, pxPerMm: 20 }) ?? '';
    const place = applied(transform, TILTED[0].x * 1000, TILTED[0].y * 750);
    expect(place.x).toBeCloseTo(-400, 3);
    expect(place.y).toBeCloseTo(-200, 3);
  });

  it('keeps a straight picture straight', () => {
    const straight: FlatView['corners'] = [
      { x: 0, y: 0 },
      { x: 1, y: 0 },
      { x: 1, y: 1 },
      { x: 0, y: 1 },
    ];
    expect(plateCoordinates({ x: 0.25, y: 0.5 }, { corners: straight, plate })).toEqual({ xMm: 20, yMm: 30 });
  });

  it('gives nothing for corners on one line', () => {
    const at = (share: number) => ({ x: share, y: share });
    const line: FlatView['corners'] = [at(0), at(0.25), at(0.5), at(0.75)];
    expect(flatteningTransform({ ...view, corners: line })).toBeUndefined();
  });
});
