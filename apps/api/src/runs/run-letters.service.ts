import { Injectable } from '@nestjs/common';
import { OUTCOME_LABELS, roleAtLeast } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import type { Tx } from '../database/unit-of-work';
import { OutboxService } from '../mail/outbox.service';
import { MembersService } from '../members/members.service';
import { ShopsService } from '../shops/shops.service';
import type { RunDto } from './dto/run.dto';

/** Tells leads what went wrong at a machine, as part of the act's transaction: they decide whether the setting is stopped. */
@Injectable()
export class RunLettersService {
  constructor(
    private readonly members: MembersService,
    private readonly shops: ShopsService,
    private readonly outbox: OutboxService,
  ) {}

  async badResult(tx: Tx, actor: Actor, { code, recipe, revision, machine, jobReference, badResult }: RunDto): Promise<void> {
    if (badResult === null) return;
    const { name: shopName } = await this.shops.getRow(tx, actor.shopId);
    const setting = `${recipe.code} ${recipe.title}, ${revision.number === null ? 'draft' : `revision ${revision.number}`}`;
    const told = {
      runCode: code,
      setting,
      machine: machine.name,
      jobReference,
      outcome: OUTCOME_LABELS[badResult.outcome],
      note: badResult.note,
    };
    const leads = (await this.members.addressees(tx, actor.shopId)).filter(
      ({ memberId, role }) => roleAtLeast(role, 'lead') && memberId !== actor.memberId,
    );
    for (const { name, address } of leads) {
      const payload = { ...told, to: { name, address }, shopName, by: actor.printedName };
      await this.outbox.add(tx, { shopId: actor.shopId, kind: 'bad-result', payload });
    }
  }
}
