// npm run bench: measures what people feel, in a slowed browser against the product with throw-away data. No test rests on it.
import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { CHECKOUT } from './steps/checkout.mjs';
import { ensureChromium, ensurePackages, ensurePostgres, requireNode } from './steps/requirements.mjs';

const say = (line) => console.log(line);

requireNode();
ensurePackages(say);
ensurePostgres(say);
const chromium = ensureChromium(say);
const { withThrowAwayProduct } = await import('./steps/throw-away-product.mjs');
process.exitCode = await withThrowAwayProduct(chromium, async (environment) => {
  const bench = join(CHECKOUT, 'apps/web/bench/key-to-numbers.mjs');
  const { status } = spawnSync(process.execPath, [bench], { cwd: CHECKOUT, env: { ...process.env, ...environment }, stdio: 'inherit' });
  return status ?? 1;
});
