// PostgreSQL refuses to run as root: then it runs under an unprivileged account of this machine.
import { existsSync, readFileSync, statSync } from 'node:fs';
import { dirname } from 'node:path';

export function isRoot() {
  return process.getuid?.() === 0;
}

export function serverAccount() {
  const rows = readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .map((line) => line.split(':'));
  const row = ['postgres', 'nobody'].map((name) => rows.find((fields) => fields[0] === name)).find(Boolean);
  if (!row) throw new Error('There is no unprivileged account (postgres or nobody) to run PostgreSQL under.');
  return { name: row[0], uid: Number(row[2]), gid: Number(row[3]) };
}

/** The first folder above `dir` that the server account cannot enter (a private home, say), or undefined. */
export function blockedFolder(dir) {
  const account = serverAccount();
  for (let folder = dirname(dir); folder !== '/'; folder = dirname(folder)) {
    if (!existsSync(folder)) continue;
    const { uid, gid, mode } = statSync(folder);
    const enterBit = uid === account.uid ? 0o100 : gid === account.gid ? 0o010 : 0o001;
    if (!(mode & enterBit)) return folder;
  }
  return undefined;
}
