// Transaction A idles until the server ends it; transactions B re-use its slot while A's code carries on.
// node idle-transaction.mjs BUILD URL POOL REPEATS
import { count, openPool, outcomeOf, runProgram, untilGone, watchUncaught } from './fault-run.mjs';

const [build, url, poolSize, repeats] = process.argv.slice(2);
const max = Number(poolSize);
const uncaught = watchUncaught();
const pool = await openPool({ build, url, max });
const admin = await openPool({ build, url, max: 1 });
const figures = { reportedByA: 0, lateStatementsThatRan: 0, wrongTenant: 0, commitsOfB: 0, rollbacksOfB: 0, hung: 0 };
await runProgram(async () => {
  await admin`create table if not exists journal (writer text, repeat int)`;
  await admin`truncate journal`;
  for (let repeat = 0; repeat < Number(repeats); repeat += 1) await oneRepeat(repeat);
  return {
    ...figures,
    ...verdict(await admin`select writer, repeat, count(*)::int as lines from journal group by writer, repeat`),
    uncaught,
  };
});

function verdict(rows) {
  return {
    rowsOfA: rows.filter(({ writer }) => writer === 'A').length,
    // Even writers commit two lines, odd ones roll both back.
    brokenWritersB: rows.filter(({ writer, lines }) => writer.startsWith('B') && (Number(writer.slice(1)) % 2 === 1 || lines !== 2)).length,
    writersStored: rows.filter(({ writer }) => writer.startsWith('B')).length,
  };
}

async function oneRepeat(repeat) {
  const carryOn = gate();
  const idle = gate();
  const givenUp = gate();
  const outcomeOfA = outcomeOf(
    pool.begin(async (tx) => {
      const [{ pid }] = await tx`select pg_backend_pid() as pid, set_config('app.tenant', 'A', true)`;
      await tx`insert into journal values ('A', ${repeat})`;
      await tx`set local idle_in_transaction_session_timeout = 20`;
      idle.open(pid);
      await carryOn.opened;
      if ((await outcomeOf(tx`insert into journal values ('A', ${repeat})`)) === 'done') figures.lateStatementsThatRan += 1;
      givenUp.open();
      throw new Error('A gives up, which makes the driver roll back');
    }),
  );
  await untilGone(admin, await idle.opened);

  const started = Array.from({ length: max }, () => gate());
  const finish = gate();
  const outcomesOfB = started.map((mine, index) => outcomeOf(transactionB({ writer: `B${index}`, index, repeat, mine, finish })));
  await Promise.race([Promise.all(started.map(({ opened }) => opened)), Promise.all(outcomesOfB)]);
  carryOn.open();
  // Its caller hears at once that the connection is lost; its code and the driver's rollback come later.
  await givenUp.opened;
  await new Promise((resolve) => setTimeout(resolve, 5));
  if ((await outcomeOfA) === 'failed') figures.reportedByA += 1;
  finish.open();
  const ended = await Promise.all(outcomesOfB);
  figures.commitsOfB += count(ended, 'done');
  figures.rollbacksOfB += count(ended, 'failed');
  figures.hung += count(ended, 'hung');
}

function transactionB({ writer, index, repeat, mine, finish }) {
  return pool.begin(async (tx) => {
    await tx`select set_config('app.tenant', ${writer}, true)`;
    await tx`insert into journal values (${writer}, ${repeat})`;
    mine.open();
    await finish.opened;
    const [{ tenant }] = await tx`select current_setting('app.tenant', true) as tenant`;
    if (tenant !== writer) figures.wrongTenant += 1;
    await tx`insert into journal values (${writer}, ${repeat})`;
    if (index % 2 === 1) throw new Error('odd writers roll back');
  });
}

function gate() {
  let open;
  const opened = new Promise((resolve) => {
    open = resolve;
  });
  return { open, opened };
}
