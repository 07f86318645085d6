import { choiceFrom, forgetChoice, inSentence, keepChoice, keptChoice, paramsOf, slotCaption } from './sentence';

describe('the sentence in the address', () => {
  it('comes back as it was written', () => {
    const choice = { machine: 'm', material: 'x', words: 'blk anod' };
    expect(choiceFrom(paramsOf(choice))).toEqual(choice);
  });

  it('leaves out what is empty or not its own', () => {
    expect(choiceFrom(new URLSearchParams('machine=&lens=l&colour=red'))).toEqual({ lens: 'l' });
  });
});

describe('machine and lens of the last use', () => {
  afterEach(forgetChoice);

  it('are kept for the shop that they belong to', () => {
    keepChoice('shop-1', { machine: 'm', lens: 'l', material: 'x' });
    expect(keptChoice('shop-1')).toEqual({ machine: 'm', lens: 'l' });
    expect(keptChoice('shop-2')).toEqual({});
  });

  it('are nothing when what is stored is not ours', () => {
    localStorage.setItem('proofplate.machine-and-lens', '{broken');
    expect(keptChoice('shop-1')).toEqual({});
  });
});

it.each([
  [3, true, 'material, 3 fit'],
  [1, true, 'material, 1 fits'],
  [1, false, 'material, 1 other fits'],
  [2, false, 'material, 2 others fit'],
  [0, false, 'material, none fits'],
])('a slot with %d options says %s, %s', (count, isFitting, words) => {
  expect(slotCaption('material', count, isFitting)).toBe(words);
});

it('names run on in the sentence, abbreviations and machines keep their capitals', () => {
  expect(inSentence('material', 'Black anodised 6061')).toBe('black anodised 6061');
  expect(inSentence('material', 'ABS panel')).toBe('ABS panel');
  expect(inSentence('machine', 'Bench 2')).toBe('Bench 2');
});
