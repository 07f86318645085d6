import { setTimeout as pause } from 'node:timers/promises';
import { Logger } from '@nestjs/common';
import {
  type JobHelpers,
  parseCronItems,
  Logger as QueueLogger,
  type RunnerOptions as QueueOptions,
  type Runner,
  run,
  type Task,
  type TaskList,
} from 'graphile-worker';
import type { Job, JobHandlers, Sweep, TaskName } from './job-tasks';

export type RunnerOptions = {
  /** Address of the queue owner's role. */
  readonly connectionString: string;
  /** Jobs at once in this process. */
  readonly concurrency: number;
  readonly handlers: JobHandlers;
  readonly sweeps?: readonly Sweep[];
};

export type JobRunner = { readonly stop: () => Promise<void> };

const POLL_INTERVAL_MS = 1000;
const RUN_AGAIN_MS = 500;
/** A connection of its own listens for new jobs. */
const LISTENING_CONNECTIONS = 1;
/** Every handler ends itself long before: a lock this old belongs to a process that is gone. */
const DEAD_LOCK_MINUTES = 10;
const RELEASE_DEAD_LOCKS = 'jobs.release-dead-locks';
const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/;

const logger = new Logger('JobRunner');

/**
 * Takes jobs from the queue until it is stopped; stopping waits for the jobs in hand. A queue that was lost with the database is taken up
 * again when it is back, without a new process.
 */
export async function startJobRunner(options: RunnerOptions): Promise<JobRunner> {
  const settings = runnerSettings(options);
  const stopping = new AbortController();
  let runner = await run(settings);
  const supervise = async () => {
    while (await endedUnasked(runner, stopping.signal)) runner = await runAgain(settings, stopping.signal, runner);
  };
  const supervised = supervise();
  return {
    stop: async () => {
      stopping.abort();
      await stopQuietly(runner);
      await supervised;
    },
  };
}

function runnerSettings({ connectionString, concurrency, handlers, sweeps = [] }: RunnerOptions): QueueOptions {
  const isClockwork = sweeps.length > 0;
  const taskList: TaskList = {
    ...Object.fromEntries(Object.entries(handlers).map(([name, handler]) => [name, asTask(handler)])),
    ...Object.fromEntries(sweeps.map((sweep) => [sweep.name, () => sweep.run()])),
    ...(isClockwork ? { [RELEASE_DEAD_LOCKS]: releaseDeadLocks } : {}),
  };
  const items = sweeps.map((sweep) => cronItem(sweep.name, sweep.everyMinutes));
  return {
    connectionString,
    concurrency,
    maxPoolSize: concurrency + LISTENING_CONNECTIONS,
    pollInterval: POLL_INTERVAL_MS,
    noHandleSignals: true,
    taskList,
    parsedCronItems: parseCronItems(isClockwork ? [...items, cronItem(RELEASE_DEAD_LOCKS, 1)] : []),
    logger: new QueueLogger(() => logProblems),
  };
}

/** Waits for the end of a runner; true when nobody asked for it. */
async function endedUnasked(runner: Runner, stopping: AbortSignal): Promise<boolean> {
  await runner.promise.catch((error: unknown) => logger.error(`The queue was lost: ${error instanceof Error ? error.message : error}`));
  return !stopping.aborted;
}

async function runAgain(settings: QueueOptions, stopping: AbortSignal, lost: Runner): Promise<Runner> {
  while (!stopping.aborted) {
    await pause(RUN_AGAIN_MS, undefined, { signal: stopping }).catch(() => undefined);
    if (stopping.aborted) break;
    try {
      const runner = await run(settings);
      if (stopping.aborted) await stopQuietly(runner);
      return runner;
    } catch (error) {
      logger.warn(`The queue is still away: ${error instanceof Error ? error.message : error}`);
    }
  }
  return lost;
}

function asTask(handler: NonNullable<JobHandlers[TaskName]>): Task {
  return async (payload, helpers) => {
    // The payload was typed when it was added; here only its shape is left to check.
    await (handler as (job: Job<TaskName>) => Promise<void>)({ ...readIds(payload), attempt: helpers.job.attempts } as Job<TaskName>);
  };
}

function readIds(payload: unknown): Record<string, string> {
  const entries = Object.entries(payload ?? {});
  if (!entries.every(([, value]) => typeof value === 'string' && UUID.test(value))) throw new Error('a job carries ids only');
  return Object.fromEntries(entries);
}

async function releaseDeadLocks(_: unknown, helpers: JobHelpers): Promise<void> {
  await helpers.query(
    `select graphile_worker.force_unlock_workers(array(
       select distinct locked_by from graphile_worker.jobs where locked_at < now() - make_interval(mins => $1)))`,
    [DEAD_LOCK_MINUTES],
  );
}

function cronItem(task: string, everyMinutes: Sweep['everyMinutes']) {
  const match = everyMinutes === 60 ? '17 * * * *' : `*/${everyMinutes} * * * *`;
  // A missed sweep needs no second one: the next does all the work.
  return { task, match, options: { backfillPeriod: 0, maxAttempts: 1 } };
}

/** A runner that ended by itself refuses to be stopped. */
async function stopQuietly(runner: Runner): Promise<void> {
  await runner.stop().catch((error: unknown) => {
    if (!(error instanceof Error && /already stopped/i.test(error.message))) throw error;
  });
}

function logProblems(level: string, message: string): void {
  if (level === 'error') logger.error(message);
  if (level === 'warning') logger.warn(message);
}
