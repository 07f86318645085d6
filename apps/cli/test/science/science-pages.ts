import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

export type ExampleRow = { readonly name: string; readonly call: string; readonly result: string };

export type SciencePage = {
  readonly file: string;
  readonly title: string;
  readonly text: string;
  /** JavaScript that names what the rows share. */
  readonly given: string;
  readonly examples: readonly ExampleRow[];
};

const FOLDER = join(__dirname, '../../../../docs/science');
const INDEX = 'README.md';

export const SCIENCE_PAGES: readonly SciencePage[] = readdirSync(FOLDER)
  .filter((file) => file.endsWith('.md') && file !== INDEX)
  .map(readPage);

export const SCIENCE_INDEX: string = readFileSync(join(FOLDER, INDEX), 'utf8');

export function sciencePage(file: string): SciencePage {
  return readPage(file);
}

/** Cells of every row of the table that stands below the heading row given, without the code marks. */
export function tableRows(text: string, heading: string): readonly (readonly string[])[] {
  const lines = text.split('\n');
  const start = lines.indexOf(heading);
  if (start === -1) return [];
  const end = lines.findIndex((line, index) => index > start && !line.startsWith('|'));
  return lines
    .slice(start + 2, end === -1 ? undefined : end)
    .map((line) => line.slice(1, line.lastIndexOf('|')).split('|'))
    .map((cells) => cells.map((cell) => cell.trim().replace(/^`(?<code>[^`]*)`$/u, '$<code>')));
}

function readPage(file: string): SciencePage {
  const text = readFileSync(join(FOLDER, file), 'utf8');
  const [, example = ''] = text.split('\n## Worked example\n');
  return {
    file,
    title: /^# (?<title>.+)/u.exec(text)?.groups?.title ?? '',
    text,
    given: /```js\n(?<given>[\s\S]*?)```/u.exec(example)?.groups?.given ?? '',
    examples: tableRows(example, '| number | computed by | result |').map(([name = '', call = '', result = '']) => ({
      name,
      call,
      result,
    })),
  };
}
