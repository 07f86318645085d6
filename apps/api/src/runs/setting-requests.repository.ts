import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import { and, desc, eq, type SQL, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import type { RequestState } from './dto/setting-request.dto';

const { settingRequest, machine, lens, material, finish, effect, member } = schema;
const asker = alias(member, 'asker');
const answerer = alias(member, 'answerer');

type Named = { id: string; name: string };
export type RequestRow = typeof settingRequest.$inferSelect;
export type RequestView = {
  row: RequestRow;
  machine: Named | null;
  lens: Named | null;
  material: Named | null;
  finish: Named | null;
  effect: Named | null;
  askedBy: string;
  answeredBy: string | null;
};
export type RequestSlots = { machineId?: string; lensId?: string; materialId: string; finishId?: string; effectId?: string };
export type UnknownSlot = keyof RequestSlots;

@Injectable()
export class SettingRequestsRepository {
  /** Names of the slots whose ids the shop does not have. */
  async unknownSlots(tx: Tx, shopId: string, slots: RequestSlots): Promise<UnknownSlot[]> {
    const { machineId = null, lensId = null, materialId, finishId = null, effectId = null } = slots;
    const rows = await tx.execute<{ slot: UnknownSlot }>(sql`
      select slot from (values
        ('machineId', ${machineId}::uuid, exists (select 1 from machine where shop_id = ${shopId} and id = ${machineId}::uuid)),
        ('lensId', ${lensId}::uuid, exists (select 1 from lens where shop_id = ${shopId} and id = ${lensId}::uuid)),
        ('materialId', ${materialId}::uuid, exists (select 1 from material where shop_id = ${shopId} and id = ${materialId}::uuid)),
        ('finishId', ${finishId}::uuid, exists (select 1 from finish where shop_id = ${shopId} and id = ${finishId}::uuid)),
        ('effectId', ${effectId}::uuid, exists (select 1 from effect where shop_id = ${shopId} and id = ${effectId}::uuid))
      ) asked (slot, id, is_known) where id is not null and not is_known`);
    return [...rows].map(({ slot }) => slot);
  }

  async insert(
    tx: Tx,
    shopId: string,
    createdBy: string,
    values: Omit<typeof settingRequest.$inferInsert, 'shopId' | 'createdBy'>,
  ): Promise<string> {
    const [row] = await tx
      .insert(settingRequest)
      .values({ shopId, createdBy, ...values })
      .returning({ id: settingRequest.id });
    if (row === undefined) throw new Error('the request was not stored');
    return row.id;
  }

  async lock(tx: Tx, shopId: string, id: string): Promise<RequestRow | undefined> {
    const [row] = await tx
      .select()
      .from(settingRequest)
      .where(and(eq(settingRequest.shopId, shopId), eq(settingRequest.id, id)))
      .for('update');
    return row;
  }

  async answer(tx: Tx, shopId: string, id: string, given: { answer: string; state: RequestState; answeredBy: string }): Promise<void> {
    await tx
      .update(settingRequest)
      .set({ ...given, answeredAt: sql`now()`, version: sql`${settingRequest.version} + 1` })
      .where(and(eq(settingRequest.shopId, shopId), eq(settingRequest.id, id)));
  }

  async find(tx: Tx, shopId: string, id: string): Promise<RequestView | undefined> {
    const [view] = await this.views(tx, and(eq(settingRequest.shopId, shopId), eq(settingRequest.id, id)), 1);
    return view;
  }

  /** Newest first. */
  async list(
    tx: Tx,
    shopId: string,
    { state, askedBy, beforeId, limit }: { state?: RequestState; askedBy?: string; beforeId?: string; limit: number },
  ): Promise<RequestView[]> {
    const isWanted = and(
      eq(settingRequest.shopId, shopId),
      state === undefined ? undefined : eq(settingRequest.state, state),
      askedBy === undefined ? undefined : eq(settingRequest.createdBy, askedBy),
      beforeId === undefined ? undefined : sql`${settingRequest.id} < ${beforeId}::uuid`,
    );
    return this.views(tx, isWanted, limit);
  }

  private async views(tx: Tx, isWanted: SQL | undefined, limit: number): Promise<RequestView[]> {
    const shop = settingRequest.shopId;
    return tx
      .select({
        row: settingRequest,
        machine: { id: machine.id, name: machine.name },
        lens: { id: lens.id, name: lens.name },
        material: { id: material.id, name: material.name },
        finish: { id: finish.id, name: finish.name },
        effect: { id: effect.id, name: effect.name },
        askedBy: asker.printedName,
        answeredBy: answerer.printedName,
      })
      .from(settingRequest)
      .innerJoin(asker, and(eq(asker.shopId, shop), eq(asker.id, settingRequest.createdBy)))
      .leftJoin(answerer, and(eq(answerer.shopId, shop), eq(answerer.id, settingRequest.answeredBy)))
      .leftJoin(machine, and(eq(machine.shopId, shop), eq(machine.id, settingRequest.machineId)))
      .leftJoin(lens, and(eq(lens.shopId, shop), eq(lens.id, settingRequest.lensId)))
      .leftJoin(material, and(eq(material.shopId, shop), eq(material.id, settingRequest.materialId)))
      .leftJoin(finish, and(eq(finish.shopId, shop), eq(finish.id, settingRequest.finishId)))
      .leftJoin(effect, and(eq(effect.shopId, shop), eq(effect.id, settingRequest.effectId)))
      .where(isWanted)
      .orderBy(desc(settingRequest.id))
      .limit(limit);
  }
}
