// Every route of the router in the demo shop: no accessibility fault in light or dark, nothing wider than the screen, nothing the policy
// refuses, nothing on the floor too small for a glove. With PROOFPLATE_PICTURES it also leaves pictures of each page in three sizes and both modes.
import { BEFORE_SIGN_IN, FLOOR_PAGES, fromLetters, PAGES } from './steps/pages.mjs';
import { journey } from './support/journey.mjs';
import { pageFaults } from './support/page-faults.mjs';
import { signIn } from './support/person.mjs';
import { Visits } from './support/routes.mjs';
import { takeScreenshots } from './support/screenshots.mjs';

const PICTURES = process.env.PROOFPLATE_PICTURES;
const SIGN_INS = JSON.parse(process.env.PROOFPLATE_SIGN_INS ?? '[]');
/** Addresses that lead on by intention; any other page that turns out to be elsewhere was not seen. */
const LEADS_ON = { '/': '/machine' };

/** All that was found, so that one run tells everything. */
const faults = [];
const visits = new Visits();

await journey(async ({ step, open }) => {
  const stranger = await open('stranger');
  const lookAll = async (person, pages) => {
    for (const [name, place] of Object.entries(pages)) await step(`${name}, as ${person.name}`, () => look(person, name, place));
  };
  await lookAll(stranger, BEFORE_SIGN_IN);
  const people = {};
  for (const [role, pages] of Object.entries(PAGES)) {
    people[role] = await open(role);
    await signIn(people[role], accountOf(role));
    await lookAll(people[role], pages);
  }
  await lookAll(stranger, fromLetters({ owner: people.owner, stranger, forgetful: accountOf('trainee').email }));
  for (const pattern of visits.missing) faults.push(`nobody looked at the route ${pattern}`);
  if (faults.length > 0) throw new Error(`${faults.length} faults:\n${faults.join('\n')}`);
});

async function look(person, name, place) {
  await reach(person, place);
  const { page } = person;
  const found = await pageFaults(page, { isFloor: FLOOR_PAGES.has(name) });
  faults.push(...found.map((fault) => `${name}: ${fault}`));
  if (PICTURES !== undefined) await takeScreenshots(page, { name, folder: PICTURES });
}

async function reach(person, place) {
  const { page, go } = person;
  await (typeof place === 'string' ? go(place) : place(person));
  await page.getByRole('heading', { level: 1 }).waitFor();
  await page.waitForLoadState('networkidle');
  const here = new URL(page.url()).pathname;
  visits.add(here);
  if (typeof place !== 'string') return;
  const asked = new URL(place, page.url()).pathname;
  visits.add(asked);
  if (here !== (LEADS_ON[asked] ?? asked)) faults.push(`${asked} led to ${here}`);
}

function accountOf(role) {
  const account = SIGN_INS.find((known) => known.role === role);
  if (account === undefined) throw new Error(`the demo shop has no ${role}`);
  return account;
}
