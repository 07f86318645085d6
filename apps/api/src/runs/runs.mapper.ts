import type { Actor } from '../common/actor';
import { revisionNumbers } from '../recipes/step-numbers';
import type { RunDto, RunSummaryDto } from './dto/run.dto';
import { stopsRun } from './revision-use';
import type { RunSurroundings } from './run-surroundings.service';
import { runActions } from './runs.policy';
import type { RunView } from './runs.repository';

export function toRunSummary({ run, recipe, revision, machine, material, startedBy }: RunView): RunSummaryDto {
  return {
    id: run.id,
    code: run.code,
    kind: run.kind,
    state: run.state,
    recipe,
    revision: { id: revision.id, number: revision.number, state: revision.state },
    machine,
    material,
    jobReference: run.jobReference,
    part: run.part,
    lot: run.lot,
    good: run.goodCount,
    scrap: run.scrapCount,
    firstPiece: run.firstPiece === null ? null : { ...run.firstPiece, photoId: run.firstPiece.photoId ?? null },
    // the request class of a bad result holds it to the list of outcomes
    badResult: run.badResult as RunSummaryDto['badResult'],
    startedBy,
    startedAt: run.startedAt.toISOString(),
    finishedAt: run.finishedAt?.toISOString() ?? null,
  };
}

export function toRunDto(view: RunView, { holds, stop, cautions }: RunSurroundings, actor: Pick<Actor, 'role' | 'memberId'>): RunDto {
  const { run, revision, finish, effect, lensFitted, deviation, panel, startedBy } = view;
  // a confirmation run keeps the steps of a draft that may since have changed
  const steps = run.steps ?? revision.content.steps;
  return {
    ...toRunSummary(view),
    finish,
    effect,
    lensFitted,
    holds: holds.map(({ id, subject, reason, placedBy }) => ({ id, subject, reason, placedBy })),
    stop,
    cautions: [...cautions],
    panel,
    steps,
    ...revisionNumbers(steps, view),
    setUpSteps: revision.content.setUpSteps,
    ticks: run.ticks,
    measurements: run.measurements.map((measurement) => ({ ...measurement, meets: measurement.meets ?? null })),
    deviation: deviation === null ? null : { ...deviation, endsAt: deviation.endsAt?.toISOString() ?? null },
    notes: run.notes,
    contentHash: run.contentHash,
    version: run.version,
    allowedActions: runActions(actor, {
      state: run.state,
      startedBy: startedBy.id,
      isStopped: holds.length > 0 || stopsRun(revision.state),
    }),
  };
}
