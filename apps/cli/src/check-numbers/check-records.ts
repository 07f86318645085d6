import { differences } from './compare';
import type { FormulaEntry } from './formula-entry';
import { Inputs } from './inputs';
import { isObject, type Json, readRecord } from './number-record';

export type CheckResult = {
  readonly formula: string;
  readonly name: string;
  /** Empty when the record passed. */
  readonly failures: readonly string[];
};

/** Checks each record against the entry of its formula. What cannot be checked has failed. */
export function checkRecords(records: readonly Json[], entries: readonly FormulaEntry[]): readonly CheckResult[] {
  const byFormula = new Map(entries.map((entry) => [entry.formula, entry]));
  return records.map((json) => checkRecord(json, byFormula));
}

function checkRecord(json: Json, byFormula: ReadonlyMap<string, FormulaEntry>): CheckResult {
  let label = { formula: 'unreadable record', name: nameOf(json) };
  try {
    const record = readRecord(json);
    label = { formula: record.formula, name: record.name };
    const entry = byFormula.get(record.formula);
    if (entry === undefined) return { ...label, failures: [`unknown formula: ${record.formula}`] };
    const inputs = new Inputs(record.inputs);
    const wrong = differences(entry.evaluate(inputs), record.expected, record.tolerance);
    return { ...label, failures: [...wrong, ...inputs.unasked().map((key) => `unknown input: ${key}`)] };
  } catch (error) {
    return { ...label, failures: [error instanceof Error ? error.message : String(error)] };
  }
}

/** A record that cannot be read is told by its name, else by how it begins. */
function nameOf(json: Json): string {
  return isObject(json) && typeof json.name === 'string' ? json.name : JSON.stringify(json).slice(0, 80);
}
