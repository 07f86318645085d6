import { Injectable } from '@nestjs/common';
import type { Caution, CautionScope, CautionSubject, SourceKind } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { type FieldProblem, InvalidError, NotFoundError, StaleError } from '../common/errors/domain-error';
import type { Page } from '../common/pagination/page';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { orderedCautionsForAny } from './caution-order';
import { isAtLeastAsStrict, isAtLeastAsWide, scopeAsStored } from './caution-scope';
import { toCautionDto } from './cautions.mapper';
import { type CautionRow, CautionsRepository, type CautionValues } from './cautions.repository';
import type { CautionDto, CautionsForDto, CautionsForQuery, CreateCautionDto, UpdateCautionDto } from './dto/caution.dto';
import { type GroupedMaterial, MaterialGroupsRepository } from './material-groups.repository';
import { CautionLoosenedError, ForbiddenByCautionError, NotInCatalogueError } from './materials.errors';
import { MaterialsRepository } from './materials.repository';

/** The work in front of somebody, by ids. What is not known yet is absent. */
export type WorkInHand = {
  readonly materialId: string;
  readonly finishId?: string | undefined;
  readonly effectId?: string | undefined;
  readonly sourceKind?: SourceKind | undefined;
  readonly roundPart?: boolean | undefined;
  /** A group whose materials the work covers too. */
  readonly materialGroupId?: string | undefined;
};

@Injectable()
export class CautionsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly cautions: CautionsRepository,
    private readonly materials: MaterialsRepository,
    private readonly groups: MaterialGroupsRepository,
    private readonly ledger: LedgerService,
  ) {}

  /** All cautions of the shop; there are few enough for one page. */
  async list(actor: Actor): Promise<Page<CautionDto>> {
    const rows = await this.unitOfWork.read(actor, (tx) => this.cautions.list(tx, actor.shopId));
    return { items: rows.map((row) => toCautionDto(row, actor)), nextCursor: null };
  }

  async listFor(actor: Actor, { machineId, ...work }: CautionsForQuery): Promise<CautionsForDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      const sourceKind = machineId === undefined ? undefined : await this.sourceKindOf(tx, actor.shopId, machineId);
      const applying = await this.cautionsFor(tx, actor.shopId, { ...work, sourceKind });
      return { isForbidden: applying.some(({ level }) => level === 'never'), items: applying.map((row) => toCautionDto(row, actor)) };
    });
  }

  async create(actor: Actor, dto: CreateCautionDto): Promise<CautionDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const values = {
        level: dto.level,
        subject: dto.subject,
        text: dto.text,
        source: dto.source,
        appliesTo: scopeAsStored(dto.appliesTo),
      };
      await this.refuseUnknownScope(tx, actor.shopId, values.appliesTo);
      const row = await this.cautions.insert(tx, actor.shopId, actor.memberId, values);
      await this.ledger.record(tx, { actor, action: 'caution.added', subjectType: 'caution', subjectId: row.id, after: values });
      return toCautionDto(row, actor);
    });
  }

  /** Changes a caution towards more caution only: care → never, a wider scope; the words only where the shop wrote them. */
  async tighten(actor: Actor, id: string, version: number, dto: UpdateCautionDto): Promise<CautionDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const before = await this.cautions.lockById(tx, actor.shopId, id);
      if (before === undefined) throw new NotInCatalogueError('caution');
      if (before.version !== version) throw new StaleError(toCautionDto(before, actor));
      const values: CautionValues = {
        level: dto.level ?? before.level,
        subject: dto.subject ?? before.subject,
        text: dto.text ?? before.text,
        source: dto.source ?? before.source,
        appliesTo: dto.appliesTo == null ? before.appliesTo : scopeAsStored(dto.appliesTo),
      };
      refuseLoosening(before, values);
      await this.refuseUnknownScope(tx, actor.shopId, values.appliesTo);
      const row = await this.cautions.update(tx, actor.shopId, id, values);
      const entry = { actor, action: 'caution.tightened', subjectType: 'caution', subjectId: id };
      await this.ledger.record(tx, { ...entry, before: valuesOf(before), after: values });
      return toCautionDto(row, actor);
    });
  }

  /** The cautions that stand beside a piece of work, never first. @throws NotFoundError when a named thing is not in the shop */
  async cautionsFor(tx: Tx, shopId: string, work: WorkInHand): Promise<CautionRow[]> {
    const [subject, rows] = [await this.subjectOf(tx, shopId, work), await this.cautions.list(tx, shopId)];
    const covered = work.materialGroupId === undefined ? [] : await this.coveredMaterials(tx, shopId, [work.materialGroupId]);
    const applying = orderedCautionsForAny(subjectsOf(subject, covered), rows);
    return applying.flatMap(({ id }) => rows.filter((row) => row.id === id));
  }

  /**
   * Refuses work that a `never` caution applies to. Planning a coupon, drafting a revision and starting a run call it in their
   * transaction.
   *
   * @throws ForbiddenByCautionError 409 `never-mark` with every such caution, its reason and its source
   */
  async assertMayBeMarked(tx: Tx, shopId: string, work: WorkInHand): Promise<void> {
    const forbidding = (await this.cautionsFor(tx, shopId, work)).filter(({ level }) => level === 'never');
    if (forbidding.length === 0) return;
    const own = await this.cautionsFor(tx, shopId, { ...work, materialGroupId: undefined });
    throw new ForbiddenByCautionError(forbidding, { isOfGroup: own.every(({ level }) => level !== 'never') });
  }

  /** Every caution of the shop as the model holds them, for lists that match many materials at once. */
  async allCautions(tx: Tx, shopId: string): Promise<Caution[]> {
    return this.cautions.list(tx, shopId);
  }

  /** The materials of groups that work covers. */
  async coveredMaterials(tx: Tx, shopId: string, groupIds: readonly string[]): Promise<GroupedMaterial[]> {
    return this.groups.materialsOf(tx, shopId, groupIds);
  }

  private async subjectOf(tx: Tx, shopId: string, work: WorkInHand): Promise<CautionSubject> {
    const { materialId, finishId, effectId, sourceKind, roundPart } = work;
    const material = await this.materials.findById(tx, shopId, materialId);
    if (material === undefined) throw new NotInCatalogueError('material');
    const effectKey = effectId === undefined ? undefined : await this.cautions.findEffectKey(tx, shopId, effectId);
    if (effectId !== undefined && effectKey === undefined) throw new NotInCatalogueError('effect');
    if (finishId !== undefined && (await this.cautions.knownFinishIds(tx, shopId, [finishId])).length === 0)
      throw new NotInCatalogueError('finish');
    return {
      family: material.family,
      materialId,
      ...(finishId === undefined ? {} : { finishId }),
      ...(sourceKind === undefined ? {} : { sourceKind }),
      ...(effectKey === undefined ? {} : { effectKey }),
      ...(roundPart === undefined ? {} : { roundPart }),
    };
  }

  private async sourceKindOf(tx: Tx, shopId: string, machineId: string): Promise<SourceKind> {
    const sourceKind = await this.cautions.findSourceKind(tx, shopId, machineId);
    if (sourceKind === undefined) throw new NotFoundError('This machine is not in the shop, or no longer. Go back to Equipment.');
    return sourceKind;
  }

  private async refuseUnknownScope(tx: Tx, shopId: string, scope: CautionScope): Promise<void> {
    const { materialIds = [], finishIds = [], effectKeys = [] } = scope;
    const known = {
      materialIds: await this.materials.knownIds(tx, shopId, materialIds),
      finishIds: await this.cautions.knownFinishIds(tx, shopId, finishIds),
      effectKeys: await this.cautions.knownEffectKeys(tx, shopId, effectKeys),
    };
    const problems: FieldProblem[] = [
      ...(known.materialIds.length < materialIds.length ? [scopeProblem('materialIds', 'A material of the list is not in the shop.')] : []),
      ...(known.finishIds.length < finishIds.length ? [scopeProblem('finishIds', 'A finish of the list is not in the shop.')] : []),
      ...(known.effectKeys.length < effectKeys.length ? [scopeProblem('effectKeys', 'An effect of the list is not in the shop.')] : []),
    ];
    if (problems.length > 0) throw new InvalidError('What the caution applies to needs another look.', problems);
  }
}

/** The work on its own material, and the same work on each other that it covers. */
export const subjectsOf = (subject: CautionSubject, covered: readonly Pick<GroupedMaterial, 'id' | 'family'>[]): CautionSubject[] => [
  subject,
  ...covered.map(({ id, family }) => ({ ...subject, materialId: id, family })),
];

const scopeProblem = (list: string, detail: string): FieldProblem => ({
  pointer: `#/appliesTo/${list}`,
  detail: `${detail} Choose again.`,
});

const valuesOf = ({ level, subject, text, source, appliesTo }: CautionRow): CautionValues => ({ level, subject, text, source, appliesTo });

function refuseLoosening(before: CautionRow, after: CautionValues): void {
  if (!isAtLeastAsStrict(before.level, after.level))
    throw new CautionLoosenedError('“Never” stays “never”. Nobody can turn it into “take care”.');
  if (!isAtLeastAsWide(before.appliesTo, after.appliesTo))
    throw new CautionLoosenedError('The caution must go on applying to everything that it applies to now. Only add to it.');
  const isReworded = before.subject !== after.subject || before.text !== after.text || before.source !== after.source;
  if (before.shippedKey !== null && isReworded)
    throw new CautionLoosenedError('The words of this caution stay. Add a caution of the shop’s own beside it.');
}
