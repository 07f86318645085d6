import { spawnSync } from 'node:child_process';
import { join } from 'node:path';

const SAY_SO = join(__dirname, '../bin/steps/say-so.mjs');
const run = (...args: string[]) => spawnSync(process.execPath, [SAY_SO, ...args], { encoding: 'utf8' });

describe('a step that takes long', () => {
  it('prints lines while its program is silent, and ends as the program ends', () => {
    const { stdout, status } = run('50', 'Still installing', process.execPath, '-e', 'setTimeout(() => process.exit(3), 600)');
    expect(stdout).toMatch(/^Still installing: \d+ s …$/m);
    expect(status).toBe(3);
  });

  it('says nothing more than a program that is quick', () => {
    expect(run('60000', 'Still installing', process.execPath, '-e', '')).toMatchObject({ stdout: '', status: 0 });
  });

  it('fails when there is no such program', () => {
    const { status, stderr } = run('60000', 'Still installing', 'no-such-program-here');
    expect(status).toBe(1);
    expect(stderr).toContain('no-such-program-here');
  });
});
