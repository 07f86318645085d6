import { randomUUID } from 'node:crypto';
import type { Role } from '@proofplate/recipe-model';
import { uuidv7 } from 'uuidv7';
import { AccountsRepository } from '../../src/auth/accounts.repository';
import { PasswordHasher } from '../../src/auth/hashing/password-hasher';
import { LedgerService } from '../../src/ledger/ledger.service';
import { MembersService } from '../../src/members/members.service';
import { DEFAULT_SHOP_POLICY, type ShopPolicy } from '../../src/shops/shop-policy';
import { ShopsService } from '../../src/shops/shops.service';
import type { TestApp } from './app';
import { signInAs } from './sign-in';

export type TestShop = { readonly id: string; readonly name: string };
export type TestMember = {
  readonly id: string;
  readonly shopId: string;
  readonly personId: string;
  readonly email: string;
  readonly printedName: string;
  readonly role: Role;
  readonly password: string;
  /** Header fields of a signed-in session of this member. */
  readonly headers: { readonly authorization: string };
  readonly sessionId: string;
};

export const TEST_PASSWORD = 'violet kettle on the roof';

/** A shop with its ledger, without anybody in it. */
export async function makeShop(
  test: TestApp,
  given: { readonly name?: string; readonly policy?: Partial<ShopPolicy> } = {},
): Promise<TestShop> {
  const shop = { id: uuidv7(), name: given.name ?? `Shop ${randomUUID().slice(0, 8)}` };
  const place = { unitSystem: 'metric', timeZone: 'Europe/Berlin', locale: 'en-GB' } as const;
  await test.unitOfWork.run({ shopId: shop.id }, async (tx) => {
    await test.app.get(ShopsService).create(tx, { ...shop, ...place, policy: { ...DEFAULT_SHOP_POLICY, ...given.policy } });
    const actor = { shopId: shop.id, printedName: 'Test' };
    await test.app.get(LedgerService).record(tx, { actor, action: 'shop.created', subjectType: 'shop', subjectId: shop.id, after: shop });
  });
  return shop;
}

/** A person with an account, a member of the shop, signed in. */
export async function makeMember(
  test: TestApp,
  shop: TestShop,
  role: Role,
  given: { readonly printedName?: string; readonly email?: string; readonly password?: string } = {},
): Promise<TestMember> {
  const password = given.password ?? TEST_PASSWORD;
  const printedName = given.printedName ?? `${role} ${randomUUID().slice(0, 4)}`;
  const person = { id: uuidv7(), email: given.email ?? `${randomUUID()}@example.com`, name: printedName };
  const passwordHash = await test.app.get(PasswordHasher).hash(password);
  const { id } = await test.unitOfWork.run({ shopId: shop.id }, async (tx) => {
    await test.app.get(AccountsRepository).createPerson(tx, { ...person, passwordHash });
    return test.app.get(MembersService).join(tx, { shopId: shop.id, personId: person.id, role, printedName });
  });
  const key = { personId: person.id, shopId: shop.id, memberId: id };
  const session = await signInAs(test, key);
  return { id, ...key, email: person.email, printedName, role, password, ...session };
}

/** A shop with one member of each role. */
export async function makeStaffedShop(test: TestApp, given: { readonly policy?: Partial<ShopPolicy> } = {}) {
  const shop = await makeShop(test, given);
  return {
    shop,
    trainee: await makeMember(test, shop, 'trainee'),
    operator: await makeMember(test, shop, 'operator'),
    lead: await makeMember(test, shop, 'lead'),
    owner: await makeMember(test, shop, 'owner'),
  };
}
