import { arucoModules, type FiducialId } from './aruco-4x4';

const IDS: readonly FiducialId[] = [0, 1, 2, 3];

function turn(modules: readonly (readonly boolean[])[]): boolean[][] {
  return modules.map((_, row) => modules.map((line) => line[row]).reverse());
}

function innerDistance(a: readonly (readonly boolean[])[], b: readonly (readonly boolean[])[]): number {
  return a.flat().filter((dark, index) => dark !== b.flat()[index]).length;
}

describe('arucoModules', () => {
  it.each([
    [0, 181, 50],
    [1, 15, 154],
    [2, 51, 45],
    [3, 153, 70],
  ] as const)('packs marker %i into the published bytes %i and %i, bright bit first', (id, first, second) => {
    const bits = arucoModules(id)
      .slice(1, 5)
      .flatMap((row) => row.slice(1, 5))
      .map((dark) => (dark ? '0' : '1'))
      .join('');
    expect([Number.parseInt(bits.slice(0, 8), 2), Number.parseInt(bits.slice(8), 2)]).toEqual([first, second]);
  });

  it('surrounds every marker with a dark border', () => {
    for (const id of IDS) {
      const modules = arucoModules(id);
      expect(modules).toHaveLength(6);
      expect([...modules[0], ...modules[5], ...modules.map((row) => row[0]), ...modules.map((row) => row[5])].every(Boolean)).toBe(true);
    }
  });

  it('keeps the four markers apart by at least four modules in every turn, so one wrong module names no other corner', () => {
    for (const a of IDS) {
      let other = arucoModules(a);
      for (let quarter = 0; quarter < 4; quarter += 1) {
        for (const b of IDS) {
          if (a !== b || quarter > 0) {
            expect(innerDistance(other, arucoModules(b))).toBeGreaterThanOrEqual(4);
          }
        }
        other = turn(other);
      }
    }
  });

  it('refuses an id that is no corner', () => {
    expect(() => arucoModules(4 as FiducialId)).toThrow(RangeError);
  });
});
