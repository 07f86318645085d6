// Runs a command of this workspace: `node apps/cli/bin/run.mjs COMMAND [ARGUMENT…]`.
// Builds first; the compiler itself skips what is up to date.
import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync } from 'node:fs';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

const workspace = dirname(dirname(fileURLToPath(import.meta.url)));
const [command, ...commandArguments] = process.argv.slice(2);
const commands = readdirSync(join(workspace, 'src')).filter((name) => existsSync(join(workspace, 'src', name, 'main.ts')));

if (!commands.includes(command)) {
  console.error(`usage: node apps/cli/bin/run.mjs ${commands.join('|')} [argument…]`);
  process.exit(2);
}

const compiler = createRequire(import.meta.url).resolve('typescript/bin/tsc');
const build = spawnSync(process.execPath, [compiler, '-b', join(workspace, 'tsconfig.build.json')], { stdio: ['ignore', 2, 2] });
if (build.status !== 0) process.exit(2);

const run = spawnSync(process.execPath, [join(workspace, 'dist', command, 'main.js'), ...commandArguments], { stdio: 'inherit' });
process.exit(run.status ?? 2);
