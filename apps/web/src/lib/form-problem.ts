import type { FieldPath, FieldValues, UseFormSetError } from 'react-hook-form';
import { ProblemError } from './api';

/** `#/factors/0/from` → `factors.0.from`, the name a form field carries. */
export function fieldNameFromPointer(pointer: string): string {
  return pointer
    .replace(/^#?\/?/, '')
    .split('/')
    .map((step) => decodeURIComponent(step).replace(/~1/g, '/').replace(/~0/g, '~'))
    .join('.');
}

/**
 * Shows the messages of a refused submit at their fields. Returns what no field can show: the whole problem when it names no field of
 * the form, else undefined.
 */
export function showFieldProblems<T extends FieldValues>(
  error: unknown,
  setError: UseFormSetError<T>,
  fieldNames: readonly FieldPath<T>[],
): ProblemError | undefined {
  if (!(error instanceof ProblemError)) throw error;
  const shown = error.errors.flatMap(({ pointer, detail }) => {
    const name = fieldNames.find((candidate) => candidate === fieldNameFromPointer(pointer));
    return name === undefined ? [] : [{ name, detail }];
  });
  for (const { name, detail } of shown) setError(name, { type: 'server', message: detail });
  return shown.length === error.errors.length && shown.length > 0 ? undefined : error;
}
