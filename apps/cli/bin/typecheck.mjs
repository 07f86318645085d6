// Type-checks every workspace with its tests. Needs the build's declarations: npm run typecheck makes them first.
import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { CHECKOUT } from './steps/checkout.mjs';

const folders = ['packages', 'apps'].flatMap((parent) => readdirSync(join(CHECKOUT, parent)).map((name) => `${parent}/${name}`));
const workspaces = [
  ...folders.filter((folder) => !folder.startsWith('apps')),
  'db',
  ...folders.filter((folder) => folder.startsWith('apps')),
];
const wrong = workspaces
  .filter((workspace) => existsSync(join(CHECKOUT, workspace, 'tsconfig.json')))
  .filter((workspace) => !checks(workspace));
if (wrong.length > 0) {
  console.error(`Type errors in ${wrong.join(', ')}.`);
  process.exitCode = 1;
}

function checks(workspace) {
  const compiler = join(CHECKOUT, 'node_modules/typescript/bin/tsc');
  return (
    spawnSync(process.execPath, [compiler, '-p', `${workspace}/tsconfig.json`, '--noEmit'], { cwd: CHECKOUT, stdio: 'inherit' }).status ===
    0
  );
}
