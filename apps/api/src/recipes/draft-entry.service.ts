import { Injectable } from '@nestjs/common';
import { roleAtLeast } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { type FieldProblem, ForbiddenError, InvalidError, NotFoundError } from '../common/errors/domain-error';
import type { SettingMachine } from '../coupons/coupon-plan-setting';
import type { Tx } from '../database/unit-of-work';
import { CalibrationsService } from '../machines/calibrations.service';
import { MachinesService } from '../machines/machines.service';
import { asMeasured } from './calibration-checks';
import type { RecipeScopeDto } from './dto/scope.dto';
import type { UpdateRevisionDto } from './dto/update-revision.dto';
import { enterSteps, limitsAsStored, rangeProblems, scopeAsStored, setUpStepsAsStored, withPower } from './entered-content';
import type { DraftChange } from './recipe-revisions.repository';
import { RecipesRepository } from './recipes.repository';
import type { RevisionCalibration, StoredRevision } from './stored-revision';

/** Reads what somebody typed into a draft, by the rules of the machine's panel. */
@Injectable()
export class DraftEntryService {
  constructor(
    private readonly recipes: RecipesRepository,
    private readonly machines: MachinesService,
    private readonly calibrations: CalibrationsService,
  ) {}

  /** @throws InvalidError naming every wrong field at once; ForbiddenError where an operator writes a lead's grounds */
  async read(tx: Tx, actor: Actor, draft: StoredRevision, dto: UpdateRevisionDto): Promise<DraftChange> {
    const grounds = groundsOf(actor, draft, dto);
    const calibration = await this.calibrationOf(tx, actor.shopId, draft, dto.calibrationId);
    const machine = await this.machineOf(tx, actor.shopId, draft, calibration.row);
    const entered = dto.steps == null ? undefined : enterSteps(machine, dto.steps);
    const problems = [
      ...(entered?.problems ?? []),
      ...(await this.setUpProblems(tx, actor.shopId, dto)),
      ...rangeProblems({ thicknessMm: dto.limits?.thicknessMm, partDiameterMm: dto.limits?.partDiameterMm }, '#/limits'),
      ...(dto.scope == null ? [] : await this.scopeProblems(tx, actor.shopId, dto.scope)),
      ...dateProblems(dto),
      ...routeProblems(draft, dto),
      ...calibration.problems,
    ];
    if (problems.length > 0)
      throw new InvalidError(
        problems.length === 1 ? 'One field needs another look.' : `${problems.length} fields need another look.`,
        problems,
      );
    const steps = entered?.result ?? (dto.calibrationId === undefined ? draft.content.steps : withPower(machine, draft.content.steps));
    return {
      ...grounds,
      content: {
        steps,
        setUpSteps: dto.setUpSteps == null ? draft.content.setUpSteps : setUpStepsAsStored(dto.setUpSteps),
        limits: dto.limits == null ? draft.content.limits : limitsAsStored(dto.limits),
        scope: dto.scope == null ? draft.content.scope : scopeAsStored(dto.scope),
      },
      ...(dto.calibrationId === undefined ? {} : { calibrationId: dto.calibrationId }),
      ...(dto.reason == null ? {} : { reason: dto.reason }),
      ...(dto.route == null ? {} : { route: dto.route }),
      ...(dto.effectiveFrom === undefined ? {} : { effectiveFrom: dateOf(dto.effectiveFrom) }),
      ...(dto.reviewDue === undefined ? {} : { reviewDue: dateOf(dto.reviewDue) }),
      ...(dto.acknowledgedCautionIds == null ? {} : { acknowledgedCautionIds: [...new Set(dto.acknowledgedCautionIds)] }),
    };
  }

  /** What is wrong with a scope that somebody typed. */
  async scopeProblems(tx: Tx, shopId: string, scope: RecipeScopeDto, pointer = '#/scope'): Promise<FieldProblem[]> {
    const { thicknessMm, partDiameterMm, featureSizeMm, materialGroupId } = scope;
    const isUnknown = materialGroupId != null && !(await this.recipes.isMaterialGroup(tx, shopId, materialGroupId));
    const group = { pointer: `${pointer}/materialGroupId`, detail: 'This group of materials is not in the shop. Choose it again.' };
    return [...rangeProblems({ thicknessMm, partDiameterMm, featureSizeMm }, pointer), ...(isUnknown ? [group] : [])];
  }

  private async machineOf(tx: Tx, shopId: string, draft: StoredRevision, calibration: RevisionCalibration | null): Promise<SettingMachine> {
    const { panel, physical } = await this.machines.getProfile(tx, shopId, draft.profileId);
    return { panel, physical, ...(calibration === null ? {} : { calibration: asMeasured(calibration) }) };
  }

  private async calibrationOf(tx: Tx, shopId: string, draft: StoredRevision, given: string | null | undefined) {
    const id = given === undefined ? draft.calibrationId : given;
    if (id === null) return { row: null, problems: [] };
    const { machineId } = await this.machines.getProfile(tx, shopId, draft.profileId);
    const row = await this.calibrations.getCalibration(tx, shopId, id).catch((error: unknown) => {
      if (error instanceof NotFoundError) return undefined;
      throw error;
    });
    if (row !== undefined && row.machineId === machineId) return { row, problems: [] };
    const detail = 'This calibration is not one of the machine. Choose one of the list.';
    return { row: null, problems: [{ pointer: '#/calibrationId', detail }] };
  }

  private async setUpProblems(tx: Tx, shopId: string, { setUpSteps }: UpdateRevisionDto): Promise<FieldProblem[]> {
    const photoIds = (setUpSteps ?? []).flatMap(({ photoId }) => (photoId == null ? [] : [photoId]));
    const known = await this.recipes.knownPhotoIds(tx, shopId, photoIds);
    return (setUpSteps ?? []).flatMap(({ photoId }, index) =>
      photoId == null || known.includes(photoId)
        ? []
        : [{ pointer: `#/setUpSteps/${index}/photoId`, detail: 'This photo is not in the shop. Choose it again.' }],
    );
  }
}

/** The grounds are a lead's own words; an operator may leave them as they are, not write them. */
function groundsOf(actor: Actor, draft: StoredRevision, { grounds }: UpdateRevisionDto): Pick<DraftChange, 'grounds' | 'groundsBy'> {
  if (grounds == null || grounds === draft.grounds) return {};
  if (!roleAtLeast(actor.role, 'lead'))
    throw new ForbiddenError('The written grounds come from a lead. Ask one to write them in this draft.', {
      errors: [{ pointer: '#/grounds', detail: 'A lead writes the grounds.' }],
    });
  return { grounds, groundsBy: grounds === '' ? null : actor.memberId };
}

/** Where a setting was worked out from another machine's, saying otherwise would spare it the coupon. */
function routeProblems({ route, basedOnId }: StoredRevision, { route: given }: UpdateRevisionDto): FieldProblem[] {
  if (route !== 'transferred' || basedOnId === null || given == null || given === 'transferred' || given === 'coupons') return [];
  return [{ pointer: '#/route', detail: 'It was transferred from another machine, and stays so until cells of a coupon are its basis.' }];
}

function dateProblems({ effectiveFrom, reviewDue }: UpdateRevisionDto): FieldProblem[] {
  const isPast = (text: string | null | undefined) => text != null && new Date(text).getTime() <= Date.now();
  const isBefore = effectiveFrom != null && reviewDue != null && new Date(reviewDue) <= new Date(effectiveFrom);
  return [
    ...(isPast(effectiveFrom)
      ? [{ pointer: '#/effectiveFrom', detail: 'This day is past. Leave it out: the revision takes effect with its approval.' }]
      : []),
    ...(isPast(reviewDue) ? [{ pointer: '#/reviewDue', detail: 'Choose a day to come.' }] : []),
    ...(isBefore ? [{ pointer: '#/reviewDue', detail: 'The review comes after the day when it takes effect.' }] : []),
  ];
}

const dateOf = (text: string | null) => (text === null ? null : new Date(text));
