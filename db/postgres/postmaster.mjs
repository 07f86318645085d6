// Whether a data folder's server is alive. The lock file alone does not say: after a crash or in a fresh container its process number
// can belong to a dead process that nobody collected, or to a stranger, and PostgreSQL would then refuse to start.
import { existsSync, readdirSync, readFileSync, readlinkSync, realpathSync, rmSync } from 'node:fs';
import { join } from 'node:path';

const ORPHAN_LIMIT_MS = 10_000;
const PORT_LINE = 3;

/** Port of the running server, or undefined; removes a lock file that no living server holds. */
export async function portOfRunning(pgData) {
  const lockFile = join(pgData, 'postmaster.pid');
  if (!existsSync(lockFile)) return undefined;
  const lines = readFileSync(lockFile, 'utf8').split('\n');
  if (isServerOf(lines[0], pgData)) return Number(lines[PORT_LINE]);
  await untilOrphansAreGone(pgData);
  rmSync(lockFile, { force: true });
  return undefined;
}

function isServerOf(pid, pgData) {
  try {
    if (!existsSync('/proc/self')) return process.kill(Number(pid), 0);
    // A dead process that nobody collected has no working folder.
    return readlinkSync(`/proc/${Number(pid)}/cwd`) === realpathSync(pgData);
  } catch {
    return false;
  }
}

/** Server processes outlive a killed postmaster for a moment; a second server beside them would damage the data. */
async function untilOrphansAreGone(pgData) {
  for (let waitedMs = 0; orphanPids(pgData).length > 0; waitedMs += 100) {
    if (waitedMs >= ORPHAN_LIMIT_MS) throw new Error(`Processes of a dead server still use ${pgData}: ${orphanPids(pgData).join(', ')}`);
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
}

function orphanPids(pgData) {
  if (!existsSync('/proc/self')) return [];
  return readdirSync('/proc').filter((name) => /^\d+$/.test(name) && isServerOf(name, pgData));
}
