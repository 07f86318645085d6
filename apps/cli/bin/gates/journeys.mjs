// Whole journeys in a browser against the product as npm start serves it, with data of its own that is thrown away.
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { existsSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { CHECKOUT } from '../steps/checkout.mjs';
import { withThrowAwayProduct } from '../steps/throw-away-product.mjs';

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
  return withThrowAwayProduct(chromium, async (environment) => {
    for (const name of listJourneys()) {
      say(`  ${name}`);
      const status = await runOne(name, environment);
      if (status !== 0) return `The journey ${name} failed (${status}).`;
    }
    return undefined;
  });
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
