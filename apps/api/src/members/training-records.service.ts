import { Injectable } from '@nestjs/common';
import { uuidv7 } from 'uuidv7';
import { type FieldProblem, InvalidError } from '../common/errors/domain-error';
import { type Actor, type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { ShopsService } from '../shops/shops.service';
import { CreateTrainingRecordDto, TrainingRecordDto } from './dto/training-record.dto';
import { MembersService } from './members.service';
import { TrainingRecordsRepository } from './training-records.repository';

/** What members were taught. Records are added, never changed: a wrong one is followed by a right one. */
@Injectable()
export class TrainingRecordsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly repository: TrainingRecordsRepository,
    private readonly members: MembersService,
    private readonly shops: ShopsService,
    private readonly ledger: LedgerService,
  ) {}

  async list(actor: Actor, memberId: string): Promise<TrainingRecordDto[]> {
    return this.unitOfWork.read(actor, async (tx) => {
      await this.members.getRow(tx, actor.shopId, memberId);
      return this.dtos(tx, actor, memberId);
    });
  }

  /** @throws InvalidError for a training of tomorrow or one that ran out before it was given */
  async create(actor: Actor, memberId: string, dto: CreateTrainingRecordDto): Promise<TrainingRecordDto[]> {
    return this.unitOfWork.run(actor, async (tx) => {
      await this.members.getActiveRow(tx, actor.shopId, memberId);
      refuseWrongDays(dto, await this.shops.today(tx, actor.shopId));
      const { subject, taughtBy, taughtOn, expiresOn } = dto;
      await this.repository.insert(tx, {
        ...{ id: uuidv7(), shopId: actor.shopId, memberId, subject, taughtBy, createdBy: actor.memberId },
        taughtOn: asMoment(taughtOn),
        expiresOn: expiresOn === undefined ? null : asMoment(expiresOn),
      });
      const about = { subjectType: 'member', subjectId: memberId };
      await this.ledger.record(tx, { actor, action: 'member.trained', ...about, after: { subject, taughtBy, taughtOn, expiresOn } });
      return this.dtos(tx, actor, memberId);
    });
  }

  private async dtos(tx: Tx, { shopId }: Actor, memberId: string): Promise<TrainingRecordDto[]> {
    const today = await this.shops.today(tx, shopId);
    const rows = await this.repository.list(tx, shopId, memberId);
    return rows.map(({ row, recordedBy }) => {
      const expiresOn = row.expiresOn === null ? null : asDay(row.expiresOn);
      return {
        ...{ id: row.id, subject: row.subject, taughtBy: row.taughtBy, taughtOn: asDay(row.taughtOn), expiresOn },
        isExpired: expiresOn !== null && expiresOn < today,
        recordedBy,
        recordedAt: row.createdAt.toISOString(),
      };
    });
  }
}

function refuseWrongDays({ taughtOn, expiresOn }: CreateTrainingRecordDto, today: string): void {
  const errors: FieldProblem[] = [
    ...(taughtOn > today
      ? [{ pointer: '#/taughtOn', detail: 'This day is still to come. Write the training down once it was given.' }]
      : []),
    ...(expiresOn !== undefined && expiresOn < taughtOn ? [{ pointer: '#/expiresOn', detail: 'This is before the training itself.' }] : []),
  ];
  if (errors.length > 0) throw new InvalidError('Some days need another look.', errors);
}

/** The column holds a moment; a day of the calendar is its midnight in UTC, in and out. */
const asMoment = (day: string) => new Date(`${day}T00:00:00Z`);
const asDay = (moment: Date) => moment.toISOString().slice(0, 10);
