import { randomBytes, randomUUID } from 'node:crypto';
import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import { cloneDatabase, type TestDatabase } from '@proofplate/db/testing';
import postgres from 'postgres';
import sharp from 'sharp';
import type { Actor } from '../src/common/actor';
import { Env } from '../src/config/env.validation';
import { type JobRunner, startJobRunner } from '../src/jobs/job-runner';
import type { PhotoDto } from '../src/photos/dto/photo.dto';
import { PhotoDeveloperService } from '../src/photos/photo-developer.service';
import { PhotoSweepService } from '../src/photos/photo-sweep.service';
import { keptObjectKey, receivedObjectKey } from '../src/storage/object-keys';
import { StorageService } from '../src/storage/storage.service';
import { formFile } from './support/form-file';
import { type ObjectStore, startObjectStore } from './support/object-store';
import { calledBy, startPhotoApp } from './support/photo-app';
import { makePhotoShop, type PhotoShop } from './support/photo-shop';
import { until } from './support/until';

const CORNERS = [
  { x: 0.1, y: 0.1 },
  { x: 0.9, y: 0.1 },
  { x: 0.9, y: 0.9 },
  { x: 0.1, y: 0.9 },
];
/** Every call differs, so that no test meets the photo of another. */
const newPhoto = () =>
  sharp(randomBytes(60 * 40 * 3), { raw: { width: 60, height: 40, channels: 3 } })
    .jpeg()
    .withExif({ IFD0: { Make: 'Northlight' }, IFD2: { DateTimeOriginal: '2024:07:01 12:00:00' } })
    .toBuffer();

describe('photos', () => {
  let database: TestDatabase;
  let superuser: postgres.Sql;
  let store: ObjectStore;
  let app: NestFastifyApplication;
  let storage: StorageService;
  let shop: PhotoShop;
  let ann: Actor;

  beforeAll(async () => {
    database = await cloneDatabase();
    superuser = postgres(database.superuser, { max: 1 });
    store = await startObjectStore();
    const env = Object.assign(new Env(), { NODE_ENV: 'test', DATABASE_URL: database.app, OBJECT_STORE_ENDPOINT: store.endpoint });
    app = await startPhotoApp(env);
    storage = app.get(StorageService);
  });

  beforeEach(async () => {
    shop = await makePhotoShop(superuser);
    ann = shop.actor();
  });

  afterAll(async () => {
    await app.close();
    await superuser.end();
    await store.stop();
    await database.drop();
  });

  const upload = (
    bytes: Buffer,
    { as = ann, couponId = shop.couponId, ...form }: { as?: Actor; couponId?: string; name?: string; isStreamed?: boolean } = {},
  ) => {
    const { payload, headers } = formFile(bytes, form);
    return app.inject({ method: 'POST', url: `/api/coupons/${couponId}/photos`, payload, headers: { ...headers, ...calledBy(as) } });
  };
  const get = (url: string, as: Actor = ann) => app.inject({ method: 'GET', url, headers: calledBy(as) });
  const putCorners = (id: string, corners: unknown, ifMatch?: string, as: Actor = ann) =>
    app.inject({
      method: 'PUT',
      url: `/api/photos/${id}/corners`,
      payload: { corners },
      headers: { ...calledBy(as), ...(ifMatch === undefined ? {} : { 'if-match': ifMatch }) },
    });
  const develop = (photo: PhotoDto) => app.get(PhotoDeveloperService).develop({ shopId: shop.shopId, photoId: photo.id, attempt: 1 });
  const uploadReady = async () => {
    const sent = (await upload(await newPhoto())).json<PhotoDto>();
    await develop(sent);
    return (await get(`/api/photos/${sent.id}`)).json<PhotoDto>();
  };
  const listed = async (prefix: string) => {
    const keys: string[] = [];
    for await (const object of storage.list(prefix)) keys.push(object.key);
    return keys;
  };
  const received = () => listed(`received/${shop.shopId}/`);
  const photoRows = () => superuser`select id, state from photo where shop_id = ${shop.shopId}`;

  it('come in, are processed by the worker and open by their signed address', async () => {
    const answer = await upload(await newPhoto());
    expect(answer.statusCode).toBe(201);
    const sent = answer.json<PhotoDto>();
    expect(sent).toMatchObject({ state: 'processing', urls: null, couponId: shop.couponId, refusedReason: null });
    expect(answer.headers.etag).toBe('"v1"');

    const developer = app.get(PhotoDeveloperService);
    const runner: JobRunner = await startJobRunner({
      connectionString: database.worker,
      concurrency: 1,
      handlers: { 'photos.develop': (job) => developer.develop(job) },
    });
    const ready = await until(async () => {
      const photo = (await get(`/api/photos/${sent.id}`)).json<PhotoDto>();
      return photo.state === 'ready' && photo;
    }).finally(() => runner.stop());
    // noon by the camera in Lisbon's summer is eleven in UTC
    expect(ready).toMatchObject({
      widthPx: 60,
      heightPx: 40,
      capturedAt: '2024-07-01T11:00:00.000Z',
      allowedActions: ['set-corners'],
      version: 2,
    });
    expect(await received()).toEqual([]);

    for (const url of Object.values(ready.urls ?? {})) {
      const picture = await app.inject({ method: 'GET', url });
      expect(picture.statusCode).toBe(200);
      expect(picture.headers).toMatchObject({
        'content-type': 'image/jpeg',
        'x-content-type-options': 'nosniff',
        'cross-origin-resource-policy': 'same-origin',
        'cache-control': 'private, max-age=300, immutable',
      });
      expect(picture.headers['content-security-policy']).toContain('sandbox');
      expect((await sharp(picture.rawPayload).metadata()).format).toBe('jpeg');
      expect(picture.rawPayload.includes('Northlight')).toBe(false);
    }
    const events = await superuser`select action, actor_name from ledger_event where shop_id = ${shop.shopId} order by seq`;
    expect(events).toMatchObject([
      { action: 'photo.uploaded', actor_name: 'Ann Lee' },
      { action: 'photo.developed', actor_name: 'Proofplate' },
    ]);
  });

  it('are listed newest first, page by page', async () => {
    const ids = [];
    for (let count = 0; count < 3; count += 1) ids.unshift((await upload(await newPhoto())).json<PhotoDto>().id);
    const url = `/api/coupons/${shop.couponId}/photos?limit=2`;
    const first = (await get(url)).json<{ items: PhotoDto[]; nextCursor: string }>();
    const second = (await get(`${url}&cursor=${first.nextCursor}`)).json<{ items: PhotoDto[]; nextCursor: null }>();
    expect([...first.items, ...second.items].map((photo) => photo.id)).toEqual(ids);
    expect(second.nextCursor).toBeNull();
  });

  it('answer the same bytes sent twice with the photo that is there', async () => {
    const bytes = await newPhoto();
    const first = await upload(bytes);
    const second = await upload(bytes);
    expect([first.statusCode, second.statusCode]).toEqual([201, 200]);
    expect(second.json<PhotoDto>().id).toBe(first.json<PhotoDto>().id);
    expect(await photoRows()).toHaveLength(1);
  });

  it('are one photo when the same bytes arrive several times at once', async () => {
    const bytes = await newPhoto();
    const answers = await Promise.all(Array.from({ length: 4 }, () => upload(bytes)));
    expect(answers.map((answer) => answer.statusCode).sort()).toEqual([200, 200, 200, 201]);
    expect(await photoRows()).toHaveLength(1);
  });

  it.each([
    ['a page named as a photo', Buffer.from(`<!doctype html><script>alert(1)</script>${' '.repeat(100)}`), 415, 'unsupported-photo'],
    ['a drawing', Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"/>'), 415, 'unsupported-photo'],
    ['a HEIC photo', Buffer.concat([Buffer.from([0, 0, 0, 24]), Buffer.from('ftypheic'), Buffer.alloc(64)]), 415, 'heic-photo'],
    ['an empty file', Buffer.alloc(0), 422, 'invalid-fields'],
    ['four bytes', Buffer.from('abcd'), 415, 'unsupported-photo'],
  ])('refuse %s and keep nothing of it', async (_, bytes, status, code) => {
    const answer = await upload(bytes);
    expect(answer.statusCode).toBe(status);
    expect(answer.headers['content-type']).toContain('application/problem+json');
    expect(answer.json()).toMatchObject({ type: `/problems/${code}` });
    expect(await photoRows()).toHaveLength(0);
    expect(await received()).toEqual([]);
  });

  it.each([false, true])('refuse more than 25 MB (streamed without a length: %s)', async (isStreamed) => {
    const bytes = Buffer.concat([await newPhoto(), Buffer.alloc(26 * 1024 * 1024)]);
    const answer = await upload(bytes, { isStreamed });
    expect([answer.statusCode, answer.json().type]).toEqual([413, '/problems/too-large']);
    expect(await photoRows()).toHaveLength(0);
    expect(await received()).toEqual([]);
  });

  it('that are refused half-way leave no connection hanging', async () => {
    const listening = await startPhotoApp(app.get(Env));
    await listening.listen(0, '127.0.0.1');
    const form = new FormData();
    form.set('file', new Blob([Buffer.from('<!doctype html>'), Buffer.alloc(8_000_000)]), 'plate.jpg');
    const url = `${await listening.getUrl()}/api/coupons/${shop.couponId}/photos`;
    const answer = await fetch(url, { method: 'POST', body: form, headers: calledBy(ann) });
    expect([answer.status, await answer.json()]).toEqual([415, expect.objectContaining({ type: '/problems/unsupported-photo' })]);
    // closing waits for open requests, and jest for closing
    await listening.close();
  });

  it('refuse a request without a file', async () => {
    const url = `/api/coupons/${shop.couponId}/photos`;
    const json = await app.inject({ method: 'POST', url, payload: { file: 'x' }, headers: calledBy(ann) });
    expect(json.statusCode).toBe(415);
    const boundary = '----none';
    const headers = { ...calledBy(ann), 'content-type': `multipart/form-data; boundary=${boundary}` };
    const empty = await app.inject({ method: 'POST', url, payload: `--${boundary}--\r\n`, headers });
    expect(empty.statusCode).toBe(422);
    expect(empty.json()).toMatchObject({ errors: [{ pointer: '#/file' }] });
  });

  it('take no file name from the sender', async () => {
    const sent = (await upload(await newPhoto(), { name: '../../etc/passwd' })).json<PhotoDto>();
    expect(await received()).toEqual([receivedObjectKey(shop.shopId, sent.id)]);
    await develop(sent);
    const ready = (await get(`/api/photos/${sent.id}`)).json<PhotoDto>();
    const picture = await app.inject({ method: 'GET', url: ready.urls?.small ?? '' });
    expect(picture.headers['content-disposition']).toBe('inline; filename="photo-small.jpg"');
  });

  it('say in words why one is refused, and take it again', async () => {
    const whole = await newPhoto();
    const cut = whole.subarray(0, whole.length - 900);
    const sent = (await upload(cut)).json<PhotoDto>();
    await develop(sent);
    const refused = (await get(`/api/photos/${sent.id}`)).json<PhotoDto>();
    expect(refused).toMatchObject({
      state: 'refused',
      refusedReason: expect.stringContaining('take the photo again'),
      urls: null,
      allowedActions: [],
    });
    expect(await received()).toEqual([]);
    const again = await upload(cut);
    expect([again.statusCode, again.json<PhotoDto>().state]).toEqual([200, 'processing']);
  });

  it('are closed to another shop, whatever the route', async () => {
    const photo = await uploadReady();
    const stranger = (await makePhotoShop(superuser)).actor('owner');
    const answers = [
      await upload(await newPhoto(), { as: stranger }),
      await get(`/api/coupons/${shop.couponId}/photos`, stranger),
      await get(`/api/photos/${photo.id}`, stranger),
      await putCorners(photo.id, CORNERS, '"v2"', stranger),
      await app.inject({ method: 'POST', url: `/api/photos/${photo.id}/retry`, headers: calledBy(stranger) }),
      await app.inject({ method: 'GET', url: (photo.urls?.large ?? '').replace(shop.shopId, stranger.shopId) }),
      await app.inject({ method: 'GET', url: (photo.urls?.large ?? '').replace('/large', '/master') }),
    ];
    expect(answers.map((answer) => answer.statusCode)).toEqual(answers.map(() => 404));
  });

  it('are closed to trainees and to the unknown', async () => {
    const photo = (await upload(await newPhoto())).json<PhotoDto>();
    const trainee = shop.actor('trainee');
    expect((await upload(await newPhoto(), { as: trainee })).statusCode).toBe(403);
    expect((await get(`/api/photos/${photo.id}`, trainee)).statusCode).toBe(403);
    expect((await app.inject({ method: 'GET', url: `/api/photos/${photo.id}` })).statusCode).toBe(401);
    expect((await app.inject({ method: 'GET', url: `/api/photos/${photo.id}/large` })).statusCode).toBe(422);
  });

  it('are refused for a sealed coupon', async () => {
    const photo = await uploadReady();
    await superuser`update coupon set state = 'inspected' where id = ${shop.couponId}`;
    await superuser`update coupon set state = 'sealed' where id = ${shop.couponId}`;
    const late = await upload(await newPhoto());
    expect([late.statusCode, late.json().type]).toEqual([409, '/problems/coupon-sealed']);
    expect((await putCorners(photo.id, CORNERS, '"v2"')).json()).toMatchObject({ type: '/problems/coupon-sealed' });
    expect((await get(`/api/photos/${photo.id}`)).json()).toMatchObject({ state: 'ready', allowedActions: [] });
  });

  it('keep the corners of the plate, for whoever saw the present version', async () => {
    const photo = await uploadReady();
    expect((await putCorners(photo.id, CORNERS)).statusCode).toBe(428);
    expect((await putCorners(photo.id, CORNERS, '"v1"')).json()).toMatchObject({ status: 412, current: { version: 2 } });
    const crossed = await putCorners(photo.id, [CORNERS[0], CORNERS[2], CORNERS[1], CORNERS[3]], '"v2"');
    expect(crossed.json()).toMatchObject({ status: 422, errors: [{ pointer: '#/corners' }] });
    expect((await putCorners(photo.id, [...CORNERS.slice(1), { x: 1.5, y: 0 }], '"v2"')).statusCode).toBe(422);
    const set = await putCorners(photo.id, CORNERS, '"v2"');
    expect([set.statusCode, set.headers.etag]).toEqual([200, '"v3"']);
    expect(set.json()).toMatchObject({ corners: CORNERS, cornersFoundBy: 'hand' });
    const unready = (await upload(await newPhoto())).json<PhotoDto>();
    expect((await putCorners(unready.id, CORNERS, '"v1"')).json()).toMatchObject({ type: '/problems/photo-not-ready' });
  });

  it('wait out a store that is away, without an orphan row', async () => {
    const pending = (await upload(await newPhoto())).json<PhotoDto>();
    await store.stop();
    const answer = await upload(await newPhoto());
    expect([answer.statusCode, answer.headers['retry-after']]).toEqual([503, '30']);
    expect(await photoRows()).toHaveLength(1);
    await develop(pending);
    const [job] = await superuser`select run_at > now() + interval '10 seconds' as "isLater" from graphile_worker._private_jobs
      where key = ${`${shop.shopId}:photos.develop:${pending.id}`}`;
    expect(job).toEqual({ isLater: true });
    store = await startObjectStore({ port: store.port });
    await storage.ensureBucket();
    // the fake forgets everything when it stops, so the bytes are gone: the photo says so
    await develop(pending);
    expect((await get(`/api/photos/${pending.id}`)).json()).toMatchObject({
      state: 'refused',
      refusedReason: expect.stringContaining('Send the photo again'),
    });
  });

  it('that keep failing for unknown reasons are given up', async () => {
    const photo = (await upload(await newPhoto())).json<PhotoDto>();
    await app.get(PhotoDeveloperService).develop({ shopId: shop.shopId, photoId: photo.id, attempt: 4 });
    expect((await get(`/api/photos/${photo.id}`)).json()).toMatchObject({
      state: 'refused',
      refusedReason: expect.stringContaining('several tries'),
    });
  });

  it('that are stuck can be pushed', async () => {
    const photo = (await upload(await newPhoto())).json<PhotoDto>();
    const key = `${shop.shopId}:photos.develop:${photo.id}`;
    const jobs = () => superuser`select 1 from graphile_worker._private_jobs where key = ${key}`;
    await superuser`delete from graphile_worker._private_jobs where key = ${key}`;
    const push = () => app.inject({ method: 'POST', url: `/api/photos/${photo.id}/retry`, headers: calledBy(ann) });
    expect((await push()).statusCode).toBe(200);
    expect(await jobs()).toHaveLength(0);
    await superuser`update photo set created_at = now() - interval '3 minutes' where id = ${photo.id}`;
    expect((await push()).json()).toMatchObject({ allowedActions: ['retry'] });
    expect(await jobs()).toHaveLength(1);
  });

  it('leave nothing behind that no row names, and lose nothing that one does', async () => {
    const sweep = app.get(PhotoSweepService);
    const photo = await uploadReady();
    const stuck = (await upload(await newPhoto())).json<PhotoDto>();
    const orphans = [keptObjectKey(shop.shopId, 'e'.repeat(64)), receivedObjectKey(shop.shopId, randomUUID())];
    for (const key of [...orphans, `shop/${shop.shopId}/a/b`])
      await storage.put(key, { body: Buffer.from(key), bytes: key.length, contentType: 'image/jpeg' });
    await superuser`delete from graphile_worker._private_jobs where key = ${`${shop.shopId}:photos.develop:${stuck.id}`}`;
    await sweep.sweepKept();
    await sweep.sweepReceived();
    expect(await listed('')).toEqual(expect.arrayContaining(orphans));
    const later = new Date(Date.now() + 2 * 3600 * 1000);
    await sweep.sweepKept(later);
    await sweep.sweepReceived(later);
    const left = await listed('');
    expect(left).not.toEqual(expect.arrayContaining([orphans[0]]));
    expect(left).not.toEqual(expect.arrayContaining([orphans[1]]));
    expect(left).toContain(`shop/${shop.shopId}/a/b`);
    expect(left).toContain(keptObjectKey(shop.shopId, photo.masterSha256 ?? ''));
    expect(left).toContain(receivedObjectKey(shop.shopId, stuck.id));
    expect(
      await superuser`select 1 from graphile_worker._private_jobs where key = ${`${shop.shopId}:photos.develop:${stuck.id}`}`,
    ).toHaveLength(1);
    expect((await app.inject({ method: 'GET', url: photo.urls?.master ?? '' })).statusCode).toBe(200);
  });
});
