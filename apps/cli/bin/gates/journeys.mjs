// Whole journeys in a browser against the product as npm start serves it, with data of its own that is thrown away.
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { chmodSync, existsSync, mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { freePort } from '../../../../db/postgres/cluster.mjs';
import { CHECKOUT } from '../steps/checkout.mjs';

const JOURNEYS = join(CHECKOUT, 'apps/web/e2e');
const JOURNEY_LIMIT_MS = 900_000;

export function listJourneys() {
  return existsSync(JOURNEYS)
    ? readdirSync(JOURNEYS)
        .filter((name) => name.endsWith('.mjs'))
        .sort()
    : [];
}

/**
 * Runs every journey. A journey is a program that ends with 0 when all went well; it finds the product in PROOFPLATE_ORIGIN, the
 * letters in PROOFPLATE_MAIL, the demo sign-ins as JSON in PROOFPLATE_SIGN_INS and the browser in CHROMIUM_BIN.
 *
 * @returns {Promise<string | undefined>} what is wrong
 */
export async function runJourneys({ chromium, say }) {
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
    if (typeof address !== 'object') return 'npm start did not come up; see the lines above.';
    const env = {
      PROOFPLATE_ORIGIN: address.origin,
      PROOFPLATE_MAIL: address.viewerUrl,
      PROOFPLATE_SIGN_INS: JSON.stringify(address.signIns),
      CHROMIUM_BIN: chromium,
    };
    for (const name of listJourneys()) {
      say(`  ${name}`);
      const status = await runOne(name, env);
      if (status !== 0) return `The journey ${name} failed (${status}).`;
    }
    return undefined;
  } finally {
    if (product.exitCode === null) product.kill('SIGTERM');
    await gone;
    rmSync(folder, { recursive: true, force: true });
  }
}

async function runOne(name, env) {
  const child = spawn(process.execPath, [join(JOURNEYS, name)], {
    cwd: CHECKOUT,
    env: { ...process.env, ...env },
    stdio: ['ignore', 'inherit', 'inherit'],
    timeout: JOURNEY_LIMIT_MS,
  });
  const [status, signal] = await once(child, 'exit');
  return status ?? signal;
}
