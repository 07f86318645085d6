import { isObject, type Json, type JsonObject, type Tolerance } from './number-record';

/** A relative tolerance allows nothing at an expected zero; sums and cosines that should vanish leave about this much. */
const ROUNDING_AT_ZERO = 1e-12;

/**
 * Differences between computed and expected values, one sentence each; empty when all agree.
 * Numbers agree within `abs` or within `rel` times the expected size; without a tolerance they must be equal.
 * Strings, booleans and null must be equal; arrays agree element by element, objects in every expected key.
 */
export function differences(actual: JsonObject, expected: JsonObject, tolerance: Tolerance): readonly string[] {
  return differencesAt('', actual, expected, tolerance);
}

function differencesAt(path: string, actual: Json | undefined, expected: Json, tolerance: Tolerance): readonly string[] {
  if (typeof expected === 'number') return isClose(actual, expected, tolerance) ? [] : [sentence(path, actual, expected)];
  if (isList(expected)) {
    if (!isList(actual) || actual.length !== expected.length) return [sentence(path, actual, expected)];
    return expected.flatMap((item, index) => differencesAt(`${path}[${index}]`, actual[index], item, tolerance));
  }
  if (isObject(expected)) {
    if (!isObject(actual)) return [sentence(path, actual, expected)];
    return Object.entries(expected).flatMap(([key, item]) =>
      differencesAt(path === '' ? key : `${path}.${key}`, actual[key], item, tolerance),
    );
  }
  return actual === expected ? [] : [sentence(path, actual, expected)];
}

function isClose(actual: Json | undefined, expected: number, { rel, abs }: Tolerance): boolean {
  if (typeof actual !== 'number' || Number.isNaN(actual)) return false;
  if (actual === expected) return true;
  const distance = Math.abs(actual - expected);
  if (abs !== undefined && distance <= abs) return true;
  if (rel === undefined) return false;
  return distance <= (expected === 0 ? ROUNDING_AT_ZERO : rel * Math.abs(expected));
}

function isList(json: Json | undefined): json is readonly Json[] {
  return Array.isArray(json);
}

function sentence(path: string, actual: Json | undefined, expected: Json): string {
  const got = actual === undefined ? 'nothing' : typeof actual === 'number' ? String(actual) : JSON.stringify(actual);
  return `${path}: expected ${JSON.stringify(expected)}, got ${got}`;
}
