import { randomUUID } from 'node:crypto';
import { createDb, type DbHandle, schema } from '@proofplate/db';
import { cloneDatabase, type TestDatabase } from '@proofplate/db/testing';
import { sql } from 'drizzle-orm';
import postgres from 'postgres';
import { Env } from '../src/config/env.validation';
import { type Tx, UnitOfWork } from '../src/database/unit-of-work';
import { type JobRunner, startJobRunner } from '../src/jobs/job-runner';
import { JobsRepository } from '../src/jobs/jobs.repository';
import { JobsService } from '../src/jobs/jobs.service';
import { Mailer } from '../src/mail/mailer';
import { OutboxRepository } from '../src/mail/outbox.repository';
import { OutboxService } from '../src/mail/outbox.service';
import { OutboxConsumer } from '../src/mail/outbox-consumer';
import { freePort } from './support/free-port';
import { startMailSink } from './support/mail-sink';
import { until } from './support/until';

const POLICY = {
  minimumConfirmationMarks: 3,
  authorMaySign: false,
  reviewEveryDays: 365,
  overdueBlocks: false,
  photoRequired: true,
  calibrationAgeDays: 180,
  powerShiftPercent: 5,
  secondFactorForSigning: false,
};

describe('the outbox and the job queue', () => {
  let database: TestDatabase;
  let handle: DbHandle;
  let superuser: postgres.Sql;
  let unitOfWork: UnitOfWork;
  let shopId: string;
  let port: number;
  let consumer: OutboxConsumer;
  const jobs = new JobsService(new JobsRepository());
  const repository = new OutboxRepository();
  const outbox = new OutboxService(repository, jobs);

  const reset = (token: string) => ({
    shopId,
    kind: 'password-reset' as const,
    payload: { to: { name: 'Ann', address: 'ann@example.invalid' }, token, expiresAt: '2030-01-01T00:00:00Z' },
  });
  const rows = () => superuser`select state, attempts, failure, payload, id from outbox where shop_id = ${shopId} order by created_at`;
  const waitingJobs = () => superuser`select j.key, t.identifier as task, j.payload, j.run_at > now() as "isLater"
    from graphile_worker._private_jobs j join graphile_worker._private_tasks t on t.id = j.task_id
    where j.payload ->> 'shopId' = ${shopId}`;

  beforeAll(async () => {
    database = await cloneDatabase();
    handle = createDb(database.app, { max: 4 });
    superuser = postgres(database.superuser, { max: 1 });
    unitOfWork = new UnitOfWork(handle, new Env());
    port = await freePort();
    const env = Object.assign(new Env(), { SMTP_URL: `smtp://127.0.0.1:${port}` });
    consumer = new OutboxConsumer(unitOfWork, repository, jobs, new Mailer(env), env);
  });

  beforeEach(async () => {
    shopId = randomUUID();
    await unitOfWork.run({ shopId }, (tx) =>
      tx.insert(schema.shop).values({ id: shopId, name: 'Tidewater Marking Works', policy: POLICY }),
    );
  });

  afterAll(async () => {
    await handle.end();
    await superuser.end();
    await database.drop();
  });

  it('leaves neither mail nor job behind a transaction that is rolled back', async () => {
    const failing = unitOfWork.run({ shopId }, async (tx) => {
      await outbox.add(tx, reset('secret'));
      throw new Error('something else went wrong');
    });
    await expect(failing).rejects.toThrow('something else went wrong');
    expect(await rows()).toHaveLength(0);
    expect(await waitingJobs()).toHaveLength(0);
  });

  it('takes the shop of a job from the transaction, whatever the payload says', async () => {
    const other = randomUUID();
    await unitOfWork.run({ shopId }, (tx) => jobs.add(tx, 'mail.send', { outboxId: other, shopId: other } as { outboxId: string }));
    expect((await waitingJobs()).map((job) => job.payload)).toEqual([{ outboxId: other, shopId }]);
  });

  it('keeps one waiting job per shop and key', async () => {
    const outboxId = randomUUID();
    const add = (tx: Tx) => jobs.add(tx, 'mail.send', { outboxId }, { key: 'same' });
    await unitOfWork.run({ shopId }, add);
    await unitOfWork.run({ shopId }, add);
    const first = shopId;
    const second = randomUUID();
    await unitOfWork.run({ shopId: second }, add);
    shopId = second;
    expect(await waitingJobs()).toHaveLength(1);
    shopId = first;
    expect(await waitingJobs()).toHaveLength(1);
  });

  it('refuses a job without a shop, an unlikely task name, and any other way into the queue', async () => {
    await expect(handle.db.execute(sql`select queue.enqueue_job('mail.send', '{}')`)).rejects.toMatchObject({
      cause: { code: expect.stringMatching(/^(42704|22P02)$/) },
    });
    const inShop = (statement: ReturnType<typeof sql>) => unitOfWork.run({ shopId }, (tx) => tx.execute(statement));
    await expect(inShop(sql`select queue.enqueue_job('DROP', '{}')`)).rejects.toMatchObject({ cause: { code: '22023' } });
    await expect(inShop(sql`select queue.enqueue_job('mail.send', '[]')`)).rejects.toMatchObject({ cause: { code: '22023' } });
    await expect(inShop(sql`select graphile_worker.add_job('mail.send')`)).rejects.toMatchObject({ cause: { code: '42501' } });
    await expect(inShop(sql`select * from graphile_worker._private_jobs`)).rejects.toMatchObject({ cause: { code: '42501' } });
  });

  it('keeps a mail while the server is away and delivers it once when it is back', async () => {
    await unitOfWork.run({ shopId }, (tx) => outbox.add(tx, reset('secret-4711')));
    const runner = await startJobRunner({
      connectionString: database.worker,
      concurrency: 1,
      handlers: { 'mail.send': (job) => consumer.send(job) },
    });
    try {
      await until(async () => (await rows())[0]?.attempts >= 1);
      expect((await rows())[0]).toMatchObject({
        state: 'waiting',
        failure: expect.stringContaining('ECONNREFUSED'),
        payload: { token: 'secret-4711' },
      });
      const sink = await startMailSink({ port });
      try {
        await until(async () => (await rows())[0]?.state === 'sent');
        expect(sink.mails).toHaveLength(1);
        const [row] = await rows();
        expect(sink.mails[0]?.messageId).toBe(`<${row?.id}@localhost>`);
        expect(sink.mails[0]?.text).toContain('#token=secret-4711');
        expect(row?.payload).not.toHaveProperty('token');
        expect(row?.failure).toBeNull();
        await until(async () => (await waitingJobs()).length === 0);
        await consumer.send({ shopId, outboxId: row?.id, attempt: 2 });
        expect(sink.mails).toHaveLength(1);
      } finally {
        await sink.stop();
      }
    } finally {
      await runner.stop();
    }
  });

  it('shows a mail that is refused for good, without its secret', async () => {
    const sink = await startMailSink({ port });
    let runner: JobRunner | undefined;
    try {
      sink.refuseWith(550);
      await unitOfWork.run({ shopId }, (tx) => outbox.add(tx, reset('secret')));
      runner = await startJobRunner({
        connectionString: database.worker,
        concurrency: 1,
        handlers: { 'mail.send': (job) => consumer.send(job) },
      });
      await until(async () => (await rows())[0]?.state === 'failed');
      const letters = await unitOfWork.read({ shopId }, (tx) => outbox.listDeadLetters(tx, shopId));
      expect(letters).toMatchObject([{ kind: 'password-reset', address: 'ann@example.invalid', reason: expect.stringContaining('550') }]);
      expect((await rows())[0]?.payload).not.toHaveProperty('token');
    } finally {
      await runner?.stop();
      await sink.stop();
    }
  });
});
