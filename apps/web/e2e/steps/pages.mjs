// How each page of the demo shop is reached, by who looks at it.
import { letterTo, linkIn } from '../support/product.mjs';
import { findSettingFor, startRun } from './floor.mjs';
import { invite } from './people.mjs';

/** From a list to the first thing in it whose link says so. */
export const listed =
  (list, ...links) =>
  async ({ page, go }) => {
    await go(list);
    for (const name of links) await page.getByRole('main').getByRole('link', { name }).first().click();
  };

export const BEFORE_SIGN_IN = {
  'sign-in': '/sign-in',
  'sign-up': '/sign-up',
  'forgot-password': '/forgot-password',
  'reset-password-without-token': '/reset-password',
  'join-without-token': '/accept-invitation',
};

/** A combination that no recipe is approved for, though one is on another machine. */
const NOT_APPROVED = {
  machine: /Bench 1/,
  lens: /F254/,
  material: /black anodised 6061/i,
  finish: /sealed satin/i,
  effect: /dye bleaching/i,
};

export const PAGES = {
  trainee: {
    home: '/',
    more: '/more',
    'at-the-machine': '/machine',
    'at-the-machine-answer': '/machine?words=black%20anodised%20satin',
    'at-the-machine-nothing-called-so': '/machine?words=oak',
    'at-the-machine-none': (person) => findSettingFor(person, NOT_APPROVED),
    'set-up-sheet': listed('/machine?words=black%20anodised%20satin', /sheet$/),
    'run-start': listed('/machine?words=black%20anodised%20satin', 'Start a run'),
    run: startRun,
    runs: '/runs',
    'part-set-up': '/part-set-up',
    'part-sheet': listed('/runs?q=TW-26-0422', /^J-\d+/, 'Print'),
    account: '/account',
    science: '/science',
    'science-page': '/science/pulses',
    'science-unknown': '/science/no-such-model',
  },
  operator: {
    requests: askedFor,
    coupons: '/coupons',
    coupon: listed('/coupons?state=sealed', /^C-\d+/),
    'coupon-craters': listed('/coupons?q=craters', /^C-\d+/),
    'coupon-mark': listed('/coupons?state=planned', /^Mark C-\d+/),
    'coupon-mark-cell': markFirstCell,
    'plan-a-coupon': '/coupons/plan',
    'import-a-coupon': '/coupons/import',
    recipes: '/recipes',
    'new-recipe': '/recipes/new',
    draft: listed('/recipes?state=draft', /^R-\d+/, 'Open the draft'),
    transfer: '/recipes/R-0007/transfer',
    'transfer-equivalent': transferTo('R-0007', /Bench 2.*F160/),
    'transfer-not-equivalent': transferTo('R-0003', /Bench 2.*F254/),
    equipment: '/equipment',
    machine: listed('/equipment', /^Bench 2/),
    'part-set-up-worked-out': workOutPart,
    materials: '/materials',
    material: listed('/materials', /black anodised 6061/i),
  },
  lead: {
    recipe: '/recipes/R-0002',
    compare: listed('/recipes/R-0002', /^Compare/),
    'sign-off-queue': '/sign-off',
    'sign-off': listed('/sign-off', /R-\d+/),
    finishes: '/materials/finishes',
    groups: '/materials/groups',
    effects: '/materials/effects',
    cautions: '/materials/cautions',
    'new-machine': '/equipment/machines/new',
    'edit-machine': listed('/equipment', /^Bench 2/, /^Change/),
    'new-material': '/materials/new',
    ledger: '/ledger',
  },
  owner: {
    people: '/people',
    person: listed('/people', /./),
    'shop-settings': '/shop-settings',
    'no-such-page': '/no-such-page',
  },
};

/** Pages of the floor, which are used with gloves. */
export const FLOOR_PAGES = new Set([
  ...['at-the-machine', 'at-the-machine-answer', 'at-the-machine-nothing-called-so', 'at-the-machine-none'],
  ...['run-start', 'run', 'runs', 'requests', 'coupon-mark', 'coupon-mark-cell'],
]);

/** A list of requests with one in it. */
async function askedFor(person) {
  const { page, go } = person;
  await findSettingFor(person, NOT_APPROVED);
  await page.getByLabel(/^Job/).fill('TW-26-0500');
  await page.getByLabel(/^Note/).fill('Forty dials, wanted on Bench 1 while Bench 2 is away.');
  await page.getByRole('button', { name: 'Ask for this setting' }).click();
  await page.getByText(/see it with your sentence filled in\. What becomes/).waitFor();
  await go('/requests');
  await page.getByText('TW-26-0500').first().waitFor();
}

/** A ring on the first machine with its first lens, with everything that follows. */
async function workOutPart({ page, go }) {
  await go('/part-set-up');
  for (const label of ['Machine', 'Lens']) await page.getByLabel(label, { exact: true }).selectOption({ index: 1 });
  await page.getByRole('radio', { name: 'Ring' }).click();
  const lengths = { 'Outside diameter': '1.25 in', Wall: '2', 'Length along the axis': '12', 'Artwork height': '8' };
  for (const [label, text] of Object.entries(lengths)) await page.getByLabel(new RegExp(`^${label}`)).fill(text);
  await page.getByText('All measures, with formula and source').click();
}

/** An approved recipe with the machine and lens chosen that it is to go to. */
function transferTo(code, target) {
  return async ({ page, go }) => {
    await go(`/recipes/${code}`);
    await page
      .getByRole('main')
      .getByRole('link', { name: /^Transfer/ })
      .click();
    await page.getByRole('radio', { name: target }).click();
    await page.getByRole('button', { name: /^Create draft/ }).waitFor();
  };
}

async function markFirstCell(person) {
  await listed('/coupons?state=planned', /^Mark C-\d+/)(person);
  const start = person.page.getByRole('button', { name: /^(Labels are marked|Start with the cells)$/ });
  const cell = person.page.getByRole('heading', { level: 2, name: /^Cell / });
  // Where the journey ran before, the labels are marked already.
  await start.or(cell).first().waitFor();
  if (await start.isVisible()) {
    await person.page.getByRole('checkbox', { name: /^I have read/ }).check();
    await start.click();
  }
  await cell.waitFor();
}

/** What a letter leads to, for somebody who is not signed in. */
export function fromLetters({ owner, stranger, forgetful }) {
  const invited = `hand-${Date.now()}@tidewater.example`;
  return {
    'reset-password': async () => {
      await stranger.go('/forgot-password');
      await stranger.page.getByLabel('E-mail').fill(forgetful);
      await stranger.page.getByRole('button', { name: /link/i }).click();
      await stranger.page.goto(linkIn(await letterTo(forgetful, /password/i)));
      await stranger.page.getByLabel(/^New password/).waitFor();
    },
    join: async () => {
      await invite(owner, { email: invited, role: 'trainee' });
      await stranger.page.goto(linkIn(await letterTo(invited, /invit|join/i)));
      await stranger.page.getByLabel('Your name').waitFor();
    },
  };
}
