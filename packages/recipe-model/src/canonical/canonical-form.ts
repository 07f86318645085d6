/** Thrown for a value that has no canonical form; `path` says where it is. */
export class NotCanonicalError extends TypeError {
  constructor(
    readonly path: string,
    problem: string,
  ) {
    super(`${path} ${problem}`);
    this.name = 'NotCanonicalError';
  }
}

/**
 * The one text of a JSON value, so that equal contents have equal hashes wherever they are computed.
 *      members sorted by UTF-16 code units, no white space, numbers and strings as ECMAScript writes them
 *
 * @param value plain JSON; members that are undefined count as absent, as they do on the wire
 * @returns the canonical text, to be encoded as UTF-8
 * @throws NotCanonicalError naming the path: number not finite, lone surrogate, or a value that JSON cannot carry
 * Source: RFC 8785 (JSON Canonicalization Scheme), 3.2
 */
export function canonicalForm(value: unknown): string {
  return written(value, '$');
}

function written(value: unknown, path: string): string {
  if (value === null || typeof value === 'boolean') return String(value);
  if (typeof value === 'number') return writtenNumber(value, path);
  if (typeof value === 'string') return writtenString(value, path);
  if (Array.isArray(value)) return `[${Array.from(value, (item, index) => written(item, `${path}[${index}]`)).join(',')}]`;
  if (isPlainObject(value)) return writtenObject(value, path);
  throw new NotCanonicalError(path, `is ${typeof value === 'object' ? 'not a plain object' : `of type ${typeof value}`}`);
}

function writtenNumber(value: number, path: string): string {
  if (!Number.isFinite(value)) throw new NotCanonicalError(path, `is ${value}, which is not a finite number`);
  // JSON.stringify writes -0 as 0 and follows ECMAScript's shortest form, which RFC 8785 3.2.2.3 takes over.
  return JSON.stringify(value);
}

function writtenString(value: string, path: string): string {
  if (/\p{Surrogate}/u.test(value)) throw new NotCanonicalError(path, 'holds half of a character pair (lone surrogate)');
  return JSON.stringify(value);
}

function writtenObject(value: Record<string, unknown>, path: string): string {
  const members = Object.keys(value)
    .filter((name) => value[name] !== undefined)
    // The default order of sort() is by UTF-16 code units, as RFC 8785 3.2.3 asks.
    .sort()
    .map((name) => `${writtenString(name, path)}:${written(value[name], `${path}.${name}`)}`);
  return `{${members.join(',')}}`;
}

function isPlainObject(value: unknown): value is Record<string, unknown> {
  if (typeof value !== 'object' || value === null) return false;
  const prototype: unknown = Object.getPrototypeOf(value);
  return prototype === Object.prototype || prototype === null || isForeignObjectPrototype(prototype);
}

/** Object.prototype of another realm (a test runner, a frame) is not ours but is just as plain. */
function isForeignObjectPrototype(prototype: unknown): boolean {
  return (
    typeof prototype === 'object' &&
    prototype !== null &&
    Object.getPrototypeOf(prototype) === null &&
    Object.hasOwn(prototype, 'isPrototypeOf')
  );
}
