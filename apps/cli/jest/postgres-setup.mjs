import { createRequire } from 'node:module';
import postgres from 'postgres';
import { bootstrap, roleUrl } from '../../../db/postgres/bootstrap.mjs';
import { startThrowAwayCluster } from '../../../db/postgres/cluster.mjs';

const { migrateAll } = createRequire(import.meta.url)('../../../db/postgres/migrate.cjs');
const TEMPLATE = 'proofplate_template';

/** One throw-away cluster for the whole run, whatever number of jest projects asks; each test file clones the migrated template. */
export default async function setUp() {
  globalThis.proofplateCluster ??= startOnce();
  await globalThis.proofplateCluster;
}

async function startOnce() {
  if (process.env.PROOFPLATE_TEST_PG) {
    await makeTemplate(process.env.PROOFPLATE_TEST_PG);
    return undefined;
  }
  const cluster = await startThrowAwayCluster();
  process.env.PROOFPLATE_TEST_PG = cluster.url();
  await makeTemplate(cluster.url());
  return cluster;
}

export async function makeTemplate(superuserUrl) {
  const admin = postgres(superuserUrl, { max: 1, onnotice() {} });
  try {
    const [present] = await admin`select datistemplate as ready from pg_database where datname = ${TEMPLATE}`;
    if (present?.ready) return;
    await bootstrap({ superuserUrl, database: TEMPLATE });
    await migrateAll(roleUrl({ superuserUrl, role: 'migrator', database: TEMPLATE }));
    // A template with an open connection cannot be cloned.
    await admin`alter database ${admin(TEMPLATE)} with is_template true allow_connections false`;
  } finally {
    await admin.end();
  }
}
