import { paths } from '../../lib/paths';

const PAGE = /^(?:\.\/)?([a-z-]+)\.md(?:#.*)?$/u;
const INDEX = /^(?:\.\/)?README\.md(?:#.*)?$/u;

/**
 * Where a link of a science page leads inside the application.
 *
 * @param href as it is written in docs/science
 * @returns an address of ours; undefined for what is not part of the application, such as a source file
 */
export function scienceLink(href: string | undefined): string | undefined {
  if (href === undefined) return undefined;
  if (INDEX.test(href)) return paths.scienceIndex;
  const page = PAGE.exec(href)?.[1];
  return page === undefined ? undefined : paths.science(page);
}
