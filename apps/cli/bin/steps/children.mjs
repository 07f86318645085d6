// The processes of one start. Each is in a group of its own, so that Ctrl-C reaches this process only and the order of stopping is ours.
import { spawn } from 'node:child_process';
import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { CHECKOUT } from './checkout.mjs';

const STOP_LIMIT_MS = 15_000;
/** The S3 client announces the end of its support for Node 20 at every start; docs/dependencies.md says it once. */
export const QUIET = { AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true' };

export class Children {
  constructor(folder) {
    this.record = join(folder, 'running.json');
    this.children = [];
    this.isStopping = false;
  }

  /** Refuses a second start on the same data; ends what a killed start left behind. */
  async claim() {
    const left = existsSync(this.record) ? JSON.parse(readFileSync(this.record, 'utf8')) : { starter: 0, children: [] };
    if (isOurs(left.starter)) throw new Error(`Proofplate is running already on this data (process ${left.starter}).`);
    for (const pid of left.children.filter(isOurs)) process.kill(pid, 'SIGKILL');
    while (left.children.some(isOurs)) await new Promise((resolve) => setTimeout(resolve, 50));
    this.#write();
  }

  /** Starts a Node program; `onLoss` hears when it ends without being asked to. */
  run({ name, program, args = [], env = {}, onLoss }) {
    const child = spawn(process.execPath, [join(CHECKOUT, program), ...args], {
      cwd: CHECKOUT,
      env: { ...QUIET, ...process.env, ...env },
      detached: true,
      stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
    });
    const gone = new Promise((resolve) => child.once('exit', resolve));
    child.once('exit', (code, signal) => {
      if (!this.isStopping) onLoss(`${name} ended unexpectedly (${signal ?? code}).`);
    });
    this.children.push({ child, gone });
    this.#write();
    return { child, gone };
  }

  /** Last started, first stopped. */
  async stopAll() {
    this.isStopping = true;
    for (const { child, gone } of [...this.children].reverse()) {
      if (child.exitCode !== null || child.signalCode !== null) continue;
      child.kill('SIGTERM');
      const limit = setTimeout(() => child.kill('SIGKILL'), STOP_LIMIT_MS);
      await gone;
      clearTimeout(limit);
    }
    rmSync(this.record, { force: true });
  }

  #write() {
    const children = this.children.map(({ child }) => child.pid);
    writeFileSync(this.record, JSON.stringify({ starter: process.pid, children }), { mode: 0o600 });
  }
}

/** A process number alone may meanwhile belong to a stranger. */
function isOurs(pid) {
  try {
    const command = readFileSync(`/proc/${Number(pid)}/cmdline`, 'utf8');
    return pid !== process.pid && (command.includes(CHECKOUT) || command.includes('apps/cli/bin/start.mjs'));
  } catch {
    return false;
  }
}
