import type { Caution, CautionScope } from './caution';
import { cautionsFor, isForbidden } from './cautions-for';

const caution = (id: string, level: Caution['level'], appliesTo: CautionScope): Caution => ({
  id,
  level,
  subject: id,
  text: 'Ask the laser safety officer.',
  source: 'invented',
  appliesTo,
});

const CAUTIONS = [
  caution('always', 'care', {}),
  caution('round', 'care', { roundPart: true }),
  caution('pvc', 'never', { families: ['pvc'] }),
  caution('polished copper on fibre', 'care', { families: ['copper', 'brass'], sourceKinds: ['fibre-q-switched', 'fibre-mopa'] }),
  caution('this finish', 'never', { finishIds: ['f1'] }),
  caution('deep', 'care', { effectKeys: ['deep-engrave'] }),
  caution('this material', 'care', { materialIds: ['m1'] }),
];
const ids = (subject: Parameters<typeof cautionsFor>[0]) => cautionsFor(subject, CAUTIONS).map(({ id }) => id);

describe('cautionsFor', () => {
  it('puts never before care and keeps the order else', () => {
    expect(ids({ family: 'pvc', effectKey: 'deep-engrave', roundPart: true, sourceKind: 'co2' })).toEqual([
      'pvc',
      'always',
      'round',
      'deep',
    ]);
  });

  it('needs every condition of a caution to hold', () => {
    expect(ids({ family: 'copper', sourceKind: 'fibre-mopa', effectKey: 'frost' })).toEqual(['always', 'polished copper on fibre']);
    expect(ids({ family: 'copper', sourceKind: 'co2', effectKey: 'frost' })).toEqual(['always']);
    expect(ids({ family: 'acrylic', sourceKind: 'fibre-mopa', effectKey: 'frost' })).toEqual(['always']);
  });

  it('shows a caution too many while source and effect are still open', () => {
    expect(ids({ family: 'brass' })).toEqual(['always', 'polished copper on fibre', 'deep']);
  });

  it('matches the material and the finish themselves', () => {
    expect(ids({ family: 'acrylic', materialId: 'm1', finishId: 'f1', sourceKind: 'co2', effectKey: 'frost' })).toEqual([
      'this finish',
      'always',
      'this material',
    ]);
  });
});

describe('isForbidden', () => {
  it('is true as soon as one never applies', () => {
    expect(isForbidden({ family: 'pvc' }, CAUTIONS)).toBe(true);
    expect(isForbidden({ family: 'acrylic', finishId: 'f1' }, CAUTIONS)).toBe(true);
    expect(isForbidden({ family: 'acrylic', roundPart: true }, CAUTIONS)).toBe(false);
  });
});
