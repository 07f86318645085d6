import { csvText } from '../../../lib/csv';
import type { Comparison, Revision } from '../recipes.api';
import { revisionName, stateWord } from '../revision-words';

/** The comparison as a file, equal rows included; reasons and signatures stand under the numbers. */
export function comparisonCsv({ revisions, referenceId, rows }: Comparison): string {
  const columns = revisions.flatMap((revision) => [columnName(revision), `${columnName(revision)} change`]);
  const numbers = rows.map((row) => [
    row.group,
    row.step,
    row.label,
    row.unit,
    ...row.values.flatMap(({ value, text, missingBecause, change, size }) => [
      value ?? text ?? missingBecause ?? '',
      size === null ? change : (size.percent ?? size.points ?? size.delta),
    ]),
  ]);
  const about = (label: string, read: (revision: Revision) => string) => [
    'revision',
    null,
    label,
    '',
    ...revisions.flatMap((revision) => [read(revision), '']),
  ];
  return csvText([
    ['group', 'step', 'row', 'unit', ...columns],
    ...numbers,
    about('state', ({ state }) => stateWord(state)),
    about('compared with', ({ id }) => (id === referenceId ? 'the reference' : '')),
    about('reason', ({ reason }) => reason),
    about('signatures', signatures),
  ]);
}

function columnName(revision: Revision): string {
  return `${revision.recipe.code} ${revisionName(revision).toLowerCase()}`;
}

/** Name, meaning and time stand wherever a signed revision is shown. */
function signatures({ signOffs }: Revision): string {
  return signOffs.map(({ printedName, meaning, signedAt }) => `${printedName}: ${meaning} ${signedAt}`).join('; ');
}
