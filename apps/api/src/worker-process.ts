import { type BeforeApplicationShutdown, Injectable } from '@nestjs/common';
import { Env } from './config/env.validation';
import { type JobRunner, startJobRunner } from './jobs/job-runner';
import type { Sweep } from './jobs/job-tasks';
import { OutboxConsumer } from './mail/outbox-consumer';
import { PhotoDeveloperService } from './photos/photo-developer.service';
import { PhotoSweepService } from './photos/photo-sweep.service';
import { ScheduledRevisionsService } from './recipes/scheduled-revisions.service';

const SWIFT_JOBS_AT_ONCE = 2;
/** One picture at a time: decoding takes a core and much memory. */
const PHOTOS_AT_ONCE = 1;

/** Takes jobs from the queue: mail and revisions beside photos, so that a slow picture delays neither. */
@Injectable()
export class WorkerProcess implements BeforeApplicationShutdown {
  private runners: JobRunner[] = [];

  constructor(
    private readonly env: Env,
    private readonly outbox: OutboxConsumer,
    private readonly developer: PhotoDeveloperService,
    private readonly photoSweep: PhotoSweepService,
    private readonly scheduledRevisions: ScheduledRevisionsService,
  ) {}

  async start(): Promise<void> {
    const connectionString = this.env.WORKER_DATABASE_URL;
    const swift = {
      'mail.send': this.outbox.send.bind(this.outbox),
      'revisions.take-effect': this.scheduledRevisions.takeEffect.bind(this.scheduledRevisions),
    };
    const photos = { 'photos.develop': this.developer.develop.bind(this.developer) };
    this.runners.push(await startJobRunner({ connectionString, concurrency: SWIFT_JOBS_AT_ONCE, handlers: swift, sweeps: this.sweeps() }));
    this.runners.push(await startJobRunner({ connectionString, concurrency: PHOTOS_AT_ONCE, handlers: photos }));
  }

  /** Before the pool and the store close: jobs in hand are finished, none is begun. */
  async beforeApplicationShutdown(): Promise<void> {
    await Promise.all(this.runners.splice(0).map((runner) => runner.stop()));
  }

  private sweeps(): Sweep[] {
    return [
      { name: 'photos.sweep-received', everyMinutes: 5, run: async () => void (await this.photoSweep.sweepReceived()) },
      { name: 'photos.sweep-kept', everyMinutes: 60, run: async () => void (await this.photoSweep.sweepKept()) },
    ];
  }
}
