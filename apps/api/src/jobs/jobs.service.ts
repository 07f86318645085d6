import { Injectable } from '@nestjs/common';
import type { Tx } from '../database/unit-of-work';
import type { JobPayloads, TaskName } from './job-tasks';
import { JobsRepository } from './jobs.repository';

export type JobOptions = {
  /** One waiting job per shop, task and key: adding another replaces it. */
  readonly key?: string;
  /** Earliest start, seconds from now, a day at most. */
  readonly delayS?: number;
};

/** Leaves work to the worker process, as part of the caller's transaction: rolled back with it, started after its commit. */
@Injectable()
export class JobsService {
  constructor(private readonly repository: JobsRepository) {}

  async add<T extends TaskName>(tx: Tx, task: T, payload: JobPayloads[T], { key, delayS = 0 }: JobOptions = {}): Promise<void> {
    await this.repository.insert(tx, { task, payload, key, delayS });
  }
}
