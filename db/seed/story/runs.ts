import { schema } from '@proofplate/db';
import type { MarkKind } from '../photos/mark-kinds';
import { authored, type Turn } from '../stage/stage';
import type { WorkSpec } from './coupon-specs';
import type { World } from './coupons';
import { OTHER_RECIPES } from './other-recipe-specs';
import { PROVED_RECIPES } from './recipe-specs';
import { BOOKED_RUNS, type BookedRun, DAILY_CHECKS } from './run-specs';
import { doRun, measuredPieces } from './run-writing';
import { teller } from './shop';

const { deviation } = schema;

const STARTS: Readonly<Record<BookedRun['slot'], string>> = { first: '14:00:00Z', second: '15:10:00Z' };
const CHECK_AT = '07:45:00Z';
const CHECKED = 'black/3';
const DEVIATION_AT = '2026-11-02T10:30:00Z';
const DEVIATED = 'coat/1';

/** Two months at the machines. */
export function writeRuns(world: World): void {
  const { script, cast, made } = world;
  const granted: { id?: string } = {};
  script.add(new Date(DEVIATION_AT), teller(cast.people.lead), async (turn) => {
    granted.id = await grantDeviation(turn, made.revision(DEVIATED).id);
  });
  for (const booked of BOOKED_RUNS) {
    const work = workOf(booked.revision);
    script.add(new Date(`${booked.day}T${STARTS[booked.slot]}`), teller(cast.people[booked.by]), async (turn) => {
      const { job: jobReference, underDeviation = false, revision: key, day: _day, slot: _slot, by: _by, ...rest } = booked;
      const revision = made.revision(key);
      const measurements =
        booked.isOpen === true ? [] : measuredPieces(cast, work, revision.content, { count: 1, seed: `${booked.day} ${key}` });
      const cited = underDeviation && granted.id !== undefined ? { deviationId: granted.id } : {};
      await doRun(turn, cast, work, revision, { kind: 'production', jobReference, ...rest, measurements, ...cited });
    });
  }
  writeChecks(world);
}

function writeChecks({ script, cast, made }: World): void {
  const work = workOf(CHECKED);
  for (const { day, watts } of DAILY_CHECKS) {
    script.add(new Date(`${day}T${CHECK_AT}`), teller(cast.people.operator), async (turn) => {
      const revision = made.revision(CHECKED);
      const measurements = measuredPieces(cast, work, revision.content, { count: 1, seed: `check ${day}`, watts });
      const check = {
        kind: 'daily-check',
        jobReference: '',
        part: 'Reference strip',
        lot: '6061-B20',
        good: 1,
        scrap: 0,
        minutes: 8,
      } as const;
      await doRun(turn, cast, work, revision, { ...check, measurements });
    });
  }
}

async function grantDeviation(turn: Turn, revisionId: string): Promise<string> {
  const id = turn.newId();
  const values = {
    revisionId,
    description: 'Mark speed 330 instead of 367 mm/s on lot PC-BL-14.',
    reason: 'The coat of this lot is 85 µm thick; two test panels came out bare.',
    endsAt: new Date('2027-01-31T17:00:00Z'),
    maximumQuantity: 60,
    grantedByName: turn.by.name,
  };
  await turn.tx.insert(deviation).values({ ...authored(turn), id, ...values });
  await turn.tell({ action: 'deviation.granted', subjectType: 'deviation', subjectId: id, after: values });
  return id;
}

/** The work of a revision's recipe, by the revision's name in the story. */
function workOf(revision: string): WorkSpec & { readonly kind: MarkKind } {
  const [key] = revision.split('/');
  const found = [...PROVED_RECIPES, ...OTHER_RECIPES].find((spec) => spec.key === key);
  if (found === undefined) throw new RangeError(`there is no recipe ${key}`);
  return found;
}
