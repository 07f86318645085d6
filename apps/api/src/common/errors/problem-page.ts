import type { ProblemText } from './problem-catalogue';

/** docs/problems.md from the catalogue, by status and code. `npm run openapi` writes it. */
export function problemPage(problems: Readonly<Record<string, ProblemText>>): string {
  const rows = Object.entries(problems)
    .sort(([codeA, a], [codeB, b]) => a.status - b.status || codeA.localeCompare(codeB))
    .map(([code, { status, title, meaning }]) => `| \`${code}\` | ${status} | ${title} | ${meaning} |`);
  return `# Problems

Every refusal of the api is an \`application/problem+json\` document (RFC 9457). Its \`type\` is \`/problems/<code>\`, and that address answers with
the text below. \`detail\` speaks of the case at hand, \`instance\` is the id of the request in the log, and \`errors\` lists wrong fields as
\`{ pointer, detail }\`. A \`stale-version\` carries the present state as \`current\`.

This page is written by \`npm run openapi\` from \`apps/api/src/common/errors/problem-catalogue.ts\`.

| code | status | title | what it means and how to get past it |
| --- | --- | --- | --- |
${rows.join('\n')}
`;
}
