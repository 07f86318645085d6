import { schema } from '@proofplate/db';
import {
  type AreaMm,
  type Criterion,
  type EnteredPart,
  type MarkStep,
  meetsCriterion,
  QUANTITIES,
  type RunKind,
} from '@proofplate/recipe-model';
import { and, eq } from 'drizzle-orm';
import type { MarkKind } from '../photos/mark-kinds';
import { modelMark } from '../photos/mark-model';
import { seededRandom, seedOf } from '../photos/noise';
import { authored, minutesAfter, type Turn } from '../stage/stage';
import { type Bench, type Cast, effectOf } from './cast';
import { logPiece } from './clocked-piece';
import { byInstrument, evennessPercent, rounded } from './coupon-inspecting';
import type { WorkSpec } from './coupon-specs';
import { exposureOf } from './exposure';
import type { RevisionRecord } from './records';
import { keepRoundPart } from './round-part';

const { run } = schema;

type PieceMeasurement = (typeof run.$inferInsert)['measurements'] extends (infer Rows)[] | undefined ? Rows : never;
export type RunSpec = {
  readonly kind: RunKind;
  readonly jobReference: string;
  readonly part: string;
  readonly lot: string;
  readonly good: number;
  readonly scrap: number;
  readonly minutes: number;
  readonly notes?: string;
  readonly deviationId?: string;
  readonly measurements?: PieceMeasurement[];
  readonly badResult?: { readonly outcome: string; readonly note: string };
  /** Left open: somebody is at it now. */
  readonly isOpen?: boolean;
  readonly roundPart?: EnteredPart;
  /** Marked area of the piece that somebody clocked. */
  readonly clockedMm?: AreaMm;
};

const PART_AFTER_MIN = 2;
const FIRST_PIECE_AFTER_MIN = 4;
const CLOCKED_AFTER_MIN = 6;

/** A run from the start to its end: first piece before the batch, counts and measurements at the end, a bad result if one came out. */
export async function doRun(turn: Turn, cast: Cast, work: WorkSpec, revision: RevisionRecord, spec: RunSpec): Promise<string> {
  const { kind, jobReference, part, lot, deviationId = null } = spec;
  const id = turn.newId();
  const code = await turn.nextCode('run');
  const { content } = revision;
  const ticked = content.setUpSteps.flatMap(({ mustTick }, index) => (mustTick ? [`set-up.${index}`] : []));
  const values = {
    ...{ kind, recipeId: revision.recipeId, revisionId: revision.id, machineId: cast.benches[work.bench].id, clientId: turn.newId() },
    ...{ contentHash: revision.contentHash ?? '', lensFittedId: cast.lenses[work.lens].id, jobReference, part, lot, deviationId, code },
  };
  const steps: MarkStep[] | null = kind === 'confirmation' ? content.steps : null;
  const ticks = Object.fromEntries(ticked.map((key) => [key, turn.at.toISOString()]));
  await turn.tx.insert(run).values({ ...authored(turn), id, ...values, steps, ticks, startedAt: turn.at });
  const told = telling(turn, id, code);
  await told('run.started', 0, { ...values, ticked });
  if (spec.roundPart !== undefined) {
    const part = await keepRoundPart(turn, { cast, work, revision, runId: id, entered: spec.roundPart });
    await told('run.part-set-up-saved', PART_AFTER_MIN, part);
  }
  if (kind !== 'daily-check') await releaseFirstPiece(turn, id, told);
  if (spec.clockedMm !== undefined) {
    const logged = await logPiece(turn, { cast, work, revision, runId: id, areaMm: spec.clockedMm });
    await told('marking-time.logged', CLOCKED_AFTER_MIN, logged);
  }
  if (spec.isOpen !== true) await finish(turn, id, spec, told);
  return code;
}

type Telling = (action: string, minutes: number, after: unknown) => Promise<void>;

function telling(turn: Turn, id: string, code: string): Telling {
  return (action, minutes, after) =>
    turn.tell({ action, subjectType: 'run', subjectId: id, subjectCode: code, after }, { at: minutesAfter(turn.at, minutes) });
}

async function releaseFirstPiece(turn: Turn, id: string, told: Telling): Promise<void> {
  const { memberId, name } = turn.by;
  if (memberId === null) throw new Error('only members look at first pieces');
  const firstPiece = { ok: true, by: memberId, byName: name, at: minutesAfter(turn.at, FIRST_PIECE_AFTER_MIN).toISOString(), note: '' };
  await turn.tx.update(run).set({ firstPiece, version: 2 }).where(isRun(turn, id));
  await told('run.first-piece-released', FIRST_PIECE_AFTER_MIN, firstPiece);
}

async function finish(turn: Turn, id: string, spec: RunSpec, told: Telling): Promise<void> {
  const { good: goodCount, scrap: scrapCount, measurements = [], notes = '', minutes, badResult } = spec;
  const result = { goodCount, scrapCount, measurements, notes };
  await turn.tx
    .update(run)
    .set({ ...result, state: 'finished', finishedAt: minutesAfter(turn.at, minutes), version: 3 })
    .where(isRun(turn, id));
  await told('run.finished', minutes, result);
  if (badResult === undefined) return;
  const bad = { ...badResult, at: minutesAfter(turn.at, minutes + 2).toISOString(), byName: turn.by.name };
  await turn.tx.update(run).set({ badResult: bad, version: 4 }).where(isRun(turn, id));
  await told('run.bad-result-told', minutes + 2, bad);
}

const isRun = ({ shopId }: Turn, id: string) => and(eq(run.shopId, shopId), eq(run.id, id));

/** Pieces marked with a setting and measured, as the process model has them. */
export function measuredPieces(
  cast: Cast,
  work: WorkSpec & { readonly kind: MarkKind },
  { steps: [step] }: RevisionRecord['content'],
  { count, seed, watts = 1 }: { readonly count: number; readonly seed: string; readonly watts?: number },
): PieceMeasurement[] {
  if (step === undefined) throw new RangeError('the setting has no mark step');
  const { criteria } = effectOf(cast, work.effect);
  const bench: Bench = cast.benches[work.bench];
  const random = seededRandom(seedOf(seed));
  const exposure = exposureOf(step.parameters, bench.physical);
  return Array.from({ length: count }, (_, index) => {
    const mark = modelMark(work.kind, { ...exposure, doseJPerMm2: exposure.doseJPerMm2 * watts }, random);
    const seen = [
      { quantity: 'lightness', value: rounded(mark.lab[0], 1), method: 'colorimeter' },
      { quantity: 'contrast', value: rounded(mark.contrast, 3), method: 'colorimeter' },
      { quantity: 'evenness', value: evennessPercent(mark.lab[0], mark.evenness), method: 'colorimeter' },
    ] as const;
    const measured = [...seen, ...byInstrument({ mark, parameters: step.parameters }, criteria, bench)];
    return measured
      .filter(({ quantity }) => quantity === 'lightness' || criteria.some((criterion) => criterion.quantity === quantity))
      .map(({ quantity, value, method }) => ({
        ...{ piece: index + 1, quantity, value, unit: QUANTITIES[quantity].unit, method },
        ...judged(criteria, { quantity, value }),
      }));
  }).flat();
}

/** Says whether a value meets the criteria where one asks for it. */
function judged(criteria: readonly Criterion[], { quantity, value }: { readonly quantity: string; readonly value: number }) {
  const asked = criteria.filter((criterion) => criterion.quantity === quantity);
  return asked.length === 0 ? {} : { meets: asked.every((criterion) => meetsCriterion(criterion, value)) };
}
