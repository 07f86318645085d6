import { Injectable } from '@nestjs/common';
import { QUANTITIES } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { type FieldProblem, InvalidError } from '../common/errors/domain-error';
import { UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { toMeasurementDtos } from './coupon-inspection.mapper';
import { type CellStanding, CouponInspectionRepository, type PhotoStanding } from './coupon-inspection.repository';
import { requireOpenForResults } from './coupon-inspection-state';
import { CouponMeasurementsRepository, type NewMeasurement, type StoredMeasurement } from './coupon-measurements.repository';
import { measuredValue, measurementProblems } from './coupon-measurements-rules';
import { CouponsService } from './coupons.service';
import type { AddMeasurementsDto, NewMeasurementDto } from './dto/add-measurements.dto';
import type { SavedMeasurementsDto } from './dto/inspection.dto';

/** Clocks of a tablet and the server differ a little. */
const CLOCK_TOLERANCE_MS = 5 * 60 * 1000;

type Ground = {
  readonly cells: ReadonlyMap<string, CellStanding>;
  readonly earlier: readonly StoredMeasurement[];
  readonly photos: readonly PhotoStanding[];
};

@Injectable()
export class CouponMeasurementsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly coupons: CouponsService,
    private readonly inspection: CouponInspectionRepository,
    private readonly measurements: CouponMeasurementsRepository,
    private readonly ledger: LedgerService,
  ) {}

  /** Adds measurements, all or none. One that supersedes another stands beside it; nothing is overwritten. */
  async add(actor: Actor, couponId: string, { measurements }: AddMeasurementsDto): Promise<SavedMeasurementsDto> {
    refuse(measurements.flatMap((measurement, index) => measurementProblems(measurement, pointerOf(index))));
    return this.unitOfWork.run(actor, async (tx) => {
      const coupon = await this.coupons.lock(tx, actor.shopId, couponId);
      requireOpenForResults(coupon);
      const standings = await this.inspection.cellStandings(tx, actor.shopId, couponId);
      const cells = new Map(standings.map((cell) => [cell.id, cell]));
      const earlier = await this.measurements.ofCoupon(tx, actor.shopId, couponId);
      const photos = await this.inspection.photos(tx, actor.shopId, couponId);
      refuse(measurements.flatMap((measurement, index) => groundProblems(measurement, pointerOf(index), { cells, earlier, photos })));
      refuse(doublySuperseded(measurements));
      const rows = await this.measurements.insert(
        tx,
        measurements.map((measurement) => rowOf(actor, measurement)),
        actor.printedName,
      );
      const subject = { subjectType: 'coupon', subjectId: couponId, subjectCode: coupon.code };
      await this.ledger.record(tx, { actor, action: 'coupon.cells-measured', ...subject, after: rows.map((row) => told(row, cells)) });
      return { measurements: toMeasurementDtos(rows, [...earlier, ...rows]) };
    });
  }
}

const pointerOf = (index: number) => `#/measurements/${index}`;

function refuse(problems: readonly FieldProblem[]): void {
  if (problems.length > 0) throw new InvalidError('Some of the measurements need another look.', problems);
}

function rowOf({ shopId, memberId }: Actor, measurement: NewMeasurementDto): NewMeasurement {
  const { cellId, quantity, grade, method, methodDetail, instrument, photoId, uncertainty, measuredAt, supersedesId, reason } = measurement;
  return {
    ...{ shopId, cellId, quantity, method },
    value: measuredValue(measurement),
    grade: grade ?? null,
    unit: QUANTITIES[quantity].unit,
    methodDetail: { ...methodDetail },
    instrument: instrument ?? '',
    photoId: photoId ?? null,
    uncertainty: uncertainty ?? null,
    ...(measuredAt === undefined ? {} : { measuredAt: new Date(measuredAt) }),
    supersedesId: supersedesId ?? null,
    reason: reason ?? '',
    createdBy: memberId,
  };
}

/** What only the stored coupon can tell. */
function groundProblems(measurement: NewMeasurementDto, pointer: string, { cells, earlier, photos }: Ground): FieldProblem[] {
  const { cellId, quantity, photoId, measuredAt, supersedesId } = measurement;
  const cell = cells.get(cellId);
  const at = (field: string, detail: string): FieldProblem[] => [{ pointer: `${pointer}/${field}`, detail }];
  return [
    ...(cell === undefined ? at('cellId', 'This cell is not on the coupon.') : []),
    ...(cell?.markState === 'skipped'
      ? at('cellId', `${cell.address} was skipped when the plate was marked, so there is nothing to measure.`)
      : []),
    ...(photoId !== undefined && !photos.some(({ id, state }) => id === photoId && state === 'ready')
      ? at('photoId', 'This is not a photo of the coupon that is ready.')
      : []),
    ...(measuredAt !== undefined && new Date(measuredAt).getTime() > Date.now() + CLOCK_TOLERANCE_MS
      ? at('measuredAt', 'This time lies in the future.')
      : []),
    ...(supersedesId === undefined
      ? []
      : supersedingProblem(earlier, { supersedesId, cellId, quantity }).flatMap((text) => at('supersedesId', text))),
  ];
}

function supersedingProblem(
  earlier: readonly StoredMeasurement[],
  { supersedesId, cellId, quantity }: { supersedesId: string; cellId: string; quantity: string },
): string[] {
  const before = earlier.find(({ id }) => id === supersedesId);
  if (before?.cellId !== cellId || before.quantity !== quantity)
    return ['This is not a measurement of the same quantity on the same cell.'];
  const isTaken = earlier.some((row) => row.supersedesId === supersedesId);
  return isTaken ? ['A later measurement took its place already. Supersede that one.'] : [];
}

function doublySuperseded(measurements: readonly NewMeasurementDto[]): FieldProblem[] {
  const seen = new Set<string>();
  return measurements.flatMap(({ supersedesId }, index) => {
    if (supersedesId === undefined) return [];
    const isDouble = seen.has(supersedesId);
    seen.add(supersedesId);
    return isDouble ? [{ pointer: `${pointerOf(index)}/supersedesId`, detail: 'Two measurements cannot take the place of one.' }] : [];
  });
}

function told(row: StoredMeasurement, cells: ReadonlyMap<string, CellStanding>) {
  const {
    id,
    cellId,
    quantity,
    value,
    grade,
    unit,
    method,
    methodDetail,
    instrument,
    photoId,
    uncertainty,
    measuredAt,
    supersedesId,
    reason,
  } = row;
  const address = cells.get(cellId)?.address ?? cellId;
  return {
    id,
    address,
    quantity,
    value,
    grade,
    unit,
    method,
    methodDetail,
    instrument,
    photoId,
    uncertainty,
    measuredAt,
    supersedesId,
    reason,
  };
}
