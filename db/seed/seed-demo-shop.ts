import { assertPatchedDriver, createDb } from '@proofplate/db';
import type { SeedSettings } from './settings';
import { openObjectStore } from './stage/object-store';
import { Stage } from './stage/stage';
import type { Cast } from './story/cast';
import { fillCatalogue } from './story/catalogue';
import { type World, writeCoupons } from './story/coupons';
import { writeEarlierPlates } from './story/earlier-plates';
import { measurePower, setUpEquipment } from './story/equipment';
import { writeFloor } from './story/floor';
import { writeRecipes } from './story/recipes';
import { Made } from './story/records';
import { writeRuns } from './story/runs';
import { Script } from './story/script';
import { FOUNDED, foundShop, POLICY, teller, train } from './story/shop';

export type SignIn = { readonly name: string; readonly role: string; readonly email: string; readonly password: string };

/** Rendering a picture holds a transaction open for some seconds. */
const STATEMENT_TIMEOUT_MS = 60_000;
const OPEN_TRANSACTION_LIMIT_MS = 120_000;

/** Tells the story of the demo shop from its founding to the present, and returns how its people sign in. */
export async function seedDemoShop(settings: SeedSettings): Promise<SignIn[]> {
  assertPatchedDriver();
  const { db, end } = createDb(settings.databaseUrl, {
    ...{ max: 1, applicationName: 'proofplate-seed', statementTimeoutMs: STATEMENT_TIMEOUT_MS },
    idleInTransactionTimeoutMs: OPEN_TRANSACTION_LIMIT_MS,
  });
  const store = await openObjectStore(settings.objectStore);
  try {
    const stage = new Stage(db, FOUNDED, store, settings.pictureSize);
    const { people, ...starter } = await foundShop(stage, settings);
    await train(stage, people);
    const equipment = await setUpEquipment(stage, people);
    const catalogue = await fillCatalogue(stage, people, starter);
    const cast: Cast = { people, policy: POLICY, ...equipment, ...catalogue };
    await playStory({ stage, cast, made: new Made(), script: new Script() });
    return [people.trainee, people.operator, people.lead, people.owner].map(({ name, role, email, password }) => ({
      name,
      role,
      email,
      password,
    }));
  } finally {
    store.close();
    await end();
  }
}

async function playStory(world: World): Promise<void> {
  const { cast, script, stage } = world;
  for (const bench of Object.values(cast.benches)) {
    for (const calibration of bench.calibrations) {
      script.add(calibration.at, teller(cast.people.lead), (turn) => measurePower(turn, bench, calibration));
    }
  }
  writeCoupons(world);
  writeEarlierPlates(world);
  writeRecipes(world);
  writeRuns(world);
  writeFloor(world);
  await script.play(stage);
}
