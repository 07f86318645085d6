import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import type { Tx } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { hasWritten } from '../recipes/recipe-revisions.policy';
import type { RevisionRecord } from '../recipes/stored-revision';
import { type NewSignOff, SignOffsRepository } from './sign-offs.repository';

export type Signature = Pick<NewSignOff, 'meaning' | 'comment' | 'contentHash' | 'method'> &
  Partial<Pick<NewSignOff, 'checks' | 'acknowledgedCautionIds'>> & {
    /** Past tense in dots: `revision.approved`. */
    readonly action: string;
    readonly after?: Readonly<Record<string, unknown>>;
  };

/** Writes signatures: name and role frozen as printed, bound to the content's hash and to the ledger before them. */
@Injectable()
export class SignaturesService {
  constructor(
    private readonly signOffs: SignOffsRepository,
    private readonly ledger: LedgerService,
  ) {}

  /** Call it after every other lock and change of the act: it takes the end of the shop's ledger. */
  async sign(tx: Tx, actor: Actor, { revision, recipe }: RevisionRecord, { action, after, ...signature }: Signature): Promise<void> {
    const isByAuthor = hasWritten(actor, revision);
    const { hash: ledgerHashBefore } = await this.ledger.lockHead(tx, actor.shopId);
    await this.signOffs.insert(tx, actor.shopId, {
      ...{ checks: null, acknowledgedCautionIds: [], ...signature },
      revisionId: revision.id,
      memberId: actor.memberId,
      printedName: actor.printedName,
      role: actor.role,
      ledgerHashBefore,
      isByAuthor,
    });
    const { meaning, comment, contentHash, method } = signature;
    await this.ledger.record(tx, {
      ...{ actor, action, subjectType: 'revision', subjectId: revision.id, subjectCode: recipe.code },
      before: { state: revision.state },
      after: {
        ...after,
        signature: { meaning, comment, contentHash, method, printedName: actor.printedName, role: actor.role, isByAuthor },
      },
    });
  }
}
