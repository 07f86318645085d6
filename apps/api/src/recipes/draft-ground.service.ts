import { Injectable } from '@nestjs/common';
import { type FieldProblem, InvalidError } from '../common/errors/domain-error';
import type { Tx } from '../database/unit-of-work';
import { CalibrationsService } from '../machines/calibrations.service';
import { MachinesService } from '../machines/machines.service';
import { CautionsService } from '../materials/cautions.service';
import { type KeyNames, type Mounting, RecipesRepository } from './recipes.repository';
import type { KeyIds, RevisionCalibration } from './stored-revision';

export type DraftGround = {
  readonly names: KeyNames;
  readonly effectKey: string;
  readonly mounting: Mounting;
  /** The machine's newest reading. */
  readonly calibration: RevisionCalibration | undefined;
};

const WHAT: Readonly<Record<keyof KeyIds, string>> = {
  materialId: 'material',
  finishId: 'finish',
  effectId: 'effect',
  machineId: 'machine',
  lensId: 'lens',
};

/** What a draft stands on: five things of the shop, nothing that forbids the work, a lens that is used on the machine. */
@Injectable()
export class DraftGroundService {
  constructor(
    private readonly recipes: RecipesRepository,
    private readonly machines: MachinesService,
    private readonly calibrations: CalibrationsService,
    private readonly cautions: CautionsService,
  ) {}

  /**
   * @throws InvalidError for a thing that is not in use in the shop
   * @throws ForbiddenByCautionError 409 `never-mark` with the source
   */
  async read(tx: Tx, shopId: string, keys: KeyIds): Promise<DraftGround> {
    const found = await this.recipes.namesOf(tx, shopId, keys);
    const { names, problems } = usableNames(found);
    if (names === undefined) throw notInUse(problems);
    const { materialId, finishId, effectId, machineId, lensId } = keys;
    const { profile } = await this.machines.getMachineWithProfile(tx, shopId, machineId);
    await this.cautions.assertMayBeMarked(tx, shopId, { materialId, finishId, effectId, sourceKind: profile.sourceKind });
    const mounting = await this.recipes.findMounting(tx, shopId, { machineId, lensId });
    if (mounting === undefined) {
      throw notInUse([{ pointer: '#/lensId', detail: `${names.lensId} is not used on ${names.machineId}. Add it to the machine first.` }]);
    }
    const calibration = await this.calibrations.findNewest(tx, shopId, machineId);
    return { names, effectKey: found.effectId?.key ?? '', mounting, calibration };
  }
}

const notInUse = (problems: readonly FieldProblem[]) =>
  new InvalidError(problems.length === 1 ? 'One field needs another look.' : `${problems.length} fields need another look.`, problems);

type Found = Awaited<ReturnType<RecipesRepository['namesOf']>>;

function usableNames(found: Found): { names: KeyNames | undefined; problems: FieldProblem[] } {
  const { materialId, finishId, effectId, machineId, lensId } = found;
  const problems = Object.entries(WHAT).flatMap(([key, what]) => {
    // the entries are exactly those of the names
    const row = found[key as keyof KeyIds];
    if (row === undefined) return [{ pointer: `#/${key}`, detail: `This ${what} is not in the shop. Choose it again.` }];
    return row.archivedAt === null
      ? []
      : [{ pointer: `#/${key}`, detail: `${row.name} is archived. Choose another ${what}, or restore it.` }];
  });
  if (problems.length > 0 || !materialId || !finishId || !effectId || !machineId || !lensId) return { names: undefined, problems };
  const names = {
    materialId: materialId.name,
    finishId: finishId.name,
    effectId: effectId.name,
    machineId: machineId.name,
    lensId: lensId.name,
  };
  return { names, problems };
}
