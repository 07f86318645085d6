import { pointProblems } from './calibration-points';

describe('pointProblems', () => {
  it('accepts rising percentages with watts that rise or stay', () => {
    expect(
      pointProblems([
        { percent: 0, watts: 0 },
        { percent: 10, watts: 0 },
        { percent: 20, watts: 0.6 },
      ]),
    ).toEqual([]);
  });

  it('names the pair whose watts fall, at the later reading', () => {
    const [problem] = pointProblems([
      { percent: 10, watts: 1 },
      { percent: 20, watts: 3 },
      { percent: 30, watts: 2.5 },
    ]);
    expect(problem?.pointer).toBe('#/points/2/watts');
    expect(problem?.detail).toContain('Readings 2 and 3 (20 % 3 W; 30 % 2.5 W)');
  });

  it('names every pair whose percentage does not rise', () => {
    const problems = pointProblems([
      { percent: 10, watts: 1 },
      { percent: 10, watts: 2 },
      { percent: 5, watts: 3 },
    ]);
    expect(problems.map(({ pointer }) => pointer)).toEqual(['#/points/1/percent', '#/points/2/percent']);
  });
});
