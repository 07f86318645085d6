import { execFileSync } from 'node:child_process';
import { cpSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';

const PATCHES = join(__dirname, '../patches');
const FILES = ['src/index.js', 'src/connection.js', 'cjs/src/index.js', 'cjs/src/connection.js'];

describe('apply.mjs', () => {
  let checkout: string;
  let driver: string;

  beforeEach(() => {
    checkout = mkdtempSync(join(tmpdir(), 'proofplate-patches-'));
    driver = join(checkout, 'node_modules/postgres');
    cpSync(PATCHES, join(checkout, 'patches'), { recursive: true });
    mkdirSync(dirname(driver));
    cpSync(join(dirname(require.resolve('postgres')), '../..'), driver, { recursive: true });
  });

  afterEach(() => rmSync(checkout, { recursive: true, force: true }));

  const apply = () => execFileSync(process.execPath, [join(checkout, 'patches/apply.mjs')], { stdio: 'pipe' });
  const contents = () => FILES.map((path) => readFileSync(join(driver, path), 'utf8'));

  it('changes nothing when the driver is patched already', () => {
    const before = contents();

    apply();

    expect(contents()).toEqual(before);
  });

  it('marks both builds', () => {
    const [esm, , cjs] = contents();

    expect(esm).toContain("proofplatePatch: '1'");
    expect(cjs).toContain("proofplatePatch: '1'");
  });

  it('refuses another version of the driver', () => {
    writeFileSync(join(driver, 'package.json'), JSON.stringify({ name: 'postgres', version: '3.4.10' }));

    expect(apply).toThrow(/fit postgres 3\.4\.9, but 3\.4\.10/);
  });

  it('leaves every file as it was when one does not fit', () => {
    writeFileSync(join(driver, 'cjs/src/index.js'), 'module.exports = () => undefined\n');
    const before = contents();

    expect(apply).toThrow(/cjs\/src\/index\.js does not fit/);
    expect(contents()).toEqual(before);
  });
});
