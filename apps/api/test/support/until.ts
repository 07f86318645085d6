import { setTimeout as pause } from 'node:timers/promises';

const LOOK_AGAIN_MS = 50;

/** Waits until `look` gives something; work of another process or connection has no other sign of its end. */
export async function until<T>(look: () => T | undefined | false | Promise<T | undefined | false>, withinMs = 15_000): Promise<T> {
  const end = performance.now() + withinMs;
  for (;;) {
    const found = await look();
    if (found !== undefined && found !== false) return found;
    if (performance.now() > end) throw new Error(`nothing came within ${withinMs} ms`);
    await pause(LOOK_AGAIN_MS);
  }
}
