// The whole job, from an empty shop, by four people in four browsers: what the product is for.
import { draftFrom, logCoupon, markCoupon, planCoupon, refuseNeverMaterial, sealCoupon } from './steps/coupons.mjs';
import { describeMachine } from './steps/equipment.mjs';
import { findNothing, findSetting, runParts } from './steps/floor.mjs';
import { describeMaterials } from './steps/materials.mjs';
import { invite, join, openShop, refuseWrongSignUp } from './steps/people.mjs';
import { approve, compare, planProof, proposeChange, submitDraft, withdraw } from './steps/recipes.mjs';
import { couponPhoto } from './support/coupon-photo.mjs';
import { journey } from './support/journey.mjs';

/** Invented readings: the more power and the less speed, the whiter. */
const GRID = {
  ratings: '123454434321',
  lightness: '58\t63\t71\t78\n55\t60\t68\t74\n50\t57\t64\t70',
  contrast: '0.6\t0.7\t0.8\t0.95\n0.5\t0.6\t0.7\t0.8\n0.4\t0.5\t0.6\t0.7',
};
const PROOF = { ratings: '44544', lightness: '77\t78\t78\t79\t77', contrast: '0.9\t0.91\t0.92\t0.9\t0.93' };
const WORDS = 'blk anod';

await journey(async ({ step, open }) => {
  const owner = await open('owner');
  await step('a sign-up with every field wrong names every fault and keeps what was typed', () => refuseWrongSignUp(owner));
  await step('the owner opens a shop', () => openShop(owner, { shop: 'Harbour Marking', name: 'Ines Calder', email: address('ines') }));
  const { lead, operator, trainee } = await gather(owner, { step, open });

  await step('the lead describes a machine with its lens and power table', () => describeMachine(lead));
  await step('the lead describes materials and finishes', () => describeMaterials(lead));
  await step('no coupon can be planned for a film that must never be marked', () => refuseNeverMaterial(operator));

  const code = await step('the operator plans a coupon', () => planCoupon(operator));
  await step('the operator marks it, cell by cell', () => markCoupon(operator, { code, cells: 12 }));
  await step('the operator photographs it and logs every cell', async () =>
    logCoupon(operator, { code, photo: await couponPhoto({ code, rows: 3, columns: 4 }), ...GRID }),
  );
  await step('the operator seals it', () => sealCoupon(operator, code));
  const draft = await step('the operator drafts a recipe from the best cell', () => draftFrom(operator, { code, cell: 'A4' }));
  const recipe = /R-\d+/.exec(draft)?.[0] ?? '';

  const proof = await step('the operator plans five equal cells to prove it', () => planProof(operator, draft));
  await step('the operator marks them', () => markCoupon(operator, { code: proof, cells: 5 }));
  await step('the operator logs them', async () =>
    logCoupon(operator, { code: proof, photo: await couponPhoto({ code: proof, rows: 1, columns: 5 }), ...PROOF }),
  );
  await step('the operator seals them', () => sealCoupon(operator, proof));
  await step('the operator submits the draft', () => submitDraft(operator, { draft, proof }));
  await step('the lead signs revision 1', () => approve(lead, { password: lead.password, number: 1 }));

  await step('the trainee finds the setting by two words, cautions first', () => findSetting(trainee, { words: WORDS, recipe }));
  await step('the trainee runs twenty parts', () => runParts(trainee, { good: '20', scrap: '1' }));
  await step('the operator proposes a change that needs no new proof', () => proposeChange(operator, { recipe }));
  await step('the lead signs revision 2', () => approve(lead, { password: lead.password, number: 2 }));
  await step('the lead compares the revisions', () => compare(lead, { recipe }));
  await step('the lead withdraws revision 2', () => withdraw(lead, { recipe, number: 2, password: lead.password }));
  await step('the trainee is told that there is no approved setting', () => findNothing(trainee, { words: WORDS }));
});

/** Invites three people, who follow the links in their letters. */
async function gather(owner, { step, open }) {
  const team = {
    lead: { role: 'lead', name: 'Tomas Reyl', email: address('tomas') },
    operator: { role: 'operator', name: 'Bodil Krane', email: address('bodil') },
    trainee: { role: 'trainee', name: 'Aki Sund', email: address('aki') },
  };
  const people = {};
  for (const [role, member] of Object.entries(team)) {
    people[role] = await step(`the ${role} is invited by letter and joins`, async () => {
      await invite(owner, member);
      const person = await open(role);
      return { ...person, ...(await join(person, member)) };
    });
  }
  return people;
}

function address(name) {
  return `${name}.${Date.now()}@harbour.example`;
}
