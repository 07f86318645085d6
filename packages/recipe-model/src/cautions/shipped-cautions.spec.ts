import { MATERIAL_FAMILY_KEYS, type MaterialFamily, materialFamilyOf } from '../vocabulary/material-families';
import { cautionsFor, isForbidden } from './cautions-for';
import { CAUTION_DEFERENCE, SHIPPED_CAUTIONS } from './shipped-cautions';

describe('SHIPPED_CAUTIONS', () => {
  it('forbid exactly these families', () => {
    const forbidden = MATERIAL_FAMILY_KEYS.filter((family) => isForbidden({ family }, SHIPPED_CAUTIONS));
    const expected: MaterialFamily[] = [
      'copper-beryllium',
      'lead-or-cadmium',
      'pvc',
      'fluoropolymer',
      'chlorinated-rubber',
      'lithium-cell',
    ];
    expect(forbidden.sort()).toEqual(expected.sort());
  });

  it('forbid vinyl under whatever name it comes', () => {
    for (const name of ['vinyl', 'PVC', 'artificial leather']) {
      expect(isForbidden({ family: materialFamilyOf(name) }, SHIPPED_CAUTIONS)).toBe(true);
    }
  });

  it('ask for the safety data sheet of what is not listed', () => {
    const cautions = cautionsFor({ family: materialFamilyOf('mystery plastic') }, SHIPPED_CAUTIONS);
    expect(cautions.map(({ text }) => text).join(' ')).toContain('safety data sheet');
  });

  it('stand beside every job and every round part', () => {
    for (const family of MATERIAL_FAMILY_KEYS) {
      const ids = cautionsFor({ family, roundPart: true, sourceKind: 'uv', effectKey: 'own-effect' }, SHIPPED_CAUTIONS).map(({ id }) => id);
      expect(ids).toEqual(expect.arrayContaining(['attendance', 'class-4', 'closed-parts', 'contact', 'rotary']));
    }
  });

  it('have their own ids, a text and a source each', () => {
    expect(new Set(SHIPPED_CAUTIONS.map(({ id }) => id)).size).toBe(SHIPPED_CAUTIONS.length);
    for (const { text, source } of SHIPPED_CAUTIONS) expect(text.length > 10 && source.length > 5).toBe(true);
  });

  it('claim no chlorine of polycarbonate, which holds none, and clear nothing', () => {
    expect(SHIPPED_CAUTIONS.find(({ id }) => id === 'polycarbonate')?.text).not.toMatch(/chlor/iu);
    for (const { text } of [...SHIPPED_CAUTIONS, { text: CAUTION_DEFERENCE }])
      expect(text).not.toMatch(/\b(?:is|are) safe\b|safe to\b|optical density/iu);
  });
});
