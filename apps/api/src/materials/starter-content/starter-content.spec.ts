import { EFFECT_KEYS, isForbidden, type MaterialFamily } from '@proofplate/recipe-model';
import { criteriaProblems } from '../effect-criteria';
import { SHIPPED_CAUTIONS } from './materials-starter-content';
import { SHIPPED_EFFECTS } from './shipped-effects';

const cautions = SHIPPED_CAUTIONS.map(({ shippedKey, ...caution }) => ({ id: shippedKey, ...caution }));
const NEVER_FAMILIES: readonly MaterialFamily[] = [
  'pvc',
  'chlorinated-rubber',
  'fluoropolymer',
  'copper-beryllium',
  'lead-or-cadmium',
  'lithium-cell',
];

describe('the shipped cautions', () => {
  it('have keys of their own', () => {
    expect(new Set(SHIPPED_CAUTIONS.map(({ shippedKey }) => shippedKey)).size).toBe(SHIPPED_CAUTIONS.length);
  });

  it.each(NEVER_FAMILIES)('forbid %s', (family) => {
    expect(isForbidden({ family }, cautions)).toBe(true);
  });

  it.each(['stainless-steel', 'aluminium', 'titanium', 'acrylic', 'unknown'] as const)('do not forbid %s', (family) => {
    expect(isForbidden({ family }, cautions)).toBe(false);
  });

  it('say what to do, why and who says so', () => {
    for (const { subject, text, source } of SHIPPED_CAUTIONS) {
      expect(subject).toMatch(/^[A-Z].*\.$/);
      expect(text.length).toBeGreaterThan(30);
      expect(source.length).toBeGreaterThan(5);
    }
  });

  it('never call anything safe and name no optical density or protection level', () => {
    const words = SHIPPED_CAUTIONS.map(({ subject, text }) => `${subject} ${text}`).join('\n');
    expect(words).not.toMatch(/\bsafe\b|\bharmless\b|\bOD ?\d|\bLB ?\d/i);
  });
});

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
