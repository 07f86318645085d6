import { openToken, sealToken } from './sealed-token';

describe('sealToken()', () => {
  it('gives the token back to whoever holds the opener', () => {
    expect(openToken(sealToken('successor', 'old token', 'secret'), 'old token', 'secret')).toBe('successor');
  });

  it('gives nothing to another opener, another secret or after a change', () => {
    const sealed = sealToken('successor', 'old token', 'secret');
    const changed = Buffer.from(sealed, 'base64url');
    changed[changed.length - 1] = (changed.at(-1) ?? 0) ^ 1;
    expect(() => openToken(sealed, 'other token', 'secret')).toThrow();
    expect(() => openToken(sealed, 'old token', 'other secret')).toThrow();
    expect(() => openToken(changed.toString('base64url'), 'old token', 'secret')).toThrow();
  });
});
