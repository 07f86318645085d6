// Stands in for a hosted object store: speaks the S3 protocol on loopback, keeps its objects in a folder.
import { mkdirSync } from 'node:fs';
import { createRequire } from 'node:module';

const S3rver = createRequire(import.meta.url)('s3rver');

/** The only key pair the fake knows. */
export const OBJECT_STORE_KEY = 'S3RVER';

/** @returns {{ endpoint: string, stop: () => Promise<void> }} */
export async function startObjectStore({ directory, bucket, port }) {
  mkdirSync(directory, { recursive: true });
  const server = new S3rver({ address: '127.0.0.1', port, directory, silent: true, configureBuckets: [{ name: bucket }] });
  const address = await server.run();
  return { endpoint: `http://127.0.0.1:${address.port}`, stop: () => server.close() };
}
