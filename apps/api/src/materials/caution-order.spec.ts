import type { Caution, CautionScope } from '@proofplate/recipe-model';
import { cautionsNaming, isGeneralCaution, orderedCautionsFor, orderedCautionsForAny } from './caution-order';

const caution = (id: string, level: Caution['level'], appliesTo: CautionScope): Caution => ({
  id,
  level,
  subject: id,
  text: 'why',
  source: 'where from',
  appliesTo,
});
const cautions = [
  caution('all work', 'care', {}),
  caution('round', 'care', { roundPart: true }),
  caution('brass', 'care', { families: ['brass'] }),
  caution('brass engraved', 'care', { families: ['brass'], effectKeys: ['deep-engrave'] }),
  caution('this sheet', 'never', { materialIds: ['m1'] }),
  caution('wood', 'never', { families: ['wood'] }),
];
const ids = (list: readonly Caution[]) => list.map(({ id }) => id);

describe('orderedCautionsFor', () => {
  it('puts never first, then what names the material, the general last', () => {
    const subject = { family: 'brass', materialId: 'm1', effectKey: 'deep-engrave', roundPart: true } as const;
    expect(ids(orderedCautionsFor(subject, cautions))).toEqual(['this sheet', 'brass engraved', 'brass', 'round', 'all work']);
  });

  it('leaves out what is bound to another effect or to round parts', () => {
    expect(ids(orderedCautionsFor({ family: 'brass', effectKey: 'frost' }, cautions))).toEqual(['brass', 'all work']);
  });
});

describe('orderedCautionsForAny', () => {
  it('takes what applies to any of the materials, once each, never first', () => {
    const subjects = [
      { family: 'brass', materialId: 'm2', effectKey: 'frost' },
      { family: 'wood', materialId: 'm1', effectKey: 'frost' },
    ] as const;
    expect(ids(orderedCautionsForAny(subjects, cautions))).toEqual(['this sheet', 'wood', 'brass', 'all work']);
  });
});

describe('cautionsNaming', () => {
  it('keeps only those that name the material or its family', () => {
    expect(ids(cautionsNaming({ family: 'brass', materialId: 'm2' }, cautions))).toEqual(['brass engraved', 'brass']);
  });
});

describe('isGeneralCaution', () => {
  it('is one that is bound to no material, finish, source, effect or shape', () => {
    expect(ids(cautions.filter(isGeneralCaution))).toEqual(['all work']);
  });
});
