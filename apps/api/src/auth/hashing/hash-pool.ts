import { Worker } from 'node:worker_threads';
import { UnavailableError } from '../../common/errors/domain-error';

const THREADS = 2;
const MAX_IN_FLIGHT = 4;
const MAX_WAITING = 50;

export type HashTask =
  | { readonly kind: 'hash'; readonly secret: string; readonly cost: number }
  | { readonly kind: 'compare'; readonly secret: string; readonly hash: string };
type Pending = { readonly task: HashTask; readonly resolve: (value: string | boolean) => void; readonly reject: (error: Error) => void };
type Answer = { readonly id: number; readonly value?: string | boolean; readonly error?: string; readonly threadId: number };
type Thread = { readonly worker: Worker; readonly pending: Map<number, Pending> };

/**
 * Plain source, because a worker thread loads JavaScript: the same text works from the compiled build and from tests that never build.
 * bcrypt runs for a third of a second without a break, which on the main thread would hold up every other request.
 */
const THREAD_SOURCE = `
const { parentPort, threadId, workerData } = require('node:worker_threads');
const bcrypt = require(workerData.bcryptPath);
parentPort.on('message', ({ id, task }) => {
  try {
    const value = task.kind === 'hash' ? bcrypt.hashSync(task.secret, task.cost) : bcrypt.compareSync(task.secret, task.hash);
    parentPort.postMessage({ id, value, threadId });
  } catch (error) {
    parentPort.postMessage({ id, error: String(error), threadId });
  }
});`;

/** Two threads that hash; at most four tasks with them, fifty waiting, beyond that 503 at once. */
export class HashPool {
  private readonly threads: Thread[] = [];
  private readonly waiting: Pending[] = [];
  private nextId = 1;
  private isClosed = false;
  /** Threads that have answered; never holds the main thread's id 0. */
  readonly answeringThreadIds = new Set<number>();

  run(task: HashTask): Promise<string | boolean> {
    if (this.isClosed) return Promise.reject(new UnavailableError('This process is shutting down.'));
    if (this.waiting.length >= MAX_WAITING) return Promise.reject(new UnavailableError('Many people sign in at the moment. Try again.', 2));
    return new Promise((resolve, reject) => {
      this.waiting.push({ task, resolve, reject });
      this.feed();
    });
  }

  async close(): Promise<void> {
    this.isClosed = true;
    for (const entry of this.waiting.splice(0)) entry.reject(new UnavailableError('This process is shutting down.'));
    await Promise.all(this.threads.splice(0).map((thread) => thread.worker.terminate()));
  }

  private feed(): void {
    while (this.waiting.length > 0 && this.inFlight() < MAX_IN_FLIGHT) {
      const next = this.waiting.shift();
      if (next === undefined) return;
      const thread = this.leastBusy();
      const id = this.nextId++;
      thread.pending.set(id, next);
      thread.worker.postMessage({ id, task: next.task });
    }
  }

  private inFlight(): number {
    return this.threads.reduce((sum, thread) => sum + thread.pending.size, 0);
  }

  private leastBusy(): Thread {
    const idle = this.threads.find((thread) => thread.pending.size === 0);
    if (idle !== undefined) return idle;
    if (this.threads.length < THREADS) return this.startThread();
    return this.threads.reduce((least, thread) => (thread.pending.size < least.pending.size ? thread : least));
  }

  private startThread(): Thread {
    const worker = new Worker(THREAD_SOURCE, { eval: true, workerData: { bcryptPath: require.resolve('bcryptjs') } });
    const thread: Thread = { worker, pending: new Map() };
    worker.unref();
    worker.on('message', (answer: Answer) => this.settle(thread, answer));
    worker.on('error', (error) => this.lose(thread, error));
    worker.on('exit', () => this.lose(thread, new UnavailableError()));
    this.threads.push(thread);
    return thread;
  }

  private settle(thread: Thread, answer: Answer): void {
    const pending = thread.pending.get(answer.id);
    thread.pending.delete(answer.id);
    this.answeringThreadIds.add(answer.threadId);
    if (answer.value === undefined) pending?.reject(new Error(answer.error ?? 'the hash thread gave no value'));
    else pending?.resolve(answer.value);
    this.feed();
  }

  /** A thread that died takes its tasks with it; the next task starts a new one. */
  private lose(thread: Thread, error: Error): void {
    const place = this.threads.indexOf(thread);
    if (place >= 0) this.threads.splice(place, 1);
    for (const pending of thread.pending.values()) pending.reject(error);
    thread.pending.clear();
    if (!this.isClosed) this.feed();
  }
}
