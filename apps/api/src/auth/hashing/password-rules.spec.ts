import { passwordFault } from './password-rules';

describe('passwordFault()', () => {
  it.each([
    ['fourteen chars', 'short-password'],
    ['fourteen emoji', '🙂🙃😀😁😂🤣😃😄😅😆😉😊😋😎'],
  ])('refuses %s', (_, password) => {
    expect(Array.from(password)).toHaveLength(14);
    expect(passwordFault(password)).toContain('15 characters or more');
  });

  it('counts code points after normalising, not UTF-16 units', () => {
    expect(passwordFault('🙂🙃😀😁😂🤣😃😄😅😆😉😊😋😎😍')).toBeUndefined();
    expect(passwordFault('ﬁ'.repeat(7))).toContain('15 characters or more');
  });

  it('allows 128 code points and refuses 129', () => {
    const long = 'violet kettle 7 '.repeat(8);
    expect(passwordFault(long)).toBeUndefined();
    expect(passwordFault(`${long}x`)).toContain('at most 128');
  });

  it.each([
    'passwordpassword',
    'Password-12345678',
    '123456789012345',
    'qwertyuiop 1234567890',
    'correct horse battery staple',
    'Proofplate Laser 2026',
    'May the force be with you!',
  ])('refuses %s, which many people would choose', (password) => {
    expect(passwordFault(password)).toContain('Many people');
  });

  it('refuses a few characters repeated', () => {
    expect(passwordFault('ababababababababab')).toContain('different characters');
  });

  it.each(['violet kettle on the roof', 'Fräulein Müllers 3 Ziegen', '  spaces at both ends  '])('allows %s', (password) => {
    expect(passwordFault(password)).toBeUndefined();
  });
});
