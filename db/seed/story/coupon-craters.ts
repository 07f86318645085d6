import { schema } from '@proofplate/db';
import { QUANTITIES } from '@proofplate/recipe-model';
import { type Random, seededRandom, seedOf } from '../photos/noise';
import { authored, type Turn } from '../stage/stage';
import { rounded } from './coupon-inspecting';
import type { CraterSpec } from './coupon-specs';
import type { CouponRecord, MarkedCell } from './records';

const { measurement } = schema;

const QUANTITY = 'crater-diameter' as const;
const READ_WITH = { method: 'microscope', instrument: 'Microscope no. 2 (invented)' } as const;
/** Half width of the scatter between rims, um, and what the microscope resolves. */
const SCATTER_UM = 0.5;
const DIGITS = 1;
/** 1 W / 1 kHz is 1 mJ. */
const UJ_PER_MJ = 1000;

/** Invented craters of a Gaussian spot with a little scatter; below the threshold there are none. The same code gives the same craters. */
export async function measureCraters(turn: Turn, { id, code, cells }: CouponRecord, spec: CraterSpec): Promise<void> {
  const random = seededRandom(seedOf(`${code} craters`));
  const rows = cells.map((cell) => ({
    ...{ ...authored(turn), id: turn.newId(), cellId: cell.id, quantity: QUANTITY, value: craterUm(cell, spec, random) },
    ...{ unit: QUANTITIES[QUANTITY].unit, ...READ_WITH, methodDetail: {}, measuredAt: turn.at },
  }));
  await turn.tx.insert(measurement).values(rows);
  const addresses = new Map(cells.map((cell) => [cell.id, cell.address]));
  const after = rows.map(({ shopId: _shop, createdAt: _at, createdBy: _by, cellId, ...each }) => ({
    address: addresses.get(cellId),
    ...each,
  }));
  await turn.tell({ action: 'coupon.cells-measured', subjectType: 'coupon', subjectId: id, subjectCode: code, after });
}

function craterUm({ address, parameters: { values, power } }: MarkedCell, spec: CraterSpec, random: Random): number {
  const frequencyKhz = values.frequencyKhz?.physical;
  if (power.watts === null || frequencyKhz === undefined) throw new RangeError(`${address} has no pulse energy`);
  const energyUj = (UJ_PER_MJ * power.watts) / frequencyKhz;
  const thresholdUj = spec.thresholdUj * (values.passes?.physical ?? 1) ** (spec.incubationCoefficient - 1);
  const scatterUm = SCATTER_UM * (2 * random() - 1);
  if (energyUj <= thresholdUj) return 0;
  return rounded(Math.max(0, spec.spotRadiusUm * Math.sqrt(2 * Math.log(energyUj / thresholdUj)) + scatterUm), DIGITS);
}
