import { execFile } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { cloneDatabase } from '../src/testing';

/** 200 for the full bar; a quick run keeps the suite short. */
const REPEATS = Number(process.env.PROOFPLATE_DRIVER_REPEATS ?? 8);
const POSTMASTER_KILLS = Number(process.env.PROOFPLATE_POSTMASTER_KILLS ?? 3);
const LONGEST_RUN_MS = 900_000;
const WRITERS = 12;
const BUILDS = ['esm', 'cjs'] as const;
const BUILDS_AND_POOLS = BUILDS.flatMap((build) => [1, 8].map((poolSize) => ({ build, poolSize })));

jest.setTimeout(LONGEST_RUN_MS);

/** Runs a fault program in a process of its own and returns the figures it reports. */
async function runFault(program: string, args: readonly (string | number)[]): Promise<Record<string, unknown>> {
  const script = join(__dirname, 'driver-faults', `${program}.mjs`);
  const { stdout } = await promisify(execFile)(process.execPath, [script, ...args.map(String)], { timeout: LONGEST_RUN_MS });
  return JSON.parse(stdout);
}

describe.each(BUILDS_AND_POOLS)('a dying connection, $build build, pool of $poolSize', ({ build, poolSize }) => {
  it('ends its transaction with an error and gives the pool its slot back when the server process is terminated', async () => {
    const { superuser, drop } = await cloneDatabase();

    const figures = await runFault('terminated-backend', [build, superuser, poolSize, REPEATS]);

    expect(figures).toEqual({
      transactionsThatReported: REPEATS,
      lateStatementsThatRan: 0,
      laterDone: REPEATS * (poolSize + 2),
      laterFailed: 0,
      laterHung: 0,
      survivors: 0,
      uncaught: [],
    });
    await drop();
  });

  it('never runs a statement or the rollback of a timed-out transaction inside the one that got its slot', async () => {
    const { superuser, drop } = await cloneDatabase();
    const committing = Math.ceil(poolSize / 2);

    const figures = await runFault('idle-transaction', [build, superuser, poolSize, REPEATS]);

    expect(figures).toEqual({
      reportedByA: REPEATS,
      lateStatementsThatRan: 0,
      wrongTenant: 0,
      commitsOfB: REPEATS * committing,
      rollbacksOfB: REPEATS * (poolSize - committing),
      hung: 0,
      rowsOfA: 0,
      brokenWritersB: 0,
      writersStored: REPEATS * committing,
      uncaught: [],
    });
    await drop();
  });
});

describe.each(BUILDS)('a killed postmaster under writers, %s build', (build) => {
  it('loses no acknowledged row, leaves none half-written, and every writer works again after the restart', async () => {
    const folder = mkdtempSync(join(tmpdir(), 'proofplate-kill-'));
    try {
      const figures = await runFault('killed-postmaster', [build, folder, 8, POSTMASTER_KILLS]);

      expect(figures).toMatchObject({
        writersThatRecovered: WRITERS * POSTMASTER_KILLS,
        hung: 0,
        lost: 0,
        halfWritten: 0,
        uncaught: [],
      });
      expect(figures.acknowledged).toBeGreaterThan(0);
    } finally {
      rmSync(folder, { recursive: true, force: true });
    }
  });
});
