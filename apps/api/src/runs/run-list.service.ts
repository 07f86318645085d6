import { Injectable } from '@nestjs/common';
import { RUN_KIND_LABELS } from '@proofplate/recipe-model';
import { stringify } from 'csv-stringify/sync';
import type { Actor } from '../common/actor';
import { decodeCursor, type Page, pageOf } from '../common/pagination/page';
import { UnitOfWork } from '../database/unit-of-work';
import type { ListRunsQuery } from './dto/list-runs.query.dto';
import type { RunDto, RunSummaryDto } from './dto/run.dto';
import { RunActs } from './run-acts.service';
import { RunNotFoundError } from './runs.errors';
import { toRunSummary } from './runs.mapper';
import { readsAllRuns } from './runs.policy';
import { type RunFilter, RunsRepository } from './runs.repository';

/** More than a shop runs in a year; keeps an export within one answer. */
const EXPORT_LIMIT = 5_000;
const EXPORT_TIMEOUT_MS = 10_000;

@Injectable()
export class RunListService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly runs: RunsRepository,
    private readonly acts: RunActs,
  ) {}

  async list(actor: Actor, query: ListRunsQuery): Promise<Page<RunSummaryDto>> {
    const [startedAt, id] = decodeCursor(query.cursor, ['moment', 'id']) ?? [];
    const after = startedAt === undefined ? {} : { after: { startedAt: String(startedAt), id: String(id) } };
    const page = { filter: filterOf(actor, query), limit: query.limit + 1, ...after };
    const views = await this.unitOfWork.read(actor, (tx) => this.runs.list(tx, actor.shopId, page));
    return pageOf(views, query.limit, { item: toRunSummary, cursor: ({ run }) => [run.startedAt.toISOString(), run.id] });
  }

  /** @throws RunNotFoundError also for another shop's run, and for a trainee somebody else's */
  async get(actor: Actor, key: string): Promise<RunDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      const dto = await this.acts.toDto(tx, actor, key);
      if (!readsAllRuns(actor) && dto.startedBy.id !== actor.memberId) throw new RunNotFoundError();
      return dto;
    });
  }

  /** All that match, as CSV; cells that a spreadsheet would read as a formula are escaped. */
  async exportCsv(actor: Actor, query: ListRunsQuery): Promise<string> {
    const page = { filter: filterOf(actor, query), limit: EXPORT_LIMIT };
    const views = await this.unitOfWork.read(actor, (tx) => this.runs.list(tx, actor.shopId, page), {
      statementTimeoutMs: EXPORT_TIMEOUT_MS,
    });
    return stringify(views.map(toRunSummary).map(csvRow), { header: true, bom: true, escape_formulas: true, columns: CSV_COLUMNS });
  }
}

function filterOf(actor: Actor, { jobReference, recipeId, machineId, kind, state, q = '' }: ListRunsQuery): RunFilter {
  return {
    ...(readsAllRuns(actor) ? {} : { startedBy: actor.memberId }),
    ...(jobReference === undefined ? {} : { jobReference }),
    ...(recipeId === undefined ? {} : { recipeId }),
    ...(machineId === undefined ? {} : { machineId }),
    ...(kind === undefined ? {} : { kind }),
    ...(state === undefined ? {} : { state }),
    words: q.split(/\s+/u).filter((word) => word !== ''),
  };
}

const CSV_COLUMNS = [
  'code',
  'kind',
  'state',
  'job',
  'part',
  'lot',
  'recipe',
  'title',
  'revision',
  'machine',
  'material',
  'good',
  'scrap',
  'first piece',
  'first piece by',
  'bad result',
  'started at',
  'started by',
  'finished at',
];

function csvRow(run: RunSummaryDto) {
  const { firstPiece } = run;
  const verdict = firstPiece === null ? '' : firstPiece.ok ? 'released' : 'not released';
  return [
    run.code,
    RUN_KIND_LABELS[run.kind],
    run.state,
    run.jobReference,
    run.part,
    run.lot,
    run.recipe.code,
    run.recipe.title,
    run.revision.number ?? 'draft',
    run.machine.name,
    run.material.name,
    run.good,
    run.scrap,
    verdict,
    firstPiece?.byName ?? '',
    run.badResult?.outcome ?? '',
    run.startedAt,
    run.startedBy.name,
    run.finishedAt ?? '',
  ];
}
