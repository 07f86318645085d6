import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { ConflictError, type FieldProblem, InvalidError, NotFoundError, StaleError } from '../common/errors/domain-error';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import type { CreateMachineLensDto, MachineLensDto, MachineLensListDto, UpdateMachineLensDto } from './dto/machine-lens.dto';
import type { SpotMeasurementListDto } from './dto/spot-measurement.dto';
import { toMachineLensDto, toSpotMeasurementDtos } from './machine-lenses.mapper';
import {
  MachineLensesRepository,
  type MachineLensRow,
  type MachineLensValues,
  type MachineLensView,
  NOTHING_KNOWN,
} from './machine-lenses.repository';
import { MachineArchivedError } from './machines.errors';
import { MachinesService } from './machines.service';
import { type MeasuredSpot, SpotMeasurementsRepository } from './spot-measurements.repository';

type PairIds = { readonly machineId: string; readonly lensId: string };

/** Lenses on a machine: working distance, how focus is found, the spot where somebody measured one. */
@Injectable()
export class MachineLensesService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly machines: MachinesService,
    private readonly pairs: MachineLensesRepository,
    private readonly spots: SpotMeasurementsRepository,
    private readonly ledger: LedgerService,
  ) {}

  async list(actor: Actor, machineId: string): Promise<MachineLensListDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      await this.machines.getMachineWithProfile(tx, actor.shopId, machineId);
      const views = await this.pairs.list(tx, actor.shopId, machineId);
      return { items: views.map((view) => toMachineLensDto(view, actor)), nextCursor: null };
    });
  }

  async add(actor: Actor, machineId: string, { lensId, ...dto }: CreateMachineLensDto): Promise<MachineLensDto> {
    const values = { ...NOTHING_KNOWN, ...givenOnly(dto) };
    refuseIncompleteSpot(values);
    return this.unitOfWork.run(actor, async (tx) => {
      const { machine } = await this.machines.getMachineWithProfile(tx, actor.shopId, machineId);
      if (machine.archivedAt !== null) throw new MachineArchivedError();
      if (!(await this.pairs.isLensInUse(tx, actor.shopId, lensId)))
        throw new InvalidError('One field needs another look.', [
          { pointer: '#/lensId', detail: 'This lens is not in use in the shop. Choose another one.' },
        ]);
      if ((await this.pairs.find(tx, actor.shopId, machineId, lensId)) !== undefined)
        throw new ConflictError('This lens is on the machine already. Change its entry instead.');
      const id = await this.pairs.insert(tx, actor.shopId, actor.memberId, { machineId, lensId, ...values });
      const entry = { actor, action: 'machine-lens.added', subjectType: 'machine-lens', subjectId: id };
      await this.keepTypedSpot(tx, actor, id, values);
      await this.ledger.record(tx, { ...entry, after: { machineId, lensId, ...values } });
      return toMachineLensDto(await this.getMachineLens(tx, actor.shopId, machineId, lensId), actor);
    });
  }

  async update(actor: Actor, { machineId, lensId }: PairIds, version: number, dto: UpdateMachineLensDto): Promise<MachineLensDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const row = await this.lockVersion(tx, actor, { machineId, lensId }, version);
      const values = { ...valuesOf(row), ...givenOnly(dto) };
      refuseIncompleteSpot(values);
      await this.pairs.update(tx, actor.shopId, row.id, values);
      if (isOtherSpot(row, values)) await this.keepTypedSpot(tx, actor, row.id, values);
      const entry = { actor, action: 'machine-lens.changed', subjectType: 'machine-lens', subjectId: row.id };
      await this.ledger.record(tx, { ...entry, before: valuesOf(row), after: values });
      return toMachineLensDto(await this.getMachineLens(tx, actor.shopId, machineId, lensId), actor);
    });
  }

  /** Every spot that was measured of the lens on the machine, newest first. */
  async listSpots(actor: Actor, { machineId, lensId }: PairIds): Promise<SpotMeasurementListDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      const { pair } = await this.getMachineLens(tx, actor.shopId, machineId, lensId);
      return { items: toSpotMeasurementDtos(await this.spots.list(tx, actor.shopId, pair.id), pair), nextCursor: null };
    });
  }

  /**
   * Makes a measurement the spot in use, for another module's use case. Working distance and focus method stay.
   *
   * @throws StaleError when somebody changed the lens on the machine since `version`
   */
  async recordSpot(tx: Tx, actor: Actor, pair: PairIds & { readonly version: number }, measured: MeasuredSpot): Promise<void> {
    const row = await this.lockVersion(tx, actor, pair, pair.version);
    const { spotUm: measuredSpotUm, method: spotMethod, measuredOn: spotMeasuredOn, standardErrorUm, fromCraters } = measured;
    const values = { ...valuesOf(row), measuredSpotUm, spotMethod, spotMeasuredOn };
    await this.pairs.update(tx, actor.shopId, row.id, values);
    await this.spots.insert(tx, { shopId: actor.shopId, machineLensId: row.id, createdBy: actor.memberId }, measured);
    const entry = { actor, action: 'machine-lens.spot-measured', subjectType: 'machine-lens', subjectId: row.id };
    const told = fromCraters === null ? {} : { coupon: fromCraters.couponCode, fit: fromCraters.fit };
    await this.ledger.record(tx, { ...entry, before: valuesOf(row), after: { ...values, standardErrorUm, ...told } });
  }

  /** A lens on a machine, for other modules' use cases. @throws NotFoundError when the lens is not on that machine */
  async getMachineLens(tx: Tx, shopId: string, machineId: string, lensId: string): Promise<MachineLensView> {
    const view = await this.pairs.find(tx, shopId, machineId, lensId);
    if (view === undefined) throw new NotFoundError('This lens is not on this machine. Add it on the machine’s page first.');
    return view;
  }

  private async lockVersion(tx: Tx, actor: Actor, { machineId, lensId }: PairIds, version: number): Promise<MachineLensRow> {
    const row = await this.pairs.lock(tx, actor.shopId, machineId, lensId);
    const present = await this.getMachineLens(tx, actor.shopId, machineId, lensId);
    if (row?.version !== version) throw new StaleError(toMachineLensDto(present, actor));
    return row;
  }

  /** A spot that is typed enters the history too; one that is only forgotten leaves it as it is. */
  private async keepTypedSpot(tx: Tx, { shopId, memberId }: Actor, machineLensId: string, values: MachineLensValues): Promise<void> {
    const { measuredSpotUm: spotUm, spotMethod: method, spotMeasuredOn: measuredOn } = values;
    if (spotUm === null || method === null || measuredOn === null) return;
    const measured = { spotUm, method, measuredOn, standardErrorUm: null, fromCraters: null };
    await this.spots.insert(tx, { shopId, machineLensId, createdBy: memberId }, measured);
  }
}

const valuesOf = (row: MachineLensRow): MachineLensValues => {
  const { workingDistanceMm, focusMethod, measuredSpotUm, spotMethod, spotMeasuredOn } = row;
  return { workingDistanceMm, focusMethod, measuredSpotUm, spotMethod, spotMeasuredOn };
};

const isOtherSpot = (one: MachineLensValues, other: MachineLensValues): boolean =>
  one.measuredSpotUm !== other.measuredSpotUm || one.spotMethod !== other.spotMethod || one.spotMeasuredOn !== other.spotMeasuredOn;

function givenOnly(dto: UpdateMachineLensDto): Partial<MachineLensValues> {
  return {
    ...(dto.workingDistanceMm === undefined ? {} : { workingDistanceMm: dto.workingDistanceMm }),
    ...(dto.focusMethod == null ? {} : { focusMethod: dto.focusMethod }),
    ...(dto.measuredSpotUm === undefined ? {} : { measuredSpotUm: dto.measuredSpotUm }),
    ...(dto.spotMethod === undefined ? {} : { spotMethod: dto.spotMethod === '' ? null : dto.spotMethod }),
    ...(dto.spotMeasuredOn === undefined ? {} : { spotMeasuredOn: dto.spotMeasuredOn }),
  };
}

/** A measured spot is only as good as its method and day: the three belong together. */
function refuseIncompleteSpot({ measuredSpotUm, spotMethod, spotMeasuredOn }: MachineLensValues): void {
  const problems: FieldProblem[] = [];
  const isMeasured = measuredSpotUm !== null;
  if (isMeasured && spotMethod === null) problems.push({ pointer: '#/spotMethod', detail: 'Say how the spot was measured.' });
  if (isMeasured && spotMeasuredOn === null)
    problems.push({ pointer: '#/spotMeasuredOn', detail: 'Say on which day the spot was measured.' });
  if (!isMeasured && (spotMethod !== null || spotMeasuredOn !== null))
    problems.push({ pointer: '#/measuredSpotUm', detail: 'Enter the measured spot, or clear its method and day.' });
  if (problems.length > 0) throw new InvalidError('The measured spot, its method and its day belong together.', problems);
}
