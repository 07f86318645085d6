// The product as npm start serves it, with data of its own that is thrown away.
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { chmodSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { freePort } from '../../../../db/postgres/cluster.mjs';
import { CHECKOUT } from './checkout.mjs';

/**
 * Serves the product on a free port while the work lasts.
 *
 * @param {(environment: Record<string, string>) => Promise<T>} work gets PROOFPLATE_ORIGIN, the letters in PROOFPLATE_MAIL, the demo
 *   sign-ins as JSON in PROOFPLATE_SIGN_INS and the browser in CHROMIUM_BIN
 * @returns {Promise<T>} what the work gives
 * @throws {Error} when the product does not come up
 * @template T
 */
export async function withThrowAwayProduct(chromium, work) {
  const folder = mkdtempSync(join(tmpdir(), 'proofplate-journey-'));
  // The server's account must be able to pass through it.
  chmodSync(folder, 0o755);
  const product = spawn(process.execPath, [join(CHECKOUT, 'apps/cli/bin/start.mjs')], {
    cwd: CHECKOUT,
    env: { ...process.env, PORT: String(await freePort()), PROOFPLATE_DATA: folder, PASSWORD_COST: '4' },
    stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
  });
  const gone = once(product, 'exit');
  try {
    const [address] = await Promise.race([once(product, 'message'), gone.then(() => [undefined])]);
    if (typeof address !== 'object') throw new Error('npm start did not come up; see the lines above.');
    return await work({
      PROOFPLATE_ORIGIN: address.origin,
      PROOFPLATE_MAIL: address.viewerUrl,
      PROOFPLATE_SIGN_INS: JSON.stringify(address.signIns),
      CHROMIUM_BIN: chromium,
    });
  } finally {
    if (product.exitCode === null) product.kill('SIGTERM');
    await gone;
    rmSync(folder, { recursive: true, force: true });
  }
}
