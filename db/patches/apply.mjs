// Applies the patches of this folder to the installed driver. Runs after every install; a second run changes nothing.
import { existsSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';

const EXPECTED_VERSION = '3.4.9';
const here = import.meta.dirname;

const driverFolder = findDriver(here);
const { version } = JSON.parse(readFileSync(join(driverFolder, 'package.json'), 'utf8'));
if (version !== EXPECTED_VERSION) throw new Error(`The patches fit postgres ${EXPECTED_VERSION}, but ${version} is installed.`);

const patches = readdirSync(here).filter((name) => name.endsWith('.patch'));
const changes = patches.flatMap((name) => plan(readFileSync(join(here, name), 'utf8')));
// Everything is computed before anything is written: a patch that does not fit leaves the driver as it was.
for (const { path, text } of changes) writeFileSync(path, text);

function findDriver(from) {
  for (let folder = from; ; folder = dirname(folder)) {
    const candidate = join(folder, 'node_modules', 'postgres');
    if (existsSync(join(candidate, 'package.json'))) return candidate;
    if (folder === dirname(folder)) throw new Error('The package postgres is not installed.');
  }
}

function plan(patch) {
  return patch
    .split(/^--- .*\n/m)
    .slice(1)
    .flatMap((section) => {
      const target = /^\+\+\+ b\/(.+)\n/.exec(section)?.[1];
      if (!target) throw new Error('A patch has a section without a file name.');
      const path = join(driverFolder, target);
      const original = readFileSync(path, 'utf8');
      const text = patched(original, hunksOf(section), target);
      return text === original ? [] : [{ path, text }];
    });
}

function hunksOf(section) {
  return section
    .split(/^@@ .*@@.*\n/m)
    .slice(1)
    .map((body) => {
      const lines = body.split('\n').slice(0, -1);
      const side = (sign) => lines.filter((line) => line[0] === ' ' || line[0] === sign).map((line) => line.slice(1));
      return { before: side('-').join('\n'), after: side('+').join('\n') };
    });
}

function patched(original, hunks, target) {
  if (hunks.every(({ after }) => original.includes(after))) return original;
  return hunks.reduce((text, { before, after }) => {
    const pieces = text.split(before);
    if (pieces.length !== 2) throw new Error(`The patch for ${target} does not fit; reinstall the package postgres and try again.`);
    return pieces.join(after);
  }, original);
}
