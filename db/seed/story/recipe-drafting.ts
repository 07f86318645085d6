import { schema } from '@proofplate/db';
import {
  boundContent,
  contentHash,
  type ParameterSet,
  type RecipeScope,
  type RevisionContent,
  type SetUpStep,
  showNumber,
} from '@proofplate/recipe-model';
import { sha256 } from '../stage/ledger-writer';
import { authored, type Turn } from '../stage/stage';
import type { Cast } from './cast';
import { keysOf } from './coupon-planning';
import type { RecipeSpec, RevisionSpec } from './recipe-specs';
import { bestCell, type Made, type RevisionRecord } from './records';
import { calibrationFor, changeSetting, enterSetting } from './setting';

const { recipe, revision, revisionEvidence } = schema;

export type BasisCell = { readonly couponId: string; readonly cellId: string; readonly name: string };
/** A revision with all that its hash binds. */
export type DraftRecord = RevisionRecord & {
  readonly keys: ReturnType<typeof keysOf>;
  readonly authorId: string;
  readonly basis: readonly BasisCell[];
  readonly basedOnId: string | null;
  readonly spec: RevisionSpec;
  readonly groundsBy: string | null;
};

/** Begins the recipe with its first draft, or puts the next draft on the ladder. */
export async function draft(
  turn: Turn,
  { cast, made }: { readonly cast: Cast; readonly made: Made },
  { recipe: spec, revision: step, before }: { readonly recipe: RecipeSpec; readonly revision: RevisionSpec; readonly before?: DraftRecord },
): Promise<DraftRecord> {
  const keys = keysOf(cast, spec);
  const started = before ?? (await addRecipe(turn, spec, keys));
  const { parameters, calibration, basis } = settingOf(turn, { cast, made }, spec, step);
  const content: RevisionContent = {
    steps: [{ purpose: spec.purpose, parameters, pauseAfterS: 0 }],
    setUpSteps: setUpOf(cast, spec),
    limits: spec.limits,
    scope: spec.scope,
  };
  const { recipeId, recipeCode } = started;
  const recipeTitle = spec.title;
  const groundsBy = step.grounds === undefined ? null : cast.people[step.grounds.by].memberId;
  const record: DraftRecord = {
    ...{ id: turn.newId(), recipeId, recipeCode, recipeTitle, content, keys, basis, spec: step, groundsBy, state: 'draft' },
    profileId: cast.benches[spec.bench].profileId,
    calibrationId: calibration?.id ?? null,
    calibratedOn: calibration?.measuredOn ?? null,
    authorId: authored(turn).createdBy,
    basedOnId: before?.id ?? null,
    confirmationCellIds: [],
    confirmationRuns: [],
  };
  await storeDraft(turn, record);
  return record;
}

async function addRecipe(turn: Turn, { title, scope }: RecipeSpec, keys: DraftRecord['keys']) {
  const recipeId = turn.newId();
  const recipeCode = await turn.nextCode('recipe');
  await turn.tx.insert(recipe).values({ ...authored(turn), id: recipeId, code: recipeCode, title, ...keys, ...scopeColumns(scope) });
  const after = { ...keys, title, scope };
  await turn.tell({ action: 'recipe.created', subjectType: 'recipe', subjectId: recipeId, subjectCode: recipeCode, after });
  return { recipeId, recipeCode };
}

async function storeDraft(turn: Turn, record: DraftRecord): Promise<void> {
  const { id, recipeId, recipeCode, content, profileId, calibrationId, basedOnId, basis, groundsBy } = record;
  const { reason, route = 'coupons', grounds, effectiveFrom, reviewDue } = record.spec;
  const values = { recipeId, content, profileId, calibrationId, reason, basedOnId, route, grounds: grounds?.text ?? '', groundsBy };
  const dates = { effectiveFrom: dateOf(effectiveFrom), reviewDue: dateOf(reviewDue) };
  await turn.tx.insert(revision).values({ ...authored(turn), id, ...values, content: { ...content }, ...dates });
  if (basis.length > 0) {
    const links = basis.map(({ couponId, cellId }) => ({ couponId, cellId, revisionId: id, kind: 'basis' }));
    await turn.tx.insert(revisionEvidence).values(links.map((link) => ({ ...authored(turn), ...link })));
  }
  const after = { ...values, ...dates, cellIds: basis.map(({ cellId }) => cellId) };
  await turn.tell({ action: 'revision.drafted', subjectType: 'revision', subjectId: id, subjectCode: recipeCode, after });
}

function settingOf(turn: Turn, { cast, made }: { cast: Cast; made: Made }, { bench: benchKey }: RecipeSpec, { setting }: RevisionSpec) {
  const bench = cast.benches[benchKey];
  if ('typed' in setting) {
    const calibration = calibrationFor(bench, turn.at, setting.typed.values);
    const basis: readonly BasisCell[] = [];
    return { calibration, basis, parameters: enterSetting(bench, calibration, setting.typed) };
  }
  const plate = made.coupon(setting.coupon);
  const cell = bestCell(plate);
  const values = cell.parameters.values;
  const calibration = calibrationFor(bench, turn.at, {
    frequencyKhz: values.frequencyKhz?.physical,
    pulseWidthNs: values.pulseWidthNs?.physical,
  });
  const parameters: ParameterSet =
    setting.changed === undefined ? cell.parameters : changeSetting(bench, calibration, cell.parameters, setting.changed);
  const basis: readonly BasisCell[] = [{ couponId: plate.id, cellId: cell.id, name: `${plate.code} ${cell.address}` }];
  return { parameters, basis, calibration };
}

/** The first step is the same for every recipe; the product writes it. */
function setUpOf(cast: Cast, { bench, lens, setUp }: RecipeSpec): SetUpStep[] {
  const mounting = cast.benches[bench].mountings[lens];
  const focus = mounting === undefined ? 'focus found' : `focus at ${showNumber(mounting.workingDistanceMm)} mm, ${mounting.focusMethod}`;
  const first = { text: `Lens ${lens} fitted, protective glass clean, extraction on, ${focus}.`, mustTick: true };
  return [
    first,
    ...setUp.map(({ text, caution, mustTick = false }) => ({ text, ...(caution === undefined ? {} : { caution }), mustTick })),
  ];
}

/** What a signature of this revision is bound to. */
export function hashOf(record: DraftRecord): string {
  const { reason, route = 'coupons', grounds, effectiveFrom } = record.spec;
  const bound = boundContent({
    ...record,
    ...{ reason, route, grounds: grounds?.text ?? '', effectiveFrom: dateOf(effectiveFrom) },
    basisCellIds: record.basis.map(({ cellId }) => cellId),
  });
  return contentHash(bound, sha256);
}

const dateOf = (text: string | undefined) => (text === undefined ? null : new Date(text));

function scopeColumns({ thicknessMm, partDiameterMm, featureKind, featureSizeMm, customerSpecification }: RecipeScope) {
  return {
    thicknessFromMm: thicknessMm?.from ?? null,
    thicknessToMm: thicknessMm?.to ?? null,
    partDiameterFromMm: partDiameterMm?.from ?? null,
    partDiameterToMm: partDiameterMm?.to ?? null,
    featureKind: featureKind ?? 'filled-area',
    featureSizeFromMm: featureSizeMm?.from ?? null,
    featureSizeToMm: featureSizeMm?.to ?? null,
    customerSpecification: customerSpecification ?? '',
  };
}
