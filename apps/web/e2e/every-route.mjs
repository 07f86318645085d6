// Every page of the demo shop: no accessibility fault in light or dark, nothing wider than the screen, nothing the policy refuses.
// With PROOFPLATE_PICTURES it also leaves pictures of each page in three sizes and both modes.
import { accessibilityViolations } from './support/axe.mjs';
import { journey } from './support/journey.mjs';
import { signIn } from './support/person.mjs';
import { COLOUR_SCHEMES, takeScreenshots, VIEWPORTS } from './support/screenshots.mjs';

const PICTURES = process.env.PROOFPLATE_PICTURES;
const SIGN_INS = JSON.parse(process.env.PROOFPLATE_SIGN_INS ?? '[]');
const NARROWEST = { width: 320, height: 640 };

/** Pages that anybody reaches, then those of the shop by who looks at them. A page with a code is opened from its list. */
const BEFORE_SIGN_IN = { 'sign-in': '/sign-in', 'sign-up': '/sign-up', 'forgot-password': '/forgot-password' };
const PAGES = {
  trainee: {
    'at-the-machine': '/machine',
    'at-the-machine-answer': '/machine?words=black%20anodised%20satin',
    'at-the-machine-none': '/machine?words=oak',
    runs: '/runs',
    account: '/account',
  },
  operator: {
    coupons: '/coupons',
    coupon: { list: '/coupons?state=sealed', link: /^C-\d+/ },
    'plan-a-coupon': '/coupons/plan',
    'import-a-coupon': '/coupons/import',
    recipes: '/recipes',
    requests: '/requests',
    equipment: '/equipment',
    materials: '/materials',
  },
  lead: {
    recipe: '/recipes/R-0002',
    compare: { list: '/recipes/R-0002', link: /^Compare/ },
    'sign-off-queue': '/sign-off',
    'sign-off': { list: '/sign-off', link: /R-\d+/ },
    finishes: '/materials/finishes',
    groups: '/materials/groups',
    effects: '/materials/effects',
    cautions: '/materials/cautions',
    'new-machine': '/equipment/machines/new',
    'new-material': '/materials/new',
    ledger: '/ledger',
  },
  owner: { people: '/people', 'shop-settings': '/shop-settings', 'no-such-page': '/no-such-page' },
};

/** All that was found, so that one run tells everything. */
const faults = [];

await journey(async ({ step, open }) => {
  const stranger = await open('stranger');
  for (const [name, path] of Object.entries(BEFORE_SIGN_IN)) await step(name, () => look(stranger, name, path));
  for (const [role, pages] of Object.entries(PAGES)) {
    const person = await open(role);
    const account = SIGN_INS.find((known) => known.role === role);
    if (account === undefined) throw new Error(`the demo shop has no ${role}`);
    await signIn(person, account);
    for (const [name, place] of Object.entries(pages)) await step(`${name}, as ${role}`, () => look(person, name, place));
  }
  if (faults.length > 0) throw new Error(`${faults.length} faults:\n${faults.join('\n')}`);
});

async function look(person, name, place) {
  await reach(person, place);
  const { page } = person;
  await page.setViewportSize(VIEWPORTS.desk);
  for (const colorScheme of COLOUR_SCHEMES) {
    await page.emulateMedia({ colorScheme });
    const violations = await accessibilityViolations(page);
    faults.push(...violations.map((violation) => `${name}, ${colorScheme}: ${violation}`));
  }
  await page.setViewportSize(NARROWEST);
  const tooWide = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
  if (tooWide > 0) faults.push(`${name} is ${tooWide} px wider than a screen of ${NARROWEST.width} px`);
  if (PICTURES !== undefined) await takeScreenshots(page, { name, folder: PICTURES });
  await page.setViewportSize(VIEWPORTS.desk);
}

async function reach({ page, go }, place) {
  const isPath = typeof place === 'string';
  await go(isPath ? place : place.list);
  if (!isPath) await page.getByRole('main').getByRole('link', { name: place.link }).first().click();
  await page.getByRole('heading', { level: 1 }).waitFor();
  await page.waitForLoadState('networkidle');
}
