import { PROBLEMS } from '../errors/problem-catalogue';

export type Problem = {
  readonly code: string;
  readonly title: string;
  readonly status: number;
  readonly detail: string;
  readonly extensions: Readonly<Record<string, unknown>>;
  readonly headers: Readonly<Record<string, string>>;
};

/** A problem of the catalogue. @throws RangeError for a code that is not in it */
export function problem(code: string, detail?: string, headers: Readonly<Record<string, string>> = {}): Problem {
  const text = PROBLEMS[code];
  if (text === undefined) throw new RangeError(`problem type ${code} is not in the catalogue`);
  return { code, title: text.title, status: text.status, detail: detail ?? text.meaning, extensions: {}, headers };
}
