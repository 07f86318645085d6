import { Injectable } from '@nestjs/common';
import { stringify } from 'csv-stringify/sync';
import type { Actor } from '../common/actor';
import { UnitOfWork } from '../database/unit-of-work';
import { ExportLedgerQuery } from './dto/list-ledger.query.dto';
import { LedgerRepository } from './ledger.repository';
import type { LinkedEvent } from './ledger-chain';
import { filterFor } from './ledger-filter';

/** Rows per transaction: the file may be long, the work between two of its pieces is not. */
const STRETCH = 500;
const STATEMENT_TIMEOUT_MS = 10_000;

const COLUMNS = [
  { key: 'seq', header: 'Number' },
  { key: 'at', header: 'Time (UTC)' },
  { key: 'actorName', header: 'Who' },
  { key: 'action', header: 'What' },
  { key: 'subjectType', header: 'Kind of thing' },
  { key: 'subjectCode', header: 'Code' },
  { key: 'subjectId', header: 'Id' },
  { key: 'before', header: 'Before' },
  { key: 'after', header: 'After' },
  { key: 'actorMemberId', header: 'Member' },
  { key: 'sessionId', header: 'Session' },
  { key: 'bodyHash', header: 'Body hash' },
  { key: 'previousHash', header: 'Hash before' },
  { key: 'hash', header: 'Hash' },
];

/** The ledger as a file, oldest event first, in pieces: none of them holds more than a stretch in memory. */
@Injectable()
export class LedgerExportService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly repository: LedgerRepository,
  ) {}

  /** Cells that a spreadsheet would read as a formula are escaped. */
  async csv(actor: Actor, query: ExportLedgerQuery): Promise<AsyncIterable<string>> {
    const stretches = await this.startedStretches(actor, query);
    return joined(stretches, {
      before: stringify([COLUMNS.map(({ header }) => header)], { bom: true }),
      piece: ({ events }) => stringify(events.map(csvRow), { escape_formulas: true, columns: COLUMNS }),
      after: '',
    });
  }

  /** With all that the hashes cover, so that anybody can recompute the chain from the file alone. */
  async json(actor: Actor, query: ExportLedgerQuery): Promise<AsyncIterable<string>> {
    const head = await this.unitOfWork.read(actor, (tx) => this.repository.head(tx, actor.shopId));
    const stretches = await this.startedStretches(actor, query);
    const start = JSON.stringify({ shopId: actor.shopId, headSeq: head.seq, headHash: head.hash, filter: query }).slice(0, -1);
    return joined(stretches, {
      before: `${start},"events":[`,
      piece: ({ events, isFirst }) => `${isFirst ? '' : ','}${events.map((event) => JSON.stringify(event)).join(',')}`,
      after: ']}',
    });
  }

  /** The first stretch is read before anything is answered: a failure up to then is an honest problem document. */
  private async startedStretches(actor: Actor, query: ExportLedgerQuery): Promise<AsyncIterable<Stretch>> {
    const filter = filterFor(actor, query);
    const read = (afterSeq: number) =>
      this.unitOfWork.read(actor, (tx) => this.repository.listInOrder(tx, actor.shopId, { filter, range: { afterSeq } }, STRETCH), {
        statementTimeoutMs: STATEMENT_TIMEOUT_MS,
      });
    return stretchesFrom(await read(0), read);
  }
}

type Stretch = { readonly events: readonly LinkedEvent[]; readonly isFirst: boolean };

async function* stretchesFrom(first: LinkedEvent[], read: (afterSeq: number) => Promise<LinkedEvent[]>): AsyncGenerator<Stretch> {
  let events = first;
  for (let isFirst = true; events.length > 0; isFirst = false) {
    yield { events, isFirst };
    const last = events.at(-1);
    events = events.length < STRETCH || last === undefined ? [] : await read(last.seq);
  }
}

type FileParts = { readonly before: string; readonly piece: (stretch: Stretch) => string; readonly after: string };

async function* joined(stretches: AsyncIterable<Stretch>, { before, piece, after }: FileParts): AsyncGenerator<string> {
  yield before;
  for await (const stretch of stretches) yield piece(stretch);
  yield after;
}

const csvRow = ({ before, after, ...event }: LinkedEvent) => ({ ...event, before: asCell(before), after: asCell(after) });

const asCell = (value: unknown) => (value === null ? '' : JSON.stringify(value));
