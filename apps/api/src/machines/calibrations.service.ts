import { Injectable } from '@nestjs/common';
import { powerAtPercent, powerCalibration } from '@proofplate/physics';
import type { Actor } from '../common/actor';
import { InvalidError, NotFoundError } from '../common/errors/domain-error';
import { decodeCursor, type Page, pageOf } from '../common/pagination/page';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { ShopsService } from '../shops/shops.service';
import { pointProblems, type ReadingPoint } from './calibration-points';
import { toCalibrationDto } from './calibrations.mapper';
import { type CalibrationRow, CalibrationsRepository, type CalibrationValues, type CalibrationView } from './calibrations.repository';
import type { CalibrationDto, CalibrationWattsDto, CreateCalibrationDto, ListCalibrationsQuery } from './dto/calibration.dto';
import { MachineArchivedError } from './machines.errors';
import { MachinesService } from './machines.service';

const METHOD = 'monotone piecewise cubic through the readings (Fritsch and Butland 1984), nothing beyond them';

/** Dated percent → watt tables. They are never changed: a new reading is a new table. */
@Injectable()
export class CalibrationsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly machines: MachinesService,
    private readonly calibrations: CalibrationsRepository,
    private readonly shops: ShopsService,
    private readonly ledger: LedgerService,
  ) {}

  async list(actor: Actor, machineId: string, query: ListCalibrationsQuery): Promise<Page<CalibrationDto>> {
    const [measuredOn, id] = decodeCursor(query.cursor, ['day', 'id']) ?? [];
    const before = measuredOn === undefined ? {} : { before: { measuredOn: String(measuredOn), id: String(id) } };
    return this.unitOfWork.read(actor, async (tx) => {
      await this.machines.getMachineWithProfile(tx, actor.shopId, machineId);
      const views = await this.calibrations.list(tx, actor.shopId, machineId, { limit: query.limit + 1, ...before });
      return pageOf(views, query.limit, {
        item: toCalibrationDto,
        cursor: ({ calibration }) => [calibration.measuredOn, calibration.id],
      });
    });
  }

  async create(actor: Actor, machineId: string, dto: CreateCalibrationDto): Promise<CalibrationDto> {
    const problems = pointProblems(dto.points);
    if (problems.length > 0) throw new InvalidError('The readings do not make a curve.', problems);
    return this.unitOfWork.run(actor, async (tx) => {
      const { machine } = await this.machines.getMachineWithProfile(tx, actor.shopId, machineId);
      if (machine.archivedAt !== null) throw new MachineArchivedError();
      if (dto.measuredOn > (await this.shops.today(tx, actor.shopId))) throw measuredLater();
      const values = valuesOf(machineId, dto);
      const id = await this.calibrations.insert(tx, actor.shopId, actor.memberId, values);
      const entry = { actor, action: 'power-calibration.added', subjectType: 'power-calibration', subjectId: id };
      await this.ledger.record(tx, { ...entry, after: values });
      return toCalibrationDto(await this.getView(tx, actor.shopId, id));
    });
  }

  /** Watts at a percentage of one calibration; no number outside its readings. */
  async watts(actor: Actor, machineId: string, calibrationId: string, percent: number): Promise<CalibrationWattsDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      const calibration = await this.getCalibration(tx, actor.shopId, calibrationId);
      if (calibration.machineId !== machineId) throw new NotFoundError('This calibration belongs to another machine.');
      return wattsAt(calibration.points, percent);
    });
  }

  /** A calibration, for other modules' use cases. @throws NotFoundError also for another shop's calibration */
  async getCalibration(tx: Tx, shopId: string, calibrationId: string): Promise<CalibrationRow> {
    return (await this.getView(tx, shopId, calibrationId)).calibration;
  }

  /** The machine's newest calibration; undefined when nobody has measured yet. */
  async findNewest(tx: Tx, shopId: string, machineId: string): Promise<CalibrationRow | undefined> {
    const [view] = await this.calibrations.list(tx, shopId, machineId, { limit: 1 });
    return view?.calibration;
  }

  /** Every reading of these machines, newest first: a shop reads a meter some times a year. */
  async readingsOf(tx: Tx, shopId: string, machineIds: readonly string[]): Promise<CalibrationRow[]> {
    return this.calibrations.ofMachines(tx, shopId, machineIds);
  }

  private async getView(tx: Tx, shopId: string, id: string): Promise<CalibrationView> {
    const view = await this.calibrations.find(tx, shopId, id);
    if (view === undefined) throw new NotFoundError('This calibration is not in the shop. Go back to the machine.');
    return view;
  }
}

/** A reading of a later day would stay the newest, and fresh, until then. */
const measuredLater = () =>
  new InvalidError('One field needs another look.', [
    { pointer: '#/measuredOn', detail: 'This day is still to come. Enter the day on which the meter was read.' },
  ]);

function valuesOf(machineId: string, dto: CreateCalibrationDto): CalibrationValues {
  return {
    machineId,
    measuredOn: dto.measuredOn,
    meter: dto.meter,
    meterDueOn: dto.meterDueOn ?? null,
    wavelengthNm: dto.wavelengthNm,
    frequencyKhz: dto.frequencyKhz ?? null,
    pulseWidthNs: dto.pulseWidthNs ?? null,
    points: dto.points.map(({ percent, watts }) => ({ percent, watts })),
    notes: dto.notes ?? '',
  };
}

function wattsAt(points: readonly ReadingPoint[], percent: number): CalibrationWattsDto {
  const [first] = points;
  const last = points.at(-1);
  if (first === undefined || last === undefined || percent < first.percent || percent > last.percent) {
    const range = `${first?.percent ?? 0} to ${last?.percent ?? 0} %`;
    return { percent, watts: null, reason: `The readings reach from ${range}; nothing is guessed beyond them.`, method: null };
  }
  const curve = powerCalibration(points.map((point) => ({ percent: point.percent, powerW: point.watts })));
  return { percent, watts: powerAtPercent(curve, percent), reason: null, method: METHOD };
}
