// kill -9 of the postmaster under writers, on a durable cluster of its own. node killed-postmaster.mjs BUILD FOLDER POOL REPEATS
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { startCluster } from '../../postgres/cluster.mjs';
import { openPool, outcomeOf, runProgram, watchUncaught } from './fault-run.mjs';

const WRITERS = 12;
const LOAD_MS = 600;
const DOWN_MS = 1_500;
const RECOVERY_MS = 7_000;
const PASSWORD = 'only-for-this-throw-away-folder';

const [build, folder, poolSize, repeats] = process.argv.slice(2);
const uncaught = watchUncaught();
const acknowledged = [];
const figures = { writersThatRecovered: 0, hung: 0, failed: 0 };
let nextId = 0;
let cluster;
let pool;
await runProgram(async () => {
  cluster = await startCluster({ dir: folder, durable: true, superuserPassword: PASSWORD });
  try {
    pool = await openPool({ build, url: cluster.url(), max: Number(poolSize) });
    await pool`create table ledger (id bigint, half int)`;
    for (let repeat = 0; repeat < Number(repeats); repeat += 1) await oneRepeat();
    return { ...figures, ...(await compareWithStored()), uncaught };
  } finally {
    cluster.stop('immediate');
  }
});

async function compareWithStored() {
  const stored = await pool`select id::int, count(*)::int as halves from ledger group by id`;
  const complete = new Set(stored.filter(({ halves }) => halves === 2).map(({ id }) => id));
  return {
    acknowledged: acknowledged.length,
    lost: acknowledged.filter((id) => !complete.has(id)).length,
    halfWritten: stored.filter(({ halves }) => halves !== 2).length,
  };
}

async function oneRepeat() {
  const writers = Array.from({ length: WRITERS }, () => ({ working: true, succeededSinceRestart: false }));
  let restarted = false;
  const finished = Promise.all(writers.map((writer) => write(writer, () => restarted)));
  await pause(LOAD_MS);
  process.kill(Number(readFileSync(join(cluster.pgData, 'postmaster.pid'), 'utf8').split('\n')[0]), 'SIGKILL');
  await pause(DOWN_MS);
  cluster = await restart();
  restarted = true;
  for (let waited = 0; waited < RECOVERY_MS && !writers.every((writer) => writer.succeededSinceRestart); waited += 50) await pause(50);
  figures.writersThatRecovered += writers.filter((writer) => writer.succeededSinceRestart).length;
  for (const writer of writers) writer.working = false;
  await finished;
}

async function write(writer, isRestarted) {
  while (writer.working) {
    nextId += 1;
    const id = nextId;
    const startedAfterRestart = isRestarted();
    const outcome = await outcomeOf(
      pool.begin(async (tx) => {
        await tx`insert into ledger values (${id}, 1)`;
        await tx`insert into ledger values (${id}, 2)`;
      }),
    );
    if (outcome === 'done') {
      acknowledged.push(id);
      writer.succeededSinceRestart ||= startedAfterRestart;
    } else {
      figures[outcome] += 1;
      await pause(20);
    }
  }
}

/** The orphaned server processes notice their postmaster's death a moment later; until then a start is refused. */
async function restart() {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await startCluster({ dir: folder, port: cluster.port, durable: true, superuserPassword: PASSWORD });
    } catch (error) {
      if (attempt === 20) throw error;
      await pause(250);
    }
  }
}

function pause(ms) {
  return new Promise((resolve) => setTimeout(resolve, ms));
}
