import Fastify from 'fastify';
import { shedLoad } from './load-shedding';

describe('shedLoad()', () => {
  it('answers 503 at once when too many requests are in flight, and recovers', async () => {
    const server = Fastify();
    shedLoad(server, 2);
    const release: (() => void)[] = [];
    server.get('/slow', () => new Promise<string>((resolve) => release.push(() => resolve('done'))));
    server.get('/api/health/live', () => 'alive');
    await server.listen({ port: 0, host: '127.0.0.1' });
    const origin = server.listeningOrigin;
    const slow = [fetch(`${origin}/slow`), fetch(`${origin}/slow`)];
    while (release.length < 2) await new Promise((resolve) => setImmediate(resolve));

    const shed = await fetch(`${origin}/slow`);
    expect([shed.status, shed.headers.get('retry-after'), shed.headers.get('content-type')]).toEqual([
      503,
      '1',
      'application/problem+json; charset=utf-8',
    ]);
    expect((await fetch(`${origin}/api/health/live`)).status).toBe(200);

    for (const finish of release) finish();
    for (const answer of await Promise.all(slow)) expect([answer.status, await answer.text()]).toEqual([200, 'done']);
    const after = fetch(`${origin}/slow`);
    while (release.length < 3) await new Promise((resolve) => setImmediate(resolve));
    release[2]?.();
    expect((await after).status).toBe(200);
    await server.close();
  });
});
