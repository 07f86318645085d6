import { differences } from './compare';
import type { FormulaEntry } from './formula-entry';
import { Inputs } from './inputs';
import { type Json, readRecord } from './number-record';

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
  let label = { formula: 'unreadable record', name: JSON.stringify(json).slice(0, 80) };
  try {
    const record = readRecord(json);
    label = { formula: record.formula, name: record.name };
    const entry = byFormula.get(record.formula);
    if (entry === undefined) return { ...label, failures: [`unknown formula: ${record.formula}`] };
    return { ...label, failures: differences(entry.evaluate(new Inputs(record.inputs)), record.expected, record.tolerance) };
  } catch (error) {
    return { ...label, failures: [error instanceof Error ? error.message : String(error)] };
  }
}
