import { Injectable } from '@nestjs/common';
import { ROLES, roleAtLeast } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import type { Tx } from '../database/unit-of-work';
import type { Mail, Recipient } from '../mail/mail-kinds';
import { OutboxService } from '../mail/outbox.service';
import type { RevisionRecord } from '../recipes/stored-revision';
import { ShopsService } from '../shops/shops.service';
import { SignOffsRepository } from './sign-offs.repository';

const LEADS = ROLES.filter((role) => roleAtLeast(role, 'lead'));

type About = { readonly record: RevisionRecord; readonly number: number };

/** Tells people what happened to a revision, as part of the act's transaction. */
@Injectable()
export class SignOffLettersService {
  constructor(
    private readonly signOffs: SignOffsRepository,
    private readonly shops: ShopsService,
    private readonly outbox: OutboxService,
  ) {}

  async submitted(tx: Tx, actor: Actor, about: About, comment: string): Promise<void> {
    const leads = await this.signOffs.recipients(tx, actor.shopId, { roles: LEADS, exceptId: actor.memberId });
    const payload = { ...(await this.body(tx, actor, about)), ...(comment === '' ? {} : { comment }) };
    await this.send(tx, actor.shopId, leads, (to) => ({ kind: 'revision-submitted', payload: { ...payload, to } }));
  }

  async approved(tx: Tx, actor: Actor, about: About, comment: string): Promise<void> {
    const payload = { ...(await this.body(tx, actor, about)), ...(comment === '' ? {} : { comment }) };
    await this.send(tx, actor.shopId, await this.author(tx, actor, about), (to) => ({
      kind: 'revision-approved',
      payload: { ...payload, to },
    }));
  }

  async returned(tx: Tx, actor: Actor, about: About, reason: string): Promise<void> {
    const payload = { ...(await this.body(tx, actor, about)), reason };
    await this.send(tx, actor.shopId, await this.author(tx, actor, about), (to) => ({
      kind: 'revision-returned',
      payload: { ...payload, to },
    }));
  }

  /** Everybody may be standing at a machine with it. */
  async withdrawn(tx: Tx, actor: Actor, about: About, told: { reason: string; stayingNumber: number | null }): Promise<void> {
    const everybody = await this.signOffs.recipients(tx, actor.shopId, { roles: ROLES, exceptId: actor.memberId });
    const payload = { ...(await this.body(tx, actor, about)), ...told };
    await this.send(tx, actor.shopId, everybody, (to) => ({ kind: 'revision-withdrawn', payload: { ...payload, to } }));
  }

  private async author(tx: Tx, actor: Actor, { record }: About): Promise<Recipient[]> {
    const { createdBy } = record.revision;
    return createdBy === actor.memberId ? [] : this.signOffs.recipient(tx, actor.shopId, createdBy);
  }

  private async body(tx: Tx, { shopId, printedName }: Actor, { record, number }: About) {
    const { name: shopName } = await this.shops.getRow(tx, shopId);
    const { id: recipeId, code: recipeCode, title: recipeTitle } = record.recipe;
    return { shopName, recipeId, revisionId: record.revision.id, recipeCode, recipeTitle, revisionNumber: number, by: printedName };
  }

  private async send(tx: Tx, shopId: string, recipients: readonly Recipient[], mailTo: (to: Recipient) => Mail): Promise<void> {
    for (const to of recipients) await this.outbox.add(tx, { shopId, ...mailTo(to) });
  }
}
