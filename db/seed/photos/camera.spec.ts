import { inverse, plateCorners, plateToPicture, project } from './camera';

const view = { widthPx: 1600, heightPx: 1200, turnDeg: 12, tiltXDeg: 18, tiltYDeg: -9, fill: 0.85, distance: 3, shiftX: 0, shiftY: 0 };

describe('plateToPicture', () => {
  const matrix = plateToPicture(72.4, 74.8, view);

  it('keeps the whole plate in the picture and fills the asked share of it', () => {
    const corners = plateCorners(72.4, 74.8).map((corner) => project(matrix, corner));
    const ys = corners.map((corner) => corner.y);
    expect(Math.max(...ys) - Math.min(...ys)).toBeCloseTo(0.85 * 1200, 6);
    for (const { x, y } of corners) {
      expect(x > 0 && x < 1600 && y > 0 && y < 1200).toBe(true);
    }
  });

  it('shows the plate from the front: its corners run clockwise', () => {
    const [a, b, c] = plateCorners(72.4, 74.8).map((corner) => project(matrix, corner));
    const turn = ((b?.x ?? 0) - (a?.x ?? 0)) * ((c?.y ?? 0) - (b?.y ?? 0)) - ((b?.y ?? 0) - (a?.y ?? 0)) * ((c?.x ?? 0) - (b?.x ?? 0));
    expect(turn).toBeGreaterThan(0);
  });

  it('shortens what is farther away', () => {
    const [a, b, c, d] = plateCorners(72.4, 74.8).map((corner) =>
      project(plateToPicture(72.4, 74.8, { ...view, turnDeg: 0, tiltYDeg: 0 }), corner),
    );
    const top = (b?.x ?? 0) - (a?.x ?? 0);
    const bottom = (c?.x ?? 0) - (d?.x ?? 0);
    expect(bottom / top).toBeLessThan(0.97);
  });

  it('is undone by its inverse', () => {
    const back = project(inverse(matrix), project(matrix, { x: 31, y: 17 }));
    expect(back.x).toBeCloseTo(31, 9);
    expect(back.y).toBeCloseTo(17, 9);
  });
});
