import { isComplete, moved, nudgeOf, placed, startCorners, undone, withChange, withoutTrace } from './corner-history';

describe('corners while they are set', () => {
  it('are placed one after the other, four at most, inside the picture', () => {
    const points = [-0.2, 0.3, 0.6, 0.9, 0.5].map((x) => ({ x, y: 1.4 }));
    const corners = points.reduce(placed, [] as ReturnType<typeof placed>);
    expect(corners).toEqual([0, 0.3, 0.6, 0.9].map((x) => ({ x, y: 1 })));
    expect(isComplete(corners)).toBe(true);
  });

  it('are taken back change by change, a whole drag as one', () => {
    const first = { present: startCorners, past: [] };
    const grabbed = withChange(first, moved(startCorners, 1, { x: 0.8, y: 0.2 }));
    const dragged = withoutTrace(grabbed, moved(grabbed.present, 1, { x: 0.7, y: 0.3 }));
    expect(dragged.present[1]).toEqual({ x: 0.7, y: 0.3 });
    expect(undone(dragged).present).toBe(startCorners);
    expect(undone(undone(dragged)).present).toBe(startCorners);
  });

  it('move by one pixel, with Shift by ten', () => {
    expect(nudgeOf('ArrowLeft', false)).toEqual({ x: -1, y: 0 });
    expect(nudgeOf('ArrowDown', true)).toEqual({ x: 0, y: 10 });
    expect(nudgeOf('a', false)).toBeUndefined();
  });
});
