import { spawnSync } from 'node:child_process';
import { CHECKOUT } from '../steps/checkout.mjs';

/** Runs a command of the checkout; shows its output only when it fails. Returns undefined or what is wrong. */
export function problemOf(command, args, { env = {}, limitMs = 900_000 } = {}) {
  const result = spawnSync(command, args, {
    cwd: CHECKOUT,
    encoding: 'utf8',
    env: { ...process.env, ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
    timeout: limitMs,
    maxBuffer: 64 * 1024 * 1024,
  });
  if (result.status === 0) return undefined;
  const reason = result.error ? `${result.error.message}\n` : '';
  return `${reason}${result.stdout ?? ''}${result.stderr ?? ''}`.trim() || `${command} ended with ${result.status}`;
}
