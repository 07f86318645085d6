import { CAUTION_DEFERENCE } from '../cautions/caution';
import { cautionsFor, isForbidden } from '../cautions/cautions-for';
import { MATERIAL_FAMILY_KEYS, type MaterialFamily, materialFamilyOf } from '../vocabulary/material-families';
import { SHIPPED_CAUTIONS } from './shipped-cautions';

const cautions = SHIPPED_CAUTIONS.map(({ shippedKey, ...caution }) => ({ id: shippedKey, ...caution }));
const wordsAbout = (name: string) =>
  cautionsFor({ family: materialFamilyOf(name) }, cautions).map(({ subject, text }) => `${subject} ${text}`);

describe('the shipped cautions', () => {
  it('have keys of their own', () => {
    expect(new Set(SHIPPED_CAUTIONS.map(({ shippedKey }) => shippedKey)).size).toBe(SHIPPED_CAUTIONS.length);
  });

  it('forbid exactly these families', () => {
    const forbidden = MATERIAL_FAMILY_KEYS.filter((family) => isForbidden({ family }, cautions));
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
      expect(isForbidden({ family: materialFamilyOf(name) }, cautions)).toBe(true);
    }
  });

  it('name the hydrogen chloride of PVC', () => {
    expect(wordsAbout('vinyl').join(' ')).toContain('hydrogen chloride');
  });

  it('ask for the safety data sheet of what is not listed', () => {
    expect(wordsAbout('mystery plastic').join(' ')).toContain('safety data sheet');
  });

  it('say what to do, why and who says so', () => {
    for (const { subject, text, source } of SHIPPED_CAUTIONS) {
      expect(subject).toMatch(/^[A-Z].*\.$/);
      expect(text.length).toBeGreaterThan(30);
      expect(source.length).toBeGreaterThan(5);
    }
  });

  it('call nothing safe, name no optical density or protection level, and claim no chlorine of polycarbonate', () => {
    const words = [...SHIPPED_CAUTIONS.map(({ subject, text }) => `${subject} ${text}`), CAUTION_DEFERENCE].join('\n');
    expect(words).not.toMatch(/\bsafe\b|\bharmless\b|\bOD ?\d|\bLB ?\d/i);
    const ofPolycarbonate = SHIPPED_CAUTIONS.filter(({ appliesTo }) => appliesTo.families?.includes('polycarbonate'));
    expect(ofPolycarbonate.map(({ text }) => text).join(' ')).not.toMatch(/chlor/iu);
  });
});
