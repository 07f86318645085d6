import { runInNewContext } from 'node:vm';
import * as imaging from '@proofplate/imaging';
import * as physics from '@proofplate/physics';
import * as recipeModel from '@proofplate/recipe-model';

const ROUNDING = 1e-9;

/** Why the code does not give what a page prints; undefined when it does. */
export function exampleProblem(given: string, call: string, printed: string): string | undefined {
  const refusal = /^refused: (?<message>.+)$/u.exec(printed)?.groups?.message;
  const computed = compute(given, call);
  if ('refused' in computed) {
    return computed.refused === refusal ? undefined : `${call} is refused: ${computed.refused}`;
  }
  if (refusal !== undefined) return `${call} is not refused`;
  return isPrintedAs(computed.value, printed) ? undefined : `${call} gives ${String(computed.value)}, printed is ${printed}`;
}

function compute(given: string, call: string): { readonly value: unknown } | { readonly refused: string } {
  try {
    return { value: runInNewContext(`${given}\n(${call})`, { ...physics, ...imaging, ...recipeModel }) };
  } catch (error) {
    // Errors of the other context are no instances of this one's Error.
    return { refused: typeof error === 'object' && error !== null && 'message' in error ? String(error.message) : String(error) };
  }
}

function isPrintedAs(value: unknown, printed: string): boolean {
  if (typeof value === 'number') return isRoundedTo(value, printed);
  if (Array.isArray(value)) return value.map(String).join(', ') === printed;
  return String(value) === printed;
}

/** The number printed, with its unit behind it, is the value at as many decimals. */
function isRoundedTo(value: number, printed: string): boolean {
  const digits = /^(?<digits>[−-]?\d+(?:\.\d+)?)(?:$| )/u.exec(printed)?.groups?.digits;
  if (digits === undefined) return false;
  const decimals = digits.split('.')[1]?.length ?? 0;
  const distance = Math.abs(value - Number(digits.replace('−', '-')));
  return distance <= 0.5 * 10 ** -decimals + ROUNDING * Math.abs(value);
}
