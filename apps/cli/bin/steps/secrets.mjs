// Secrets of one data folder: made at its first start, kept beside the data that depends on them, never in the repository.
import { randomBytes } from 'node:crypto';
import { chmodSync, existsSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

const NAMES = ['superuser', 'migrator', 'app', 'backup', 'worker', 'jwt', 'pepper', 'urlSigning'];
const SECRET_BYTES = 32;

/** @returns {Record<string, string>} one secret per name */
export function loadSecrets(folder) {
  const path = join(folder, 'secrets.json');
  const kept = existsSync(path) ? JSON.parse(readFileSync(path, 'utf8')) : {};
  if (NAMES.every((name) => typeof kept[name] === 'string')) return kept;
  const secrets = Object.fromEntries(NAMES.map((name) => [name, kept[name] ?? randomBytes(SECRET_BYTES).toString('base64url')]));
  // Written beside and renamed: a crash in between must not leave half a file that locks everybody out.
  writeFileSync(`${path}.part`, `${JSON.stringify(secrets, null, 2)}\n`, { mode: 0o600 });
  renameSync(`${path}.part`, path);
  chmodSync(path, 0o600);
  return secrets;
}
