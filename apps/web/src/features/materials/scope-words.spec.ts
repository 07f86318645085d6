import { scopeWords } from './scope-words';

const names = {
  materials: new Map([['m1', 'Dial blank']]),
  finishes: new Map([['f1', 'Black anodised']]),
  effects: new Map([
    ['frost', 'Frost'],
    ['foam', 'Foam'],
  ]),
};

describe('scopeWords', () => {
  it('says all work where there is no condition', () => {
    expect(scopeWords({}, names)).toBe('All work');
  });

  it('joins the entries of one condition by or and the conditions by a dot', () => {
    expect(scopeWords({ families: ['brass', 'zinc', 'copper'], effectKeys: ['frost', 'foam'], roundPart: true }, names)).toBe(
      'Brass, Zinc or Copper · Frost or Foam · round parts that turn',
    );
  });

  it('begins with a capital letter', () => {
    expect(scopeWords({ roundPart: true }, names)).toBe('Round parts that turn');
  });

  it('names the shop’s own things, and says when one is no longer listed', () => {
    expect(scopeWords({ materialIds: ['m1', 'gone'], finishIds: ['f1'], sourceKinds: ['co2'] }, names)).toBe(
      'Dial blank or a material that is archived · Black anodised · CO₂',
    );
  });
});
