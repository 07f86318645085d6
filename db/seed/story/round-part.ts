import { schema } from '@proofplate/db';
import { type EnteredPart, type PartOpticsFacts, partGround, partResults, partSetUp } from '@proofplate/recipe-model';
import { authored, type Turn } from '../stage/stage';
import { BENCH_SPECS, LENS_SPECS } from './bench-specs';
import type { Cast } from './cast';
import type { WorkSpec } from './coupon-specs';
import type { RevisionRecord } from './records';

const mm = (value: number) => ({ value, unit: 'mm' as const });

/** The ring of a hand compass: the scale runs once round its outside. All numbers are invented. */
export const COMPASS_RING: EnteredPart = {
  ...{ shape: 'ring', side: 'outside', diameter: mm(64), wall: mm(4), length: mm(12), artworkHeight: mm(7.5), seam: mm(0.05) },
  ...{ allowance: 'fluence loss', allowancePercent: 10, focusAt: 'mid', steepestEdgeDeg: 20, stepsPerTurn: 12_800, shownIn: 'mm' },
};

type Kept = {
  readonly cast: Cast;
  readonly work: WorkSpec;
  readonly revision: RevisionRecord;
  readonly runId: string;
  readonly entered: EnteredPart;
};

/** Keeps a part with its run while it is open, as the application does; answers what the ledger is told. */
export async function keepRoundPart(turn: Turn, { cast, work, revision, runId, entered }: Kept): Promise<unknown> {
  const facts = factsOf(work, revision);
  const setUp = partSetUp(entered, partGround(facts));
  if (setUp.kind === 'refused') throw new RangeError(`the part cannot be set up: ${JSON.stringify(setUp.problems)}`);
  const results = partResults(setUp);
  const { id: lensId, name } = cast.lenses[work.lens];
  const bench = cast.benches[work.bench];
  const ground = { machine: { id: bench.id, name: bench.name }, lens: { id: lensId, name }, ...facts };
  await turn.tx.insert(schema.partSetUp).values({
    ...authored(turn),
    ...{ id: turn.newId(), runId, number: 1, lensId, savedByName: turn.by.name },
    ...{ entered: { ...entered }, ground, results: { ...results } },
  });
  const known = results.numbers.flatMap(({ key, value }) => (value === null ? [] : [[key, value] as const]));
  return { entered, isMirrored: results.isMirrored, numbers: Object.fromEntries(known) };
}

function factsOf({ bench, lens }: WorkSpec, { content }: RevisionRecord): PartOpticsFacts {
  const { physical, mountings } = BENCH_SPECS[bench];
  const { focalLengthMm, fieldSizeMm } = LENS_SPECS[lens];
  const { wavelengthNm, m2 = null, beamDiameterMm = null } = physical;
  const offsets = content.steps.map(({ parameters }) => parameters.values.focusOffsetMm?.physical ?? 0);
  const measuredSpotUm = mountings[lens]?.spot?.um ?? null;
  return { wavelengthNm, m2, beamDiameterMm, focalLengthMm, fieldSizeMm, measuredSpotUm, focusOffsetsMm: [...new Set(offsets)] };
}
