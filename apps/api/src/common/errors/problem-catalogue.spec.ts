import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { PROBLEMS } from './problem-catalogue';
import { problemPage } from './problem-page';

const SOURCES = join(__dirname, '..', '..');
const CODE = /readonly code(?:: string)? = '([a-z0-9-]+)'/g;

function codesInSources(): string[] {
  const files = readdirSync(SOURCES, { recursive: true, encoding: 'utf8' }).filter((name) => /errors?\.ts$/.test(name));
  return files.flatMap((name) => [...readFileSync(join(SOURCES, name), 'utf8').matchAll(CODE)].map((match) => match[1] ?? ''));
}

describe('the catalogue of problems', () => {
  it('explains every code that an error class carries', () => {
    const codes = codesInSources();
    expect(codes).toContain('stale-version');
    expect(codes.filter((code) => !Object.hasOwn(PROBLEMS, code))).toEqual([]);
  });

  it('is what docs/problems.md says', () => {
    const page = readFileSync(join(SOURCES, '..', '..', '..', 'docs', 'problems.md'), 'utf8');
    expect(page).toBe(problemPage(PROBLEMS));
  });
});
