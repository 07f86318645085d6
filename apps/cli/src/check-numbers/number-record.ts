export type Json = null | boolean | number | string | readonly Json[] | { readonly [key: string]: Json };

export type JsonObject = { readonly [key: string]: Json };

/** One outside check value: what a formula must give for its inputs. */
export type NumberRecord = {
  readonly name: string;
  readonly formula: string;
  readonly inputs: JsonObject;
  readonly expected: JsonObject;
  readonly tolerance: Tolerance;
};

export type Tolerance = { readonly rel?: number; readonly abs?: number };

/** Reads a record; throws TypeError saying which part of it is not as it should be. */
export function readRecord(json: Json): NumberRecord {
  if (!isObject(json)) throw new TypeError('a record is not an object');
  const { name, formula, inputs, expected, tolerance } = json;
  if (typeof name !== 'string') throw new TypeError('a record has no name');
  if (typeof formula !== 'string') throw new TypeError(`record "${name}" has no formula`);
  if (!isObject(inputs)) throw new TypeError(`record "${name}" has no inputs`);
  if (!isObject(expected) || Object.keys(expected).length === 0) throw new TypeError(`record "${name}" expects nothing`);
  return { name, formula, inputs, expected, tolerance: readTolerance(name, tolerance) };
}

export function isObject(json: Json | undefined): json is JsonObject {
  return typeof json === 'object' && json !== null && !Array.isArray(json);
}

function readTolerance(name: string, json: Json | undefined): Tolerance {
  if (json === undefined || json === null) return {};
  if (!isObject(json)) throw new TypeError(`record "${name}" has a tolerance that is not an object`);
  const { rel, abs, ...unknown } = json;
  const [stranger] = Object.keys(unknown);
  if (stranger !== undefined) throw new TypeError(`record "${name}" has an unknown tolerance: ${stranger}`);
  if (!isTolerance(rel) || !isTolerance(abs)) throw new TypeError(`record "${name}" has a tolerance that is not a number of 0 or more`);
  return { rel, abs };
}

function isTolerance(json: Json | undefined): json is number | undefined {
  return json === undefined || (typeof json === 'number' && Number.isFinite(json) && json >= 0);
}
