import { randomUUID } from 'node:crypto';
import type { INestApplicationContext } from '@nestjs/common';
import { NestFactory } from '@nestjs/core';
import { createDb, type DbHandle } from '@proofplate/db';
import { cloneDatabase, type TestDatabase, testClusterUrl } from '@proofplate/db/testing';
import postgres from 'postgres';
import sharp from 'sharp';
import { Env } from '../src/config/env.validation';
import { UnitOfWork } from '../src/database/unit-of-work';
import { JobsRepository } from '../src/jobs/jobs.repository';
import { JobsService } from '../src/jobs/jobs.service';
import { OutboxRepository } from '../src/mail/outbox.repository';
import { OutboxService } from '../src/mail/outbox.service';
import { WorkerModule } from '../src/worker.module';
import { WorkerProcess } from '../src/worker-process';
import { type MailSink, startMailSink } from './support/mail-sink';
import { type ObjectStore, startObjectStore } from './support/object-store';
import { makePhotoShop } from './support/photo-shop';
import { until } from './support/until';

describe('the worker process', () => {
  let database: TestDatabase;
  let superuser: postgres.Sql;
  let handle: DbHandle;
  let store: ObjectStore;
  let sink: MailSink;
  let worker: INestApplicationContext;
  let unitOfWork: UnitOfWork;
  const outbox = new OutboxService(new OutboxRepository(), new JobsService(new JobsRepository()));
  const mailTo = (shopId: string, address: string) => ({
    shopId,
    kind: 'hold-placed' as const,
    payload: {
      to: { name: 'Ann', address },
      shopName: 'Tidewater Marking Works',
      subject: 'R-0001 Dark mark',
      reason: 'Marks came out brown',
      by: 'Lee',
    },
  });

  const startWorker = async () => {
    const env = Object.assign(new Env(), {
      NODE_ENV: 'test',
      DATABASE_URL: database.app,
      DATABASE_POOL_SIZE: 3,
      WORKER_DATABASE_URL: database.worker,
      OBJECT_STORE_ENDPOINT: store.endpoint,
      SMTP_URL: `smtp://127.0.0.1:${sink.port}`,
      LOG_LEVEL: 'silent',
    });
    const context = await NestFactory.createApplicationContext(WorkerModule.register(env), { logger: false });
    await context.get(WorkerProcess).start();
    return context;
  };

  beforeAll(async () => {
    database = await cloneDatabase();
    superuser = postgres(database.superuser, { max: 1 });
    handle = createDb(database.app, { max: 2 });
    unitOfWork = new UnitOfWork(handle, new Env());
    store = await startObjectStore();
    sink = await startMailSink();
    worker = await startWorker();
  });

  afterAll(async () => {
    await worker.close();
    await handle.end();
    await superuser.end();
    await sink.stop();
    await store.stop();
    await database.drop();
  });

  it('sends mail and refuses a photo whose bytes are not there', async () => {
    const { shopId, couponId, actor } = await makePhotoShop(superuser);
    const photoId = randomUUID();
    await superuser`insert into photo (shop_id, id, coupon_id, received_key, received_sha256, received_bytes, received_type, created_by)
      values (${shopId}, ${photoId}, ${couponId}, ${`received/${shopId}/${photoId}`}, ${'0'.repeat(64)}, 1, 'image/jpeg', ${actor().memberId})`;
    await unitOfWork.run({ shopId }, async (tx) => {
      await outbox.add(tx, mailTo(shopId, 'ann@example.invalid'));
      await new JobsService(new JobsRepository()).add(tx, 'photos.develop', { photoId }, { key: photoId });
    });
    await until(() => sink.mails.some((mail) => mail.subject === 'On hold: R-0001 Dark mark'));
    const photo = await until(async () => {
      const [row] = await superuser`select state, refused_reason as "reason" from photo where id = ${photoId}`;
      return row?.state !== 'processing' && row;
    });
    expect(photo).toEqual({ state: 'refused', reason: expect.stringContaining('did not reach the store whole') });
    expect(sink.mails).toHaveLength(1);
  });

  it('knows three decoders only', async () => {
    await expect(sharp(Buffer.from('<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"/>')).metadata()).rejects.toThrow();
    await expect(sharp(Buffer.from('GIF89a\u0001\u0000\u0001\u0000')).metadata()).rejects.toThrow();
  });

  it('gives back the job of a worker that died, after ten minutes', async () => {
    const { shopId } = await makePhotoShop(superuser);
    await worker.close();
    await unitOfWork.run({ shopId }, (tx) => outbox.add(tx, mailTo(shopId, 'late@example.invalid')));
    await superuser`update graphile_worker._private_jobs set locked_at = now() - interval '11 minutes', locked_by = 'worker-that-died', attempts = 1`;
    worker = await startWorker();
    await unitOfWork.run({ shopId }, (tx) => outbox.add(tx, mailTo(shopId, 'prompt@example.invalid')));
    const arrived = (address: string) => sink.mails.some((mail) => [mail.to].flat()[0]?.text.includes(address));
    await until(() => arrived('prompt@example.invalid'));
    expect(arrived('late@example.invalid')).toBe(false);
    await superuser`select graphile_worker.add_job('jobs.release-dead-locks')`;
    await until(() => arrived('late@example.invalid'));
  });

  it('goes on by itself after its database was away', async () => {
    const { shopId } = await makePhotoShop(superuser);
    const admin = postgres(testClusterUrl(), { max: 1 });
    const workers = () =>
      admin<{ pid: number }[]>`select pid from pg_stat_activity where datname = ${database.name} and usename = 'proofplate_worker'`;
    try {
      await unitOfWork.run({ shopId }, (tx) => outbox.add(tx, mailTo(shopId, 'before@example.invalid')));
      await admin`alter database ${admin(database.name)} allow_connections false`;
      await admin`select pg_terminate_backend(pid) from pg_stat_activity where datname = ${database.name} and usename = 'proofplate_worker'`;
      await until(async () => (await workers()).length === 0);
      await admin`alter database ${admin(database.name)} allow_connections true`;
      await unitOfWork.run({ shopId }, (tx) => outbox.add(tx, mailTo(shopId, 'back@example.invalid')));
      await until(() => sink.mails.some((mail) => [mail.to].flat()[0]?.text.includes('back@example.invalid')));
    } finally {
      await admin.end();
    }
  });

  it('begins nothing more once it is told to stop', async () => {
    const { shopId } = await makePhotoShop(superuser);
    await worker.close();
    await unitOfWork.run({ shopId }, (tx) => outbox.add(tx, mailTo(shopId, 'after@example.invalid')));
    const [job] = await superuser`select locked_at from graphile_worker._private_jobs where payload ->> 'shopId' = ${shopId}`;
    expect(job).toEqual({ locked_at: null });
    worker = await startWorker();
    await until(() => sink.mails.some((mail) => [mail.to].flat()[0]?.text.includes('after@example.invalid')));
  });
});
