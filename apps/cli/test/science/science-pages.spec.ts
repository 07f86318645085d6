import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import * as physics from '@proofplate/physics';
import { type NumberedSetting, settingNumbers } from '@proofplate/recipe-model';
import { exampleProblem } from './compute-example';
import { SCIENCE_INDEX, SCIENCE_PAGES, tableRows } from './science-pages';

const CHECKOUT = join(__dirname, '../../../..');
const indexed = tableRows(SCIENCE_INDEX, '| page | title | derived numbers that it explains |').map(
  ([page = '', title = '', keys = '']) => ({
    file: /^\[(?<file>[\w.-]+)\]\(\k<file>\)$/u.exec(page)?.groups?.file,
    title,
    keys: keys === '' ? [] : keys.split(', ').map((key) => key.replaceAll('`', '')),
  }),
);
const PHYSICS_FUNCTIONS = Object.entries(physics).flatMap(([name, exported]) => (typeof exported === 'function' ? [name] : []));
const DOCSTRING_PARTS = [/@param/u, /@returns/u, /@throws|nothing is thrown/u, /Valid /u, /Source: /u, /docs\/science\/[\w-]+\.md/u];

describe('a science page', () => {
  it.each(SCIENCE_PAGES.map((page) => [page.file, page] as const))(
    '%s states formula, symbols, validity and source',
    (_file, { title, text }) => {
      expect(title).not.toBe('');
      expect(text).toMatch(/\| formula \||\*\*(?:Formula|Rules)\.\*\*/u);
      for (const part of ['Symbols', 'Validity', 'Source']) expect(text).toContain(`**${part}.**`);
    },
  );

  it.each(SCIENCE_PAGES.map((page) => [page.file, page] as const))(
    '%s has a worked example that the code computes',
    (_file, { given, examples }) => {
      expect(examples.length).toBeGreaterThan(0);
      expect(examples.flatMap(({ call, result }) => exampleProblem(given, call, result) ?? [])).toEqual([]);
    },
  );

  it('would be told of a number that is wrong in its last digit, and of a refusal that does not come', () => {
    expect(exampleProblem('', 'pulseEnergy(20, 30)', '0.67 mJ')).toBeUndefined();
    expect(exampleProblem('', 'pulseEnergy(20, 30)', '0.66 mJ')).toMatch(/gives 0\.666/u);
    expect(exampleProblem('', 'pulseEnergy(20, 20)', 'refused: frequencyKhz')).toBe('pulseEnergy(20, 20) is not refused');
    expect(exampleProblem('', 'pulseEnergy(20, 0)', '0 mJ')).toMatch(/is refused: frequencyKhz must be/u);
    expect(exampleProblem('', 'crossCutClass(3).astm', '5B')).toMatch(/gives 4B/u);
  });
});

describe('the science index', () => {
  it('lists every page with its title', () => {
    const pages = SCIENCE_PAGES.map(({ file, title }) => ({ file, title }));
    const listed = indexed.map(({ file, title }) => ({ file, title }));
    expect([...listed].sort(byFile)).toEqual([...pages].sort(byFile));
  });

  it('names the page of every derived number once, the same as the number’s own source', () => {
    const pageOf = new Map(indexed.flatMap(({ file, keys }) => keys.map((key) => [key, file] as const)));
    expect(indexed.flatMap(({ keys }) => keys)).toHaveLength(pageOf.size);
    const numbers = allDerivedNumbers();
    expect([...pageOf.keys()].sort()).toEqual([...new Set(numbers.map(({ key }) => key))].sort());
    for (const { key, source } of numbers) {
      const named = /docs\/science\/(?<file>[\w-]+\.md)/u.exec(source)?.groups?.file;
      if (named !== undefined) expect(`${key}: ${named}`).toBe(`${key}: ${pageOf.get(key)}`);
    }
  });

  it('names for each of the 14 traps a test that exists', () => {
    const traps = tableRows(SCIENCE_INDEX, '| trap | test file | title of the test |');
    expect(traps).toHaveLength(14);
    for (const [trap, file = '', title = ''] of traps) {
      expect({ trap, hasTest: readFileSync(join(CHECKOUT, file), 'utf8').includes(`'${title}'`) }).toEqual({ trap, hasTest: true });
    }
  });
});

describe('the code', () => {
  const sources = ['physics', 'imaging', 'recipe-model'].flatMap((name) => sourceTexts(join(CHECKOUT, 'packages', name, 'src')));

  it('refers to science pages that exist', () => {
    const named = new Set(sources.flatMap((text) => [...text.matchAll(/docs\/science\/([\w-]+\.md)/gu)].map((match) => match[1])));
    expect(named.size).toBeGreaterThan(10);
    expect([...named].filter((file) => file === undefined || !existsSync(join(CHECKOUT, 'docs/science', file)))).toEqual([]);
  });

  it('states result, errors, validity, source and page of every function of the physics package', () => {
    const docstrings = new Map(sources.flatMap(docstringsOf));
    const wanting = PHYSICS_FUNCTIONS.flatMap((name) => {
      const text = docstrings.get(name) ?? '';
      const missing = DOCSTRING_PARTS.filter((part) => !part.test(text));
      return missing.length === 0 ? [] : [`${name}: ${missing.join(' ')}`];
    });
    expect(wanting).toEqual([]);
  });

  it('has every function of the physics package on a page', () => {
    const texts = SCIENCE_PAGES.map(({ text }) => text).join('\n');
    expect(PHYSICS_FUNCTIONS.filter((name) => !new RegExp(`\\b${name}\\b`, 'u').test(texts))).toEqual([]);
  });
});

function allDerivedNumbers(): readonly physics.DerivedNumber[] {
  const step: NumberedSetting = { values: {}, fill: 'both directions', power: { watts: null, reason: 'no power is set' } };
  const { steps, totals } = settingNumbers([step, step], {
    optics: { physical: { sourceKind: 'fibre-mopa', wavelengthNm: 1064, ratedPowerW: 20 }, focalLengthMm: 163, measuredSpotUm: 60 },
  });
  const { numbers } = physics.roundPartSetUp(
    {
      side: 'outside',
      body: { outerDiameterMm: 20, wallMm: 2 },
      lengthMm: 60,
      artworkHeightMm: 12,
      artwork: { seamMm: 0 },
      allowance: { kind: 'fluence loss', share: 0.1 },
      focusAt: 'mid',
    },
    { spot: { spotDiameterUm: 40, wavelengthNm: 1064, m2: 1.3 }, focusOffsetsMm: [], fieldSizeMm: 110 },
  );
  return [...steps.flatMap((each) => each.numbers), ...totals, ...numbers];
}

/** Docstrings of the exported functions of a file, by the function's name. */
function docstringsOf(text: string): readonly (readonly [string, string])[] {
  return [...text.matchAll(/\/\*\*((?:(?!\*\/)[\s\S])*)\*\/\nexport function (\w+)/gu)].map(
    ([, comment = '', name = '']) => [name, comment] as const,
  );
}

function sourceTexts(folder: string): readonly string[] {
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    const path = join(folder, entry.name);
    if (entry.isDirectory()) return sourceTexts(path);
    return entry.name.endsWith('.ts') ? [readFileSync(path, 'utf8')] : [];
  });
}

function byFile(one: { file?: string }, other: { file?: string }): number {
  return (one.file ?? '').localeCompare(other.file ?? '');
}
