import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import S3rver from 's3rver';

export type ObjectStore = { readonly endpoint: string; readonly port: number; stop(): Promise<void> };

/** An object store on loopback that forgets everything when it stops. */
export async function startObjectStore({ port = 0 } = {}): Promise<ObjectStore> {
  const directory = await mkdtemp(join(tmpdir(), 'objects-'));
  const server = new S3rver({ address: '127.0.0.1', port, silent: true, directory });
  const address = await server.run();
  return {
    endpoint: `http://127.0.0.1:${address.port}`,
    port: address.port,
    async stop() {
      await server.close();
      await rm(directory, { recursive: true, force: true });
    },
  };
}
