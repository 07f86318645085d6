// The whole job, from an empty shop, by four people in four browsers: what the product is for.
import { describeMachine } from './steps/equipment.mjs';
import { describeMaterials } from './steps/materials.mjs';
import { invite, join, openShop, refuseWrongSignUp } from './steps/people.mjs';
import { openAs } from './support/person.mjs';

const owner = await openAs('owner');
const people = [owner];
try {
  await step('an incomplete sign-up names every fault', () => refuseWrongSignUp(owner));
  await step('the owner opens a shop', () => openShop(owner, { shop: 'Harbour Marking', name: 'Ines Calder', email: address('ines') }));
  const team = [
    { role: 'lead', name: 'Tomas Reyl', email: address('tomas') },
    { role: 'operator', name: 'Bodil Krane', email: address('bodil') },
    { role: 'trainee', name: 'Aki Sund', email: address('aki') },
  ];
  for (const member of team) {
    await step(`the owner invites a ${member.role}, who joins`, async () => {
      await invite(owner, member);
      const person = await openAs(member.role);
      people.push(person);
      await join(person, member);
    });
  }
  const [, lead] = people;
  await step('the lead describes a machine with its lens and power table', () => describeMachine(lead));
  await step('the lead describes materials and finishes', () => describeMaterials(lead));
} catch (error) {
  await Promise.all(
    people.map(({ name, page }) =>
      page.screenshot({ path: `${process.env.PROOFPLATE_FAILURE ?? '.data'}/failed-${name}.png` }).catch(() => undefined),
    ),
  );
  throw error;
} finally {
  const findings = people.flatMap(({ name, findings }) => findings().map((finding) => `${name}: ${finding}`));
  await Promise.all(people.map(({ close }) => close()));
  if (findings.length > 0) {
    console.error(findings.join('\n'));
    process.exitCode = 1;
  }
}

function address(name) {
  return `${name}.${Date.now()}@harbour.example`;
}

async function step(title, work) {
  const startedAt = performance.now();
  await work();
  console.log(`    ${title} (${((performance.now() - startedAt) / 1000).toFixed(1)} s)`);
}
