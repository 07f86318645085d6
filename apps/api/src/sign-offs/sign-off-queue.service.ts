import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { decodeCursor, type PageQuery, pageOf } from '../common/pagination/page';
import { UnitOfWork } from '../database/unit-of-work';
import { RecipeRevisionsService } from '../recipes/recipe-revisions.service';
import type { SignOffQueueDto } from './dto/sign-off-queue.dto';
import { SignOffsRepository } from './sign-offs.repository';

/** What waits for a signature, oldest first. */
@Injectable()
export class SignOffQueueService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly signOffs: SignOffsRepository,
    private readonly revisions: RecipeRevisionsService,
  ) {}

  async list(actor: Actor, { limit, cursor }: PageQuery): Promise<SignOffQueueDto> {
    const [submittedAt, id] = decodeCursor(cursor, ['moment', 'id']) ?? [];
    const after = submittedAt === undefined ? {} : { after: { submittedAt: String(submittedAt), id: String(id) } };
    return this.unitOfWork.read(actor, async (tx) => {
      const rows = await this.signOffs.queue(tx, actor.shopId, { limit: limit + 1, ...after });
      const page = pageOf(rows, limit, { item: (row) => row.id, cursor: (row) => [row.submittedAt, row.id] });
      const items = await this.revisions.listQueued(tx, actor, page.items);
      return { items, nextCursor: page.nextCursor, totalCount: await this.signOffs.countInReview(tx, actor.shopId) };
    });
  }
}
