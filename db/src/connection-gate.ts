/** Nobody got a free connection in time. The request has changed nothing and may be tried again a moment later. */
export class ConnectionWaitError extends Error {
  override readonly name = 'ConnectionWaitError';
  readonly code = 'CONNECTION_WAIT';

  constructor(readonly waitedMs: number) {
    super(`No database connection became free within ${waitedMs} ms`);
  }
}

type Waiter = { readonly admit: () => void };

/**
 * As many pieces of work at once as there are connections; the rest waits in order and gives up after a limit.
 * The driver's own queue waits for ever, and it pipelines queries behind those of others once every connection is busy.
 */
export class ConnectionGate {
  private readonly waiting = new Set<Waiter>();
  private free: number;

  constructor(
    connections: number,
    private readonly acquireTimeoutMs: number,
  ) {
    this.free = connections;
  }

  async run<T>(work: () => Promise<T>): Promise<T> {
    await this.acquire();
    try {
      return await work();
    } finally {
      this.release();
    }
  }

  private async acquire(): Promise<void> {
    if (this.free > 0) {
      this.free -= 1;
      return;
    }
    await new Promise<void>((admitted, refused) => {
      const timer = setTimeout(() => {
        this.waiting.delete(waiter);
        refused(new ConnectionWaitError(this.acquireTimeoutMs));
      }, this.acquireTimeoutMs);
      const waiter: Waiter = {
        admit: () => {
          clearTimeout(timer);
          admitted();
        },
      };
      this.waiting.add(waiter);
    });
  }

  /** A freed place goes straight to the longest waiting, so that nobody overtakes it. */
  private release(): void {
    const [next] = this.waiting;
    if (!next) {
      this.free += 1;
      return;
    }
    this.waiting.delete(next);
    next.admit();
  }
}
