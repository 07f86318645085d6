import fc from 'fast-check';
import { matchesWords } from './matches-words';

describe('matchesWords', () => {
  it.each([
    ['blk anod', 'Black anodised aluminium 6082'],
    ['anod black', 'Black anodised aluminium 6082'],
    ['black anodized aluminum', 'Black anodised aluminium 6082'],
    ['galvanized', 'Galvanised steel'],
    ['316', 'Stainless steel 316L'],
    ['stnls 316l', 'Stainless steel 316L'],
    ['brs', 'Brass, brushed'],
    ['pwdr ct', 'Powder-coated panel'],
    ['ANOD', 'anodised'],
    ['émail', 'Email plate'],
    ['r-0012', 'R-0012 Black anodised dial'],
    ['', 'Anything'],
    ['   ', 'Anything'],
  ])('finds “%s” in “%s”', (query, label) => {
    expect(matchesWords(query, label)).toBe(true);
  });

  it.each([
    ['blk brass', 'Black anodised aluminium'],
    ['red', 'Rounded edge'],
    ['bare', 'Brass'],
    ['nod', 'Anodised'],
    ['317', 'Stainless steel 316L'],
    ['lk', 'Black'],
    ['anodised', 'Anod'],
  ])('does not find “%s” in “%s”', (query, label) => {
    expect(matchesWords(query, label)).toBe(false);
  });

  it('finds every label by the beginnings of its words in any order', () => {
    const words = fc.array(fc.stringMatching(/^[a-z0-9]{1,10}$/), { minLength: 1, maxLength: 5 });
    fc.assert(
      fc.property(words, fc.integer({ min: 1, max: 10 }), (label, length) => {
        const query = label.map((word) => word.slice(0, length)).reverse();
        expect(matchesWords(query.join(' '), label.join(' '))).toBe(true);
      }),
    );
  });
});
