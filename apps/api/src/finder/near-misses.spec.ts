import type { Candidate, SlotKey } from './finder-slots';
import { nearByWords, nearMisses } from './near-misses';

const wanted = { machine: 'bench1', lens: 'f254', material: 'grade2', finish: 'brushed', effect: 'blue' };
const differing = (code: string, differs: Partial<Record<SlotKey, string>>): Candidate => {
  const keys = { ...wanted, ...differs };
  return { recipeId: code, code, title: '', revisionId: code, revisionNumber: 1, keys, materialIds: [keys.material] };
};
const families: Record<string, string> = { grade2: 'titanium', grade5: 'titanium', brass: 'brass' };
const codes = (candidates: Candidate[], choice: Partial<typeof wanted> = wanted) =>
  nearMisses(candidates, choice, (id) => families[id]).map(({ candidate }) => candidate.code);

describe('nearMisses()', () => {
  it('puts the same mark elsewhere first, then another finish, another effect, another grade', () => {
    const candidates = [
      differing('grade', { material: 'grade5' }),
      differing('effect', { effect: 'grey' }),
      differing('finish', { finish: 'polished' }),
      differing('machine', { machine: 'bench2' }),
    ];
    expect(codes(candidates)).toEqual(['machine', 'finish', 'effect']);
    expect(codes(candidates.slice(0, 2))).toEqual(['effect', 'grade']);
  });

  it('prefers fewer differences within the same kind', () => {
    expect(codes([differing('both', { machine: 'bench2', lens: 'f160' }), differing('lens', { lens: 'f160' })])).toEqual(['lens', 'both']);
  });

  it('prefers the same effect on another grade to another effect elsewhere', () => {
    const candidates = [
      differing('effect', { effect: 'grey', machine: 'bench2' }),
      differing('grade', { material: 'grade5', machine: 'bench2' }),
    ];
    expect(codes(candidates)).toEqual(['grade', 'effect']);
  });

  it('never offers a material of another family, nor another grade for another effect', () => {
    expect(codes([differing('brass', { material: 'brass' }), differing('far', { material: 'grade5', effect: 'grey' })])).toEqual([]);
  });

  it('is silent before the material is named', () => {
    const { material: _open, ...rest } = wanted;
    expect(codes([differing('machine', { machine: 'bench2' })], rest)).toEqual([]);
  });

  it('names the slots that differ', () => {
    const [miss] = nearMisses([differing('both', { machine: 'bench2', lens: 'f160' })], wanted, () => undefined);
    expect(miss?.differs).toEqual(['machine', 'lens']);
  });
});

describe('nearByWords()', () => {
  const labels: Record<string, string> = { blue: 'Titanium brushed blue', grey: 'Titanium brushed grey', brass: 'Brass dial' };
  const recipes = Object.keys(labels).map((code) => differing(code, code === 'grey' ? { machine: 'bench2' } : {}));
  const near = (words: string, choice: Partial<typeof wanted> = {}) =>
    nearByWords(recipes, { choice, words }, ({ code }) => labels[code] ?? '').map(({ candidate, missingWords }) => [
      candidate.code,
      ...missingWords,
    ]);

  it('puts what has most of the words first and names the words that it lacks', () => {
    expect(near('titanium blue purple')).toEqual([
      ['blue', 'purple'],
      ['grey', 'blue', 'purple'],
    ]);
  });

  it('prefers what is on the chosen machine, and offers nothing that has none of the words', () => {
    expect(near('titanium purple', { machine: 'bench2' })).toEqual([
      ['grey', 'purple'],
      ['blue', 'purple'],
    ]);
    expect(near('purple')).toEqual([]);
  });
});
