import { UnavailableError } from '../../common/errors/domain-error';
import { readEnv } from '../../config/env.validation';
import { PasswordHasher } from './password-hasher';

const hashers: PasswordHasher[] = [];
function makeHasher(overrides: Record<string, string> = {}) {
  const hasher = new PasswordHasher(readEnv({ NODE_ENV: 'test', PASSWORD_COST: '4', ...overrides }));
  hashers.push(hasher);
  return hasher;
}
afterEach(async () => {
  await Promise.all(hashers.splice(0).map((hasher) => hasher.onApplicationShutdown()));
});

describe('PasswordHasher', () => {
  it('tells passwords apart that differ only behind the 72nd character', async () => {
    const hasher = makeHasher();
    const long = 'a long sentence '.repeat(5);
    const hash = await hasher.hash(`${long}1`);
    expect(await hasher.verify(`${long}1`, hash)).toBe(true);
    expect(await hasher.verify(`${long}2`, hash)).toBe(false);
  });

  it('takes two spellings of one character for the same and keeps white space', async () => {
    const hasher = makeHasher();
    const hash = await hasher.hash('cafe\u0301 on the corner');
    expect(await hasher.verify('café on the corner', hash)).toBe(true);
    expect(await hasher.verify('café on the corner ', hash)).toBe(false);
  });

  it('needs the same pepper', async () => {
    const hash = await makeHasher().hash('violet kettle on the roof');
    const other = makeHasher({ PASSWORD_PEPPER: 'another pepper that is long enough for this' });
    expect(await other.verify('violet kettle on the roof', hash)).toBe(false);
  });

  it('compares with a made-up hash of the same cost when nobody is there', async () => {
    const hasher = makeHasher();
    expect(await hasher.verify('violet kettle on the roof', undefined)).toBe(false);
    expect(hasher.needsRehash(await hasher.dummyHash())).toBe(false);
  });

  it('wants a new hash when the cost has changed', async () => {
    const hash = await makeHasher().hash('violet kettle on the roof');
    expect(makeHasher({ PASSWORD_COST: '5' }).needsRehash(hash)).toBe(true);
  });

  it('never works on the main thread, whose event loop keeps turning', async () => {
    const hasher = makeHasher({ PASSWORD_COST: '10' });
    let turns = 0;
    let isDone = false;
    const count = () => {
      turns += 1;
      if (!isDone) setImmediate(count);
    };
    setImmediate(count);
    await Promise.all(Array.from({ length: 8 }, (_, index) => hasher.hash(`violet kettle ${index}`)));
    isDone = true;
    expect(hasher.threadIds.has(0)).toBe(false);
    expect(hasher.threadIds.size).toBe(2);
    // eight hashes of 1024 rounds on this thread would leave the loop a handful of turns
    expect(turns).toBeGreaterThan(1_000);
  });

  it('refuses the 55th task at once: four at work, fifty waiting', async () => {
    const hasher = makeHasher();
    const tasks = Array.from({ length: 55 }, (_, index) => hasher.hash(`violet kettle ${index}`).catch((error: unknown) => error));
    const answers = await Promise.all(tasks);
    expect(answers.filter((answer) => answer instanceof UnavailableError)).toHaveLength(1);
    expect(answers.at(-1)).toBeInstanceOf(UnavailableError);
  });
});
