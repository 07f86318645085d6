import { csvText } from './csv';

describe('csvText', () => {
  it('quotes what holds a comma, a quote or a line break', () => {
    expect(csvText([['316L, brushed', 'say "black"', 'two\nlines', 'plain']])).toBe(
      '"316L, brushed","say ""black""","two\nlines",plain\r\n',
    );
  });

  it('keeps numbers as numbers and leaves what is not known empty', () => {
    expect(csvText([[-0.5, null, 12]])).toBe('-0.5,,12\r\n');
  });

  it.each(['=1+1', '+cmd', '-2+3', '@sum(A1)'])('disarms %s, which a spreadsheet would run', (text) => {
    expect(csvText([[text]])).toBe(`'${text}\r\n`);
  });
});
