import { createHash, randomBytes, randomUUID } from 'node:crypto';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { Readable } from 'node:stream';
import { type ObjectStore, startObjectStore } from '../../test/support/object-store';
import { Env } from '../config/env.validation';
import { keptObjectKey, parseObjectKey, receivedObjectKey } from './object-keys';
import { ObjectDamagedError, ObjectMissingError, StorageUnavailableError } from './storage.errors';
import { StorageService } from './storage.service';

const sha256 = (bytes: Buffer) => createHash('sha256').update(bytes).digest('hex');
const serviceFor = (endpoint: string) =>
  new StorageService(Object.assign(new Env(), { NODE_ENV: 'test', OBJECT_STORE_ENDPOINT: endpoint }));
const image = (bytes: Buffer) => ({ body: bytes, bytes: bytes.length, contentType: 'image/jpeg' });

describe('StorageService', () => {
  const shopId = randomUUID();
  let store: ObjectStore;
  let storage: StorageService;

  beforeAll(async () => {
    store = await startObjectStore();
    storage = serviceFor(store.endpoint);
    await storage.onApplicationBootstrap();
  });

  afterAll(async () => {
    storage.onApplicationShutdown();
    await store.stop();
  });

  it('makes its bucket at start, and a second start finds it', async () => {
    expect(await storage.isReachable()).toBe(true);
    await expect(storage.ensureBucket()).resolves.toBeUndefined();
  });

  it('gives back what was put, from memory and from a stream', async () => {
    const bytes = randomBytes(3_000_000);
    const key = keptObjectKey(shopId, sha256(bytes));
    await storage.put(key, {
      body: () => Readable.from([bytes.subarray(0, 1000), bytes.subarray(1000)]),
      bytes: bytes.length,
      contentType: 'image/jpeg',
    });
    const { stream, bytes: length } = await storage.get(key);
    expect(length).toBe(bytes.length);
    expect(sha256(Buffer.concat(await stream.toArray()))).toBe(sha256(bytes));
    expect((await storage.getWhole(key, sha256(bytes))).equals(bytes)).toBe(true);
  });

  it('leaves an object alone that is already there', async () => {
    const bytes = randomBytes(500);
    const key = keptObjectKey(shopId, sha256(bytes));
    await storage.put(key, image(bytes));
    let wasRead = false;
    const reader = () => {
      wasRead = true;
      return Readable.from([Buffer.alloc(500)]);
    };
    await storage.put(key, { body: reader, bytes: 500, contentType: 'image/jpeg' });
    expect(wasRead).toBe(false);
    expect((await storage.getWhole(key, sha256(bytes))).equals(bytes)).toBe(true);
  });

  it('tells a missing object from a store that is down', async () => {
    const key = keptObjectKey(shopId, 'a'.repeat(64));
    expect(await storage.head(key)).toBeUndefined();
    await expect(storage.get(key)).rejects.toBeInstanceOf(ObjectMissingError);
  });

  it('notices content that is not what the row promises', async () => {
    const key = receivedObjectKey(shopId, randomUUID());
    await storage.put(key, image(Buffer.from('one thing')));
    await expect(storage.getWhole(key, sha256(Buffer.from('another')))).rejects.toBeInstanceOf(ObjectDamagedError);
  });

  it('deletes, twice if asked, and lists by prefix', async () => {
    const other = randomUUID();
    const keys = [randomUUID(), randomUUID()].map((id) => receivedObjectKey(other, id));
    for (const key of keys) await storage.put(key, image(Buffer.from(key)));
    const listed = async () => {
      const found: string[] = [];
      for await (const object of storage.list(`received/${other}/`)) found.push(object.key);
      return found;
    };
    expect((await listed()).sort()).toEqual([...keys].sort());
    await storage.delete(keys[0] ?? '');
    await storage.delete(keys[0] ?? '');
    expect(await listed()).toEqual([keys[1]]);
  });

  it('answers with try-again when nobody listens, and does not stop the start', async () => {
    const gone = serviceFor('http://127.0.0.1:1');
    expect(await gone.isReachable()).toBe(false);
    await expect(gone.put('x', image(Buffer.from('x')))).rejects.toMatchObject({ status: 503, code: 'storage-unavailable' });
    await expect(gone.onApplicationBootstrap()).resolves.toBeUndefined();
  });

  describe('against a faulty store', () => {
    let faulty: Server;
    let answerWith: { status: number; keptBytes: number };

    beforeAll(async () => {
      faulty = createServer((request, response) => {
        request.resume();
        response.writeHead(answerWith.status, { 'content-length': request.method === 'HEAD' ? answerWith.keptBytes : 0 }).end();
      });
      await new Promise<void>((resolve) => faulty.listen(0, '127.0.0.1', resolve));
    });

    afterAll(() => {
      faulty.closeAllConnections();
      faulty.close();
    });

    const faultyService = () => serviceFor(`http://127.0.0.1:${(faulty.address() as AddressInfo).port}`);

    it('turns the store’s own errors into try-again', async () => {
      answerWith = { status: 500, keptBytes: 0 };
      await expect(faultyService().get('shop/x')).rejects.toBeInstanceOf(StorageUnavailableError);
    });

    it('does not believe a store that kept less than was sent', async () => {
      answerWith = { status: 200, keptBytes: 3 };
      await expect(faultyService().put('shop/x', image(Buffer.from('longer than three')))).rejects.toBeInstanceOf(ObjectDamagedError);
    });
  });
});

describe('object keys', () => {
  it('are made of ids and hashes only', () => {
    const shopId = randomUUID();
    for (const bad of ['../x', '', 'CON', `${'a'.repeat(63)}/`, 'A'.repeat(64)])
      expect(() => keptObjectKey(shopId, bad)).toThrow(RangeError);
    expect(() => keptObjectKey('../../etc', 'a'.repeat(64))).toThrow(RangeError);
    expect(() => receivedObjectKey(shopId, 'x')).toThrow(RangeError);
  });

  it('give back their shop', () => {
    const shopId = randomUUID();
    expect(parseObjectKey(keptObjectKey(shopId, 'a'.repeat(64)))).toEqual({ shopId, name: 'a'.repeat(64) });
    expect(parseObjectKey('shop/notes.txt')).toBeUndefined();
    expect(parseObjectKey(`shop/${shopId}/a/b`)).toBeUndefined();
  });
});
