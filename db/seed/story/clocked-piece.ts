import { schema } from '@proofplate/db';
import { type AreaMm, type HeadOverheads, markedAreas, markTime, pausesOf } from '@proofplate/recipe-model';
import { seededRandom, seedOf } from '../photos/noise';
import { authored, type Turn } from '../stage/stage';
import { BENCH_SPECS } from './bench-specs';
import type { Cast } from './cast';
import type { WorkSpec } from './coupon-specs';
import type { RevisionRecord } from './records';

/** What the scan heads of the demo shop really take. Invented; a little more than their profiles say. */
const TRUE_LINE_MS = 1.15;
const TRUE_SCAN_MS = 260;
/** Two hands on a clock. */
const CLOCK_ERROR_S = 0.4;

type Clocked = {
  readonly cast: Cast;
  readonly work: WorkSpec;
  readonly revision: RevisionRecord;
  readonly runId: string;
  readonly areaMm: AreaMm;
};

/** Logs the time of one piece with its run, as the application does; answers what the ledger is told. */
export async function logPiece(turn: Turn, { cast, work, revision, runId, areaMm }: Clocked): Promise<unknown> {
  const bench = cast.benches[work.bench];
  const { steps } = revision.content;
  const marked = markedAreas(steps.map(({ parameters }) => ({ parameters, areaMm })));
  if ('unknownBecause' in marked) throw new RangeError(marked.unknownBecause);
  const [areas, pausesS] = [[...marked.areas], pausesOf(steps)];
  const { totalS } = markTime({ areas, pausesS }, { physical: {}, overheads: truthOf(BENCH_SPECS[work.bench].physical.jumpSpeedMmPerS) });
  if (totalS === null) throw new RangeError(`${bench.name} has no jump speed`);
  const error = (seededRandom(seedOf(`clock ${runId}`))() - 0.5) * CLOCK_ERROR_S;
  const seconds = Math.round((totalS + error) * 10) / 10;
  await turn.tx.insert(schema.loggedTime).values({
    ...authored(turn),
    ...{ id: turn.newId(), machineId: bench.id, profileNumber: profileNumberOf(work), runId, seconds, pausesS, loggedByName: turn.by.name },
    areas: areas.map((area) => ({ ...area })),
  });
  return { machine: bench.name, seconds, pausesS, areas };
}

/** The panel of bench 2 was put in a better order before anything was run on it. */
const profileNumberOf = ({ bench }: WorkSpec) => (bench === 'bench 2' ? 2 : 1);

function truthOf(jumpSpeedMmPerS = 0): HeadOverheads {
  return {
    ...{ basis: 'fitted', jumpSpeedMmPerS, n: 0, spreadS: 0, lineMs: TRUE_LINE_MS, lineStandardErrorMs: 0 },
    ...{ scanMs: TRUE_SCAN_MS, scanStandardErrorMs: 0, scanMissingBecause: null },
  };
}
