import { randomUUID } from 'node:crypto';
import type { Role } from '@proofplate/recipe-model';
import type postgres from 'postgres';
import type { Actor } from '../../src/common/actor';

export type PhotoShop = { readonly shopId: string; readonly couponId: string; readonly actor: (role?: Role) => Actor };

/** A shop with one member and one marked coupon, as little as a photo needs: what the coupon refers to is left out, hence no key checks. */
export async function makePhotoShop(superuser: postgres.Sql): Promise<PhotoShop> {
  const [shopId, memberId, personId, couponId, elsewhere] = [randomUUID(), randomUUID(), randomUUID(), randomUUID(), randomUUID()];
  await superuser.begin(async (tx) => {
    await tx`set local session_replication_role = replica`;
    await tx`insert into shop (id, name, policy, time_zone) values (${shopId}, 'Tidewater Marking Works', '{}', 'Europe/Lisbon')`;
    await tx`insert into ledger_head (shop_id, hash) values (${shopId}, ${'0'.repeat(64)})`;
    await tx`insert into person (id, email, name, password_hash) values (${personId}, ${`${personId}@example.invalid`}, 'Ann', 'none')`;
    await tx`insert into member (shop_id, id, person_id, role, printed_name) values (${shopId}, ${memberId}, ${personId}, 'operator', 'Ann Lee')`;
    await tx`insert into coupon (shop_id, id, code, state, material_id, finish_id, effect_id, machine_id, profile_id, lens_id, created_by)
      values (${shopId}, ${couponId}, 'C-0001', 'marked', ${elsewhere}, ${elsewhere}, ${elsewhere}, ${elsewhere}, ${elsewhere}, ${elsewhere}, ${memberId})`;
  });
  const actor = (role: Role = 'operator') => ({ shopId, memberId, personId, printedName: 'Ann Lee', role, sessionId: randomUUID() });
  return { shopId, couponId, actor };
}
