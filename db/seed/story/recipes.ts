import { contentHash } from '@proofplate/recipe-model';
import { sha256 } from '../stage/ledger-writer';
import type { ProvedMark } from './approval-checks';
import type { World } from './coupons';
import { OTHER_RECIPES } from './other-recipe-specs';
import { type DraftRecord, draft } from './recipe-drafting';
import { approve, linkProof, refuse, type Signing, submit } from './recipe-signing';
import { PROVED_RECIPES, type RecipeSpec, type RevisionSpec } from './recipe-specs';
import { doRun, measuredPieces } from './run-writing';
import { teller } from './shop';

/** What the acts of one revision hand to each other. */
type Thread = { record?: DraftRecord; marks: ProvedMark[] };

export function writeRecipes(world: World): void {
  for (const spec of [...PROVED_RECIPES, ...OTHER_RECIPES]) {
    const threads = spec.revisions.map((): Thread => ({ marks: [] }));
    for (const [index, step] of spec.revisions.entries()) writeRevision(world, spec, { step, index, threads });
  }
}

type Place = { readonly step: RevisionSpec; readonly index: number; readonly threads: readonly Thread[] };

function writeRevision(world: World, spec: RecipeSpec, { step, index, threads }: Place): void {
  const { script, cast, made } = world;
  const author = cast.people[step.by];
  const thread = threads[index];
  if (thread === undefined) throw new RangeError('a revision without its thread');
  const before = index === 0 ? undefined : threads[index - 1];
  script.add(new Date(step.draftedAt), teller(author), async (turn) => {
    thread.record = await draft(turn, world, {
      recipe: spec,
      revision: step,
      ...(before?.record === undefined ? {} : { before: before.record }),
    });
    made.revisions.set(`${spec.key}/${index + 1}`, thread.record);
  });
  writeProof(world, spec, { step, thread });
  const signing = (person: Signing['person']): Signing => ({ cast, recipe: spec, record: recordOf(thread), person, marks: thread.marks });
  if (step.submittedAt !== undefined)
    script.add(new Date(step.submittedAt), teller(author), (turn) => submit(turn, signing(author), index + 1));
  writeEnding(world, { step, before, signing });
}

function writeEnding(
  { script, cast }: World,
  { step, before, signing }: { step: RevisionSpec; before: Thread | undefined; signing: (person: Signing['person']) => Signing },
): void {
  const { ending, withdrawal } = step;
  if (ending !== undefined) {
    const person = cast.people[ending.by];
    script.add(new Date(ending.at), teller(person), async (turn) => {
      if (ending.act === 'approved') await approve(turn, signing(person), before?.record, ending.comment ?? '');
      else await refuse(turn, signing(person), 'returned', ending.comment);
    });
  }
  if (withdrawal !== undefined) {
    const person = cast.people[withdrawal.by];
    script.add(new Date(withdrawal.at), teller(person), (turn) => refuse(turn, signing(person), 'withdrawn', withdrawal.reason));
  }
}

const MINUTES_OF_PROOF = 20;

function writeProof({ script, cast, made }: World, spec: RecipeSpec, { step, thread }: { step: RevisionSpec; thread: Thread }): void {
  const { proof } = step;
  if (proof === undefined) return;
  const by = teller(cast.people[step.by]);
  if ('coupon' in proof) {
    script.add(new Date(proof.linkedAt), by, async (turn) => {
      thread.marks = await linkProof(turn, recordOf(thread), made.coupon(proof.coupon));
    });
    return;
  }
  script.add(new Date(proof.runAt), by, async (turn) => {
    const record = recordOf(thread);
    const measurements = measuredPieces(cast, spec, record.content, { count: proof.pieces, seed: `${spec.key} ${proof.runAt}` });
    const dialledIn = { ...record, contentHash: contentHash(record.content, sha256) };
    const run = {
      kind: 'confirmation',
      jobReference: '',
      part: 'Test pieces',
      lot: proof.lot,
      good: proof.pieces,
      scrap: 0,
      minutes: MINUTES_OF_PROOF,
    } as const;
    await doRun(turn, cast, spec, dialledIn, { ...run, measurements });
    const day = proof.runAt.slice(0, 10);
    thread.marks = Array.from({ length: proof.pieces }, (_, index) => ({
      lot: proof.lot,
      day,
      measured: measurements.filter(({ piece }) => piece === index + 1),
    }));
  });
}

function recordOf({ record }: Thread): DraftRecord {
  if (record === undefined) throw new RangeError('the revision is not drafted yet');
  return record;
}
