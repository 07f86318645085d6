import { PANEL_UNITS, physicalValue } from '@proofplate/physics';
import { codesOf, isCodeOf } from './labelled';
import * as lists from './lists';
import { MATERIAL_FAMILIES, MATERIAL_FAMILY_KEYS, materialFamilyOf } from './material-families';
import { MEASUREMENT_QUANTITIES, QUANTITIES } from './measurements';
import { criterionText, meetsCriterion } from './meets-criterion';
import { PARAMETER_KEYS, PARAMETERS } from './parameters';
import { ROLES, roleAtLeast } from './roles';

describe('parameters', () => {
  it('are all essential, since the others are no numbers of the panel', () => {
    expect(PARAMETER_KEYS.map((key) => PARAMETERS[key].class)).toEqual(PARAMETER_KEYS.map(() => 'essential'));
    expect([...PARAMETER_KEYS].sort()).toEqual(Object.keys(PARAMETERS).sort());
  });

  it('convert from each of their panel units', () => {
    for (const key of PARAMETER_KEYS) {
      const { unit: storedUnit, panelUnits } = PARAMETERS[key];
      expect(panelUnits).toContain(storedUnit);
      for (const panelUnit of panelUnits) {
        expect(physicalValue(5, { panelUnit, storedUnit, rangeLow: 1, rangeHigh: 200, speedMmPerS: 100 })).toBeGreaterThan(0);
      }
    }
    expect(PANEL_UNITS.um.symbol).toBe('µm');
  });
});

describe('lists', () => {
  it('have words for every code', () => {
    const labelled = Object.entries(lists).filter(([name]) => name.endsWith('_LABELS'));
    expect(labelled.length).toBeGreaterThanOrEqual(8);
    for (const [, labels] of labelled) for (const label of Object.values(labels)) expect(label).toMatch(/^[A-Z\d]/u);
    expect(codesOf(lists.OUTCOME_LABELS)).toHaveLength(14);
    expect(lists.RATINGS.map((rating) => lists.RATING_CAPTIONS[rating])).toContain('usable with remarks');
    expect([...MEASUREMENT_QUANTITIES].sort()).toEqual(Object.keys(QUANTITIES).sort());
  });

  it('take their own codes only, never names that every object has', () => {
    expect(isCodeOf(lists.FILL_LABELS, 'crossed')).toBe(true);
    for (const code of ['Crossed', 'constructor', '__proto__', 5, null]) expect(isCodeOf(lists.FILL_LABELS, code)).toBe(false);
  });
});

describe('materialFamilyOf', () => {
  it.each([
    ['vinyl', 'pvc'],
    ['Artificial leather', 'pvc'],
    ['PTFE', 'fluoropolymer'],
    ['aluminum', 'aluminium'],
    ['Anodised aluminium', 'aluminium'],
    ['316L', 'stainless-steel'],
    ['fr-4', 'brominated-laminate'],
    ['leather', 'chrome-tanned-leather'],
    ['Stainless  steel', 'stainless-steel'],
    ['mystery plastic', 'unknown'],
    ['', 'unknown'],
  ])('takes “%s” as %s', (word, family) => {
    expect(materialFamilyOf(word)).toBe(family);
  });

  it('finds every family by each of its own words', () => {
    for (const family of MATERIAL_FAMILY_KEYS) {
      const { label, synonyms } = MATERIAL_FAMILIES[family];
      for (const word of [family, label, ...synonyms]) expect(materialFamilyOf(word)).toBe(family);
    }
  });
});

describe('roleAtLeast', () => {
  it('orders the roles from trainee to owner', () => {
    expect(ROLES.map((role) => roleAtLeast(role, 'lead'))).toEqual([false, false, true, true]);
    expect(ROLES.every((role) => roleAtLeast(role, role))).toBe(true);
  });
});

describe('meetsCriterion', () => {
  it('counts the limit itself as met', () => {
    expect(meetsCriterion({ quantity: 'contrast', comparison: 'at least', value: 0.6, unit: '1' }, 0.6)).toBe(true);
    expect(meetsCriterion({ quantity: 'lightness', comparison: 'at most', value: 30, unit: '1' }, 30.01)).toBe(false);
    const depth = { quantity: 'depth', comparison: 'between', value: 20, upper: 30, unit: 'µm' } as const;
    expect([19.9, 20, 25, 30, 30.1].map((value) => meetsCriterion(depth, value))).toEqual([false, true, true, true, false]);
  });

  it('is not met by what is no number, nor without an upper limit', () => {
    expect(meetsCriterion({ quantity: 'contrast', comparison: 'at least', value: 0.6, unit: '1' }, Number.NaN)).toBe(false);
    expect(meetsCriterion({ quantity: 'depth', comparison: 'between', value: 20, unit: 'µm' }, 25)).toBe(false);
  });

  it('reads as a sentence', () => {
    expect(criterionText({ quantity: 'depth', comparison: 'between', value: 20, upper: 30, unit: 'µm' })).toBe(
      'Depth between 20 and 30 µm',
    );
    expect(criterionText({ quantity: 'lightness', comparison: 'at most', value: 30, unit: '1' })).toBe('Lightness at most 30');
    expect(criterionText({ quantity: 'contrast', comparison: 'at least', value: 0.5, unit: '1' }, ',')).toContain(' at least 0,5');
  });
});
