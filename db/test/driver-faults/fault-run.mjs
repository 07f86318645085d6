// What the three fault programs have in common. They run in a process of their own, because an error that nobody catches is part
// of what they look for, and it would take the test runner with it.
import { createRequire } from 'node:module';

export const HANG_MS = 4_000;

/** The driver in the build under test. Reconnects fast, so that a repeat costs milliseconds. */
export async function openPool({ build, url, max, ...options }) {
  const postgres = build === 'cjs' ? createRequire(import.meta.url)('postgres') : (await import('postgres')).default;
  return postgres(url, { max, connect_timeout: 3, backoff: () => 0.01, onnotice() {}, ...options });
}

/** Counts what would have ended a process that does not listen for it. */
export function watchUncaught() {
  const messages = [];
  process.on('uncaughtException', (error) => messages.push(String(error)));
  process.on('unhandledRejection', (error) => messages.push(String(error)));
  return messages;
}

/** 'done', 'failed' or 'hung'; never rejects. */
export async function outcomeOf(work) {
  let timer;
  const deadline = new Promise((resolve) => {
    timer = setTimeout(resolve, HANG_MS, 'hung');
  });
  const settled = work.then(
    () => 'done',
    () => 'failed',
  );
  const outcome = await Promise.race([settled, deadline]);
  clearTimeout(timer);
  return outcome;
}

export function count(outcomes, wanted) {
  return outcomes.filter((outcome) => outcome === wanted).length;
}

/** Waits until a server process is gone. */
export async function untilGone(admin, pid) {
  for (;;) {
    const [alive] = await admin`select 1 as alive from pg_stat_activity where pid = ${pid}`;
    if (!alive) return;
    await new Promise((resolve) => setTimeout(resolve, 5));
  }
}

/** Runs a program; its last word is one line of JSON on standard output. Then the end, whatever the driver left open. */
export async function runProgram(program) {
  try {
    const figures = await program();
    process.stdout.write(`${JSON.stringify(figures)}\n`, () => process.exit(0));
  } catch (error) {
    process.stderr.write(`${error instanceof Error ? error.stack : String(error)}\n`, () => process.exit(1));
  }
}
