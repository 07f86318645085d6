import { readEnv } from './env.validation';

const production = {
  NODE_ENV: 'production',
  JWT_SECRET: 'a'.repeat(43),
  PASSWORD_PEPPER: 'b'.repeat(43),
  URL_SIGNING_SECRET: 'c'.repeat(43),
  PASSWORD_COST: '12',
  PUBLIC_ORIGIN: 'https://plates.example',
};

describe('readEnv()', () => {
  it('has defaults that start a development server', () => {
    expect(readEnv({})).toMatchObject({ NODE_ENV: 'development', PORT: 3000, isProduction: false, isServedOverHttps: false });
  });

  it('takes numbers from text and ignores what it does not know', () => {
    const env = readEnv({ PORT: '8080', HOME: '/somewhere', WEB_ROOT: '' });
    expect(env.PORT).toBe(8080);
    expect(env).not.toHaveProperty('HOME');
    expect(env.WEB_ROOT).toBeUndefined();
  });

  it('names every wrong variable at once and shows no value', () => {
    const read = () => readEnv({ PORT: 'eighty', JWT_SECRET: 'hunter2', SMTP_URL: 'mail.example' });
    for (const name of ['PORT:', 'JWT_SECRET:', 'SMTP_URL:']) expect(read).toThrow(name);
    expect(read).not.toThrow(/hunter2|eighty/);
  });

  it('lets production start with secrets of its own', () => {
    expect(readEnv(production).isProduction).toBe(true);
  });

  it.each([
    ['a development secret', { JWT_SECRET: undefined }, 'JWT_SECRET'],
    ['a short secret', { PASSWORD_PEPPER: 'short' }, 'PASSWORD_PEPPER'],
    ['one secret used twice', { URL_SIGNING_SECRET: 'a'.repeat(43) }, 'must differ'],
    ['a cheap password hash', { PASSWORD_COST: '11' }, 'PASSWORD_COST'],
    ['plain http', { PUBLIC_ORIGIN: 'http://plates.example' }, 'PUBLIC_ORIGIN'],
  ])('keeps production from starting with %s', (_, change, named) => {
    expect(() => readEnv({ ...production, ...change })).toThrow(named);
  });
});
