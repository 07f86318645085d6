// The server process is ended in the middle of a query inside begin(). node terminated-backend.mjs BUILD URL POOL REPEATS
import { count, openPool, outcomeOf, runProgram, watchUncaught } from './fault-run.mjs';

const [build, url, poolSize, repeats] = process.argv.slice(2);
const max = Number(poolSize);
const uncaught = watchUncaught();
const pool = await openPool({ build, url, max });
const admin = await openPool({ build, url, max: 1 });
const figures = { transactionsThatReported: 0, lateStatementsThatRan: 0, laterDone: 0, laterFailed: 0, laterHung: 0 };
await runProgram(async () => {
  await admin`create table if not exists survivor (n int)`;
  await admin`truncate survivor`;
  for (let repeat = 0; repeat < Number(repeats); repeat += 1) await oneRepeat(repeat);
  const [{ survivors }] = await admin`select count(*)::int as survivors from survivor`;
  return { ...figures, survivors, uncaught };
});

async function oneRepeat(repeat) {
  const transaction = pool.begin(async (tx) => {
    await tx`insert into survivor values (${repeat})`;
    const [{ pid }] = await tx`select pg_backend_pid() as pid`;
    const sleeping = tx`select pg_sleep(30)`.catch(() => undefined);
    await admin`select pg_terminate_backend(${pid})`;
    await sleeping;
    // Code that catches an error and carries on is the dangerous one.
    if ((await outcomeOf(tx`insert into survivor values (${repeat})`)) === 'done') figures.lateStatementsThatRan += 1;
  });
  if ((await outcomeOf(transaction)) === 'failed') figures.transactionsThatReported += 1;
  const later = await Promise.all(Array.from({ length: max + 2 }, () => outcomeOf(pool`select 1`)));
  figures.laterDone += count(later, 'done');
  figures.laterFailed += count(later, 'failed');
  figures.laterHung += count(later, 'hung');
}
