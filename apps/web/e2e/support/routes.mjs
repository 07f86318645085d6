// Which addresses the router knows, read from its source, so that a new route cannot be forgotten here.
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { matchRoutes } from 'react-router';

const read = (file) => readFileSync(join(import.meta.dirname, '../../src', file), 'utf8');

/** Every pattern of app/router.tsx. Throws for one that it cannot read, rather than leave it out. */
export function routePatterns() {
  const named = new Map([...read('lib/paths.ts').matchAll(/^ {2}(\w+): '([^']+)',$/gm)].map(([, name, path]) => [name, path]));
  return [...read('app/router.tsx').matchAll(/\bpath: ([^,}]+?)\s*[,}]/g)].map(([, source]) => {
    const path = /^'([^']+)'$/.exec(source)?.[1] ?? named.get(/^paths\.(\w+)$/.exec(source)?.[1]);
    if (path === undefined) throw new Error(`the path ${source} of the router cannot be read`);
    return path;
  });
}

/** Remembers which routes were looked at. */
export class Visits {
  #unseen = new Set(routePatterns());
  #routes = [...this.#unseen].map((path) => ({ path }));

  add(pathname) {
    const path = matchRoutes(this.#routes, pathname)?.at(-1)?.route.path;
    if (path !== undefined) this.#unseen.delete(path);
  }

  /** Patterns of the router that nobody has been to. */
  get missing() {
    return [...this.#unseen];
  }
}
