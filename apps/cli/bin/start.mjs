// npm start: everything a fresh clone needs, then the product on one port. Ctrl-C stops it all; the next start finds its data.
import { existsSync, mkdirSync, statSync } from 'node:fs';
import { createServer } from 'node:net';
import { join } from 'node:path';
import { freePort, usableFolder } from '../../../db/postgres/cluster.mjs';
import { buildWhenChanged } from './steps/build.mjs';
import { CHECKOUT } from './steps/checkout.mjs';
import { Children } from './steps/children.mjs';
import { openDatabase, seedOnce } from './steps/database.mjs';
import { ensurePackages, ensurePostgres, requireNode } from './steps/requirements.mjs';
import { loadSecrets } from './steps/secrets.mjs';

const READY_LIMIT_MS = 60_000;
const BUCKET = 'proofplate';
const WORKER_PROGRAM = 'apps/api/dist/worker.js';
const say = (line) => console.log(line);

const host = process.env.HOST || '127.0.0.1';
const port = Number(process.env.PORT || 3000);
const origin = process.env.PUBLIC_ORIGIN || `http://${isLoopback(host) ? 'localhost' : host}:${port}`;
/** What is running, in the order of starting. */
const running = { children: undefined, cluster: undefined };
let stopping;

for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => stop(0));
try {
  await start();
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  await stop(1);
}

async function start() {
  requireNode();
  if (!Number.isInteger(port) || port < 1 || port > 65_535) throw new Error('PORT must be a whole number from 1 to 65535.');
  ensurePostgres(say);
  const folder = openDataFolder();
  const children = new Children(folder);
  await children.claim();
  running.children = children;
  await requireFreePort();
  ensurePackages(say);
  buildWhenChanged(say);

  const secrets = loadSecrets(folder);
  const { cluster, urls } = await openDatabase({ folder, secrets });
  running.cluster = cluster;
  const fakes = await startFakes(children, folder);
  const env = environment({ urls, secrets, fakes });
  const signIns = await seedOnce({ folder, superuserUrl: urls.superuser, env: { ...env, SEED_DATABASE_URL: urls.superuser }, say });

  children.run({ name: 'The api', program: 'apps/api/dist/main.js', env, onLoss: fail });
  if (existsSync(join(CHECKOUT, WORKER_PROGRAM))) children.run({ name: 'The worker', program: WORKER_PROGRAM, env, onLoss: fail });
  await untilReady();
  announce({ folder, fakes, signIns });
}

function openDataFolder() {
  const wished = process.env.PROOFPLATE_DATA || join(CHECKOUT, '.data');
  // The database is the part that runs under another account, so its folder decides.
  const { dir, reason } = usableFolder(join(wished, 'postgres'));
  if (reason) say(`Note: ${reason}`);
  const folder = reason ? dir : join(dir, '..');
  mkdirSync(folder, { recursive: true });
  if (statSync(folder).uid !== process.getuid?.()) throw new Error(`${folder} belongs to somebody else; choose another PROOFPLATE_DATA.`);
  return folder;
}

async function startFakes(children, folder) {
  const [storePort, smtpPort, viewerPort] = [await freePort(), await freePort(), await freePort()];
  const options = {
    objectStore: { directory: join(folder, 'objects'), bucket: BUCKET, port: storePort },
    mail: { directory: join(folder, 'mail'), smtpPort, viewerPort },
  };
  const { child, gone } = children.run({
    name: 'The local stand-ins',
    program: 'apps/cli/fakes/serve.mjs',
    args: [JSON.stringify(options)],
    onLoss: fail,
  });
  await Promise.race([new Promise((ready) => child.once('message', ready)), gone]);
  return {
    endpoint: `http://127.0.0.1:${storePort}`,
    smtpUrl: `smtp://127.0.0.1:${smtpPort}`,
    viewerUrl: `http://localhost:${viewerPort}`,
  };
}

/** The names are those of apps/api/src/config/env.validation.ts. What the caller has set wins. */
function environment({ urls, secrets, fakes }) {
  const defaults = {
    NODE_ENV: 'development',
    DATABASE_URL: urls.app,
    WORKER_DATABASE_URL: urls.worker,
    JWT_SECRET: secrets.jwt,
    PASSWORD_PEPPER: secrets.pepper,
    URL_SIGNING_SECRET: secrets.urlSigning,
    PASSWORD_COST: '12',
    OBJECT_STORE_ENDPOINT: fakes.endpoint,
    OBJECT_STORE_BUCKET: BUCKET,
    OBJECT_STORE_ACCESS_KEY: 'S3RVER',
    OBJECT_STORE_SECRET_KEY: 'S3RVER',
    SMTP_URL: fakes.smtpUrl,
    MAIL_FROM: 'Proofplate <no-reply@proofplate.invalid>',
    LOG_LEVEL: 'warn',
    WEB_ROOT: join(CHECKOUT, 'apps/web/dist'),
  };
  const chosen = Object.fromEntries(Object.keys(defaults).map((name) => [name, process.env[name] || defaults[name]]));
  return { ...chosen, PUBLIC_ORIGIN: origin, PORT: String(port), HOST: host };
}

async function untilReady() {
  const address = `http://${host === '0.0.0.0' ? '127.0.0.1' : host}:${port}/`;
  const deadline = performance.now() + READY_LIMIT_MS;
  while (!stopping) {
    const answer = await fetch(address).catch(() => undefined);
    if (answer?.ok) return;
    if (performance.now() > deadline) throw new Error(`The product did not answer at ${address}.`);
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
}

function announce({ folder, fakes, signIns }) {
  if (stopping) return;
  say('');
  say(`Proofplate      ${origin}`);
  say(`Letters it sent ${fakes.viewerUrl}`);
  say(`Data            ${folder}`);
  if (signIns.length > 0) say('\nDemo sign-ins (an invented shop)');
  for (const { role, email, password } of signIns) say(`  ${role.padEnd(10)} ${email}  ${password}`);
  say('\nCtrl-C stops everything.');
  // For a program that started this one, as the journeys of npm test do.
  process.send?.({ origin, viewerUrl: fakes.viewerUrl, signIns, folder });
}

function fail(reason) {
  console.error(reason);
  stop(1);
}

/** Api and worker first, then what they stand on. */
function stop(exitCode) {
  stopping ??= (async () => {
    await running.children?.stopAll();
    running.cluster?.stop();
    process.exit(exitCode);
  })();
  return stopping;
}

function isLoopback(name) {
  return ['127.0.0.1', '::1', 'localhost', '0.0.0.0'].includes(name);
}

function requireFreePort() {
  return new Promise((free, taken) => {
    const probe = createServer();
    probe.once('error', () => taken(new Error(`Port ${port} on ${host} is not free; choose another one: PORT=3100 npm start`)));
    probe.listen(port, host, () => probe.close(free));
  });
}
