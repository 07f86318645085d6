import { EFFECT_KEYS, SHIPPED_EFFECTS } from '@proofplate/recipe-model';
import { criteriaProblems } from '../effect-criteria';

describe('the shipped effects', () => {
  it('are the closed list, each with sound criteria that say they have no source', () => {
    expect(SHIPPED_EFFECTS.map(({ key }) => key)).toEqual(EFFECT_KEYS);
    for (const { criteria, notes } of SHIPPED_EFFECTS) {
      expect(criteria.length).toBeGreaterThan(0);
      expect(criteriaProblems(criteria)).toEqual([]);
      expect(notes).toContain('no source');
    }
  });
});
