import type { CouponDto } from '../../src/coupons/dto/coupon.dto';
import type { MachineDto } from '../../src/machines/dto/machine.dto';
import type { MaterialDto } from '../../src/materials/dto/material.dto';
import type { TestApp } from './app';
import { created, effectByKey, fillStarterContent, makeFinish, makeLens, makeMachine, makeMaterial } from './equipment';
import { makeStaffedShop } from './factories';

type Given = Readonly<Record<string, unknown>>;

/** A machine whose panel and scan head are described well enough for every number of a plan. */
export const PLANNING_MACHINE = {
  physical: {
    sourceKind: 'fibre-mopa',
    wavelengthNm: 1064,
    ratedPowerW: 20,
    m2: 1.5,
    beamDiameterMm: 7,
    frequencyRangeKhz: { from: 1, to: 1000 },
    maxPulseEnergyMj: [{ pulseWidthNs: 30, energyMj: 0.4 }],
    topSpeedMmPerS: 7000,
    jumpSpeedMmPerS: 5000,
    jumpSettleMs: 0.5,
    laserOnDelayUs: 100,
    laserOffDelayUs: 200,
  },
  panel: {
    fields: [
      { parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero', minimum: 0, maximum: 100, step: 1 },
      { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', minimum: 1, maximum: 7000, step: 10 },
      { parameter: 'frequencyKhz', label: 'Frequency', unit: 'kHz', minimum: 1, maximum: 1000, step: 1 },
      { parameter: 'pulseWidthNs', label: 'Pulse width', unit: 'ns', choices: [4, 30, 100, 200] },
      { parameter: 'lineSpacingUm', label: 'Line spacing', unit: 'mm', minimum: 0.001, maximum: 1, step: 0.001 },
      { parameter: 'passes', label: 'Passes', unit: 'count', minimum: 1, maximum: 99 },
    ],
  },
};

export type PlanningShop = Awaited<ReturnType<typeof makePlanningShop>>;

/** A staffed shop in which a coupon can be planned: machine with a lens, material, finish, effect, cautions. */
export async function makePlanningShop(test: TestApp) {
  const people = await makeStaffedShop(test);
  await fillStarterContent(test, people.owner);
  const machine = await makeMachine(test, people.lead, PLANNING_MACHINE);
  const lens = await makeLens(test, people.lead, { name: 'F160', focalLengthMm: 160, fieldSizeMm: 110 });
  await created(test, people.lead, `/api/machines/${machine.id}/lenses`, { lensId: lens.id });
  const material = await makeMaterial(test, people.lead, { family: 'titanium' });
  const finish = await makeFinish(test, people.lead);
  const effect = await effectByKey(test, people.lead, 'colour-anneal');
  const keys = { machineId: machine.id, lensId: lens.id, materialId: material.id, finishId: finish.id, effectId: effect.id };
  return { ...people, machine, lens, material, finish, effect, keys };
}

export const typed = (value: number, unit: string) => ({ value, unit });

/** Eight speeds by equal ratios down, ten powers by equal steps across: the plate of the design's picture. */
export const planBody = (shop: Pick<PlanningShop, 'keys'>, given: Given = {}) => ({
  ...shop.keys,
  rows: { parameter: 'speedMmPerS', from: 100, to: 1000, count: 8, spacing: 'ratios' },
  columns: { parameter: 'powerPercent', from: 15, to: 60, count: 10, spacing: 'steps' },
  base: {
    values: {
      frequencyKhz: typed(400, 'kHz'),
      pulseWidthNs: typed(30, 'ns'),
      lineSpacingUm: typed(0.012, 'mm'),
      passes: typed(1, 'count'),
    },
    fill: 'both directions',
    assist: 'none',
  },
  labelStep: {
    values: {
      powerPercent: typed(30, 'percentFromZero'),
      speedMmPerS: typed(500, 'mm/s'),
      frequencyKhz: typed(400, 'kHz'),
      pulseWidthNs: typed(30, 'ns'),
      lineSpacingUm: typed(0.03, 'mm'),
      passes: typed(1, 'count'),
    },
    fill: 'both directions',
    assist: 'none',
  },
  runOrderSeed: 7,
  cellMm: 5,
  gapMm: 1.2,
  fillDrawnBy: 'machine',
  ...given,
});

/** Two speeds by two powers: enough for most tests. */
export const smallPlan = (shop: Pick<PlanningShop, 'keys'>, given: Given = {}) =>
  planBody(shop, {
    rows: { parameter: 'speedMmPerS', from: 200, to: 400, count: 2, spacing: 'steps' },
    columns: { parameter: 'powerPercent', from: 20, to: 40, count: 2, spacing: 'steps' },
    ...given,
  });

export const makeCoupon = (test: TestApp, shop: PlanningShop, given: Given = {}) =>
  created<CouponDto>(test, shop.operator, '/api/coupons', smallPlan(shop, given));

export type { CouponDto, MachineDto, MaterialDto };
