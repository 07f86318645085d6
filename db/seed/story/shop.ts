import { createHmac } from 'node:crypto';
import { schema } from '@proofplate/db';
import { type Caution, type Role, SHIPPED_CAUTIONS, SHIPPED_EFFECTS } from '@proofplate/recipe-model';
import { hash } from 'bcryptjs';
import { minutesAfter, type Stage, type Turn } from '../stage/stage';
import type { Effect, People, Person, ShopPolicyRow } from './cast';

const { caution, effect, member, person, shop, trainingRecord } = schema;

export type PasswordRules = { readonly passwordPepper: string; readonly passwordCost: number };

export const FOUNDED = new Date('2026-01-05T08:00:00Z');
const ABOUT = { name: 'Tidewater Marking Works (demo, invented)', unitSystem: 'metric', timeZone: 'Europe/London', locale: 'en-GB' };
export const POLICY: ShopPolicyRow = {
  minimumConfirmationMarks: 3,
  authorMaySign: false,
  reviewEveryDays: 365,
  overdueBlocks: false,
  photoRequired: true,
  calibrationAgeDays: 180,
  powerShiftPercent: 5,
  secondFactorForSigning: false,
};
const NAMES: Readonly<Record<Role, string>> = {
  owner: 'Ruaridh Keane',
  lead: 'Hanne Voss',
  operator: 'Mirela Ashdown',
  trainee: 'Jonah Pell',
};
const ROLES_BY_ARRIVAL: readonly Role[] = ['owner', 'lead', 'operator', 'trainee'];
const MINUTES_BETWEEN_ARRIVALS = 30;

/** Made of words that the api's list of common passwords holds, so that a production start never lets them in. */
const passwordOf = (role: Role) => `proofplate demo ${role}`;

export async function foundShop(
  stage: Stage,
  rules: PasswordRules,
): Promise<{ people: People; cautions: Caution[]; effects: Map<string, Effect> }> {
  const roles = await Promise.all(ROLES_BY_ARRIVAL.map(async (role) => newPerson(stage, role, rules)));
  const [owner, ...others] = roles;
  if (owner === undefined) throw new Error('nobody founds the shop');
  let starter: { cautions: Caution[]; effects: Map<string, Effect> } | undefined;
  await stage.act(FOUNDED, teller(owner), async (turn) => {
    await turn.tx.insert(shop).values({ id: turn.shopId, ...ABOUT, policy: POLICY, createdAt: turn.at });
    await stage.ledger.open(turn.tx);
    await join(turn, owner);
    await turn.tell({ action: 'shop.created', subjectType: 'shop', subjectId: turn.shopId, after: ABOUT });
    starter = await fillStarterContent(turn);
  });
  for (const [index, newcomer] of others.entries()) {
    await stage.act(minutesAfter(FOUNDED, (index + 1) * MINUTES_BETWEEN_ARRIVALS), teller(newcomer), async (turn) => {
      await join(turn, newcomer);
      const after = { role: newcomer.role, printedName: newcomer.name };
      await turn.tell({ action: 'member.joined', subjectType: 'member', subjectId: newcomer.memberId, after });
    });
  }
  if (starter === undefined) throw new Error('the shop has no starter content');
  return { people: byRole(roles), ...starter };
}

export const teller = ({ memberId, name }: Person) => ({ memberId, name });

/** What the people were taught, after all of them had arrived. */
export async function train(stage: Stage, { owner, lead, operator, trainee }: People): Promise<void> {
  const at = new Date('2026-01-09T15:00:00Z');
  const taught = [
    {
      who: lead,
      subject: 'Annealing and bleaching: judging a plate',
      taughtBy: owner.name,
      taughtOn: '2026-01-08',
      expiresOn: '2028-01-08',
    },
    { who: operator, subject: 'Laser safety briefing of the shop', taughtBy: owner.name, taughtOn: '2026-01-08', expiresOn: '2027-01-08' },
    { who: trainee, subject: 'Laser safety briefing of the shop', taughtBy: lead.name, taughtOn: '2026-01-09', expiresOn: '2027-01-09' },
    {
      who: trainee,
      subject: 'Bench 2: focus, extraction, first piece',
      taughtBy: operator.name,
      taughtOn: '2026-01-09',
      expiresOn: '2027-01-09',
    },
  ];
  await stage.act(at, teller(owner), async (turn) => {
    for (const { who, subject, taughtBy, taughtOn, expiresOn } of taught) {
      const row = { subject, taughtBy, taughtOn: new Date(taughtOn), expiresOn: new Date(expiresOn) };
      const keys = { shopId: turn.shopId, id: turn.newId(), memberId: who.memberId, createdBy: owner.memberId, createdAt: at };
      await turn.tx.insert(trainingRecord).values({ ...keys, ...row });
      await turn.tell({ action: 'member.trained', subjectType: 'member', subjectId: who.memberId, after: row });
    }
  });
}

async function newPerson(stage: Stage, role: Role, rules: PasswordRules): Promise<Person & { readonly passwordHash: string }> {
  const password = passwordOf(role);
  const keyed = createHmac('sha384', rules.passwordPepper).update(password.normalize('NFKC'), 'utf8').digest('base64');
  return {
    ...{ role, password, name: NAMES[role], email: `${role}@tidewater.example` },
    personId: stage.newId(FOUNDED),
    memberId: stage.newId(FOUNDED),
    passwordHash: await hash(keyed, rules.passwordCost),
  };
}

async function join({ tx, shopId, at }: Turn, newcomer: Person & { readonly passwordHash: string }): Promise<void> {
  const { personId, memberId, email, name, role, passwordHash } = newcomer;
  await tx.insert(person).values({ id: personId, email, name, passwordHash, passwordChangedAt: at, createdAt: at });
  await tx.insert(member).values({ shopId, id: memberId, personId, role, printedName: name, createdAt: at });
}

/** The same rows as every new shop is given. */
async function fillStarterContent({ tx, shopId, at, newId, tell }: Turn) {
  const cautions = SHIPPED_CAUTIONS.map((shipped) => ({ id: newId(), ...shipped }));
  await tx
    .insert(caution)
    .values(cautions.map(({ appliesTo, ...values }) => ({ shopId, createdAt: at, ...values, appliesTo: { ...appliesTo } })));
  const effects = SHIPPED_EFFECTS.map((shipped) => ({ id: newId(), ...shipped }));
  await tx.insert(effect).values(effects.map((values) => ({ shopId, createdAt: at, ...values })));
  const after = { cautions: SHIPPED_CAUTIONS.map(({ shippedKey }) => shippedKey), effects: SHIPPED_EFFECTS.map(({ key }) => key) };
  await tell({ action: 'shop.starter-content-added', subjectType: 'shop', subjectId: shopId, after });
  return {
    cautions: cautions.map(({ shippedKey: _key, ...kept }): Caution => kept),
    effects: new Map<string, Effect>(effects.map(({ id, key, name, criteria }) => [key, { id, key, name, criteria }])),
  };
}

function byRole(people: readonly Person[]): People {
  const found = (role: Role): Person => {
    const one = people.find((candidate) => candidate.role === role);
    if (one === undefined) throw new Error(`nobody is ${role}`);
    return one;
  };
  return { trainee: found('trainee'), operator: found('operator'), lead: found('lead'), owner: found('owner') };
}
