// The pages of docs/science as they were when the application was built.
const FILES = import.meta.glob<string>('../../../../../docs/science/*.md', { query: '?raw', import: 'default', eager: true });

const INDEX = 'README';
const PAGES = new Map(Object.entries(FILES).map(([file, text]) => [file.replace(/^.*\/|\.md$/gu, ''), text]));

export type SciencePage = { title: string; body: string };

/** A page by its name in the address; undefined: the index, and no page where the name is unknown. */
export function findSciencePage(name: string = INDEX): SciencePage | undefined {
  const text = PAGES.get(name);
  if (text === undefined) return undefined;
  const [first = '', ...rest] = text.split('\n');
  return { title: first.replace(/^#\s*/u, ''), body: rest.join('\n') };
}
