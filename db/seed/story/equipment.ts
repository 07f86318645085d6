import { schema } from '@proofplate/db';
import { and, eq } from 'drizzle-orm';
import { authored, inTurn, minutesAfter, type Stage, type Turn } from '../stage/stage';
import { BENCH_SPECS, type BenchSpec, LENS_SPECS, mountingsOf } from './bench-specs';
import type { Bench, BenchKey, Calibration, Cast, Lens, LensKey, People } from './cast';
import { PUBLISHED_PANEL } from './published-panel';
import { teller } from './shop';

const { lens, machine, machineLens, machineProfile, powerCalibration, spotMeasurement } = schema;

const SET_UP = new Date('2026-01-12T09:00:00Z');
const RELABELLED = new Date('2026-01-14T10:00:00Z');
const PUBLISHED_ENTERED = new Date('2026-01-15T11:00:00Z');

type Placed = { readonly id: string; readonly profileId: string };

export async function setUpEquipment(stage: Stage, people: People): Promise<Pick<Cast, 'lenses' | 'benches' | 'unstatedBench'>> {
  const by = teller(people.lead);
  const lenses = await bringLenses(stage, people);
  const placing = (key: BenchKey, minutes: number) =>
    inTurn(stage, { at: minutesAfter(SET_UP, minutes), by }, (turn) => placeBench(turn, BENCH_SPECS[key], lenses));
  const first = await placing('bench 1', 30);
  const second = await placing('bench 2', 60);
  const third = await placing('bench 3', 90);
  const relabelled = await inTurn(stage, { at: RELABELLED, by }, (turn) => relabel(turn, BENCH_SPECS['bench 2'], second));
  const unstatedBench = await inTurn(stage, { at: PUBLISHED_ENTERED, by }, placeUnstatedBench);
  const benches = {
    'bench 1': benchOf(stage, 'bench 1', first),
    'bench 2': benchOf(stage, 'bench 2', relabelled),
    'bench 3': benchOf(stage, 'bench 3', third),
  };
  return { lenses, benches, unstatedBench };
}

/** Their ids are known before the day on which they are measured. */
function benchOf(stage: Stage, key: BenchKey, { id, profileId }: Placed): Bench {
  const { name, physical, panel, mountings, calibrations } = BENCH_SPECS[key];
  return {
    ...{ id, profileId, name, physical, panel, mountings, sourceKind: physical.sourceKind },
    calibrations: calibrations.map((spec): Calibration => {
      const { frequencyKhz, pulseWidthNs } = spec;
      const points = spec.points.map(([percent, powerW]) => ({ percent, powerW }));
      const at = new Date(spec.at);
      return {
        id: stage.newId(at),
        at,
        measuredOn: spec.at.slice(0, 10),
        meter: spec.meter,
        meterDueOn: spec.meterDueOn,
        points,
        frequencyKhz,
        pulseWidthNs,
      };
    }),
  };
}

/** A reading of the power meter on its day. */
export async function measurePower(turn: Turn, { id: machineId, physical }: Bench, calibration: Calibration): Promise<void> {
  const { id, measuredOn, meter, meterDueOn, frequencyKhz, pulseWidthNs, points } = calibration;
  const values = {
    ...{ machineId, measuredOn, meter, meterDueOn, wavelengthNm: physical.wavelengthNm, frequencyKhz, pulseWidthNs },
    points: points.map(({ percent, powerW }) => ({ percent, watts: powerW })),
    notes: 'Invented reading of the demo shop.',
  };
  await turn.tx.insert(powerCalibration).values({ ...authored(turn), id, ...values });
  await turn.tell({ action: 'power-calibration.added', subjectType: 'power-calibration', subjectId: id, after: values });
}

function bringLenses(stage: Stage, people: People): Promise<Record<LensKey, Lens>> {
  return inTurn(stage, { at: SET_UP, by: teller(people.lead) }, async (turn) => {
    const bring = async (name: LensKey): Promise<Lens> => {
      const id = turn.newId();
      await turn.tx.insert(lens).values({ ...authored(turn), id, name, ...LENS_SPECS[name] });
      await turn.tell({ action: 'lens.created', subjectType: 'lens', subjectId: id, after: { name, ...LENS_SPECS[name] } });
      return { id, name };
    };
    return { F160: await bring('F160'), F200: await bring('F200'), F254: await bring('F254') };
  });
}

async function placeBench(turn: Turn, spec: BenchSpec, lenses: Readonly<Record<LensKey, Lens>>): Promise<Placed> {
  const { name, serialNumber, warmUpMinutes, physical, panel } = spec;
  const { sourceKind } = physical;
  const values = { name, serialNumber, warmUpMinutes, mountedLensId: lenses[spec.mounted].id, sourceKind, profileNumber: 1 };
  const placed = { id: turn.newId(), profileId: turn.newId() };
  await turn.tx.insert(machine).values({ ...authored(turn), id: placed.id, ...values });
  const profile = { machineId: placed.id, number: 1, physicalNumber: 1, sourceKind, physical: { ...physical }, panel: { ...panel } };
  await turn.tx.insert(machineProfile).values({ ...authored(turn), id: placed.profileId, ...profile });
  await turn.tell({ action: 'machine.created', subjectType: 'machine', subjectId: placed.id, after: { ...values, physical, panel } });
  for (const [lensKey, { workingDistanceMm, focusMethod, spot }] of mountingsOf(spec)) {
    const pair = {
      ...{ machineId: placed.id, lensId: lenses[lensKey].id, workingDistanceMm, focusMethod },
      ...{ measuredSpotUm: spot?.um ?? null, spotMethod: spot?.method ?? null, spotMeasuredOn: spot?.on ?? null },
    };
    const id = turn.newId();
    await turn.tx.insert(machineLens).values({ ...authored(turn), id, ...pair });
    if (spot !== undefined) {
      const measured = { machineLensId: id, spotUm: spot.um, method: spot.method, measuredOn: spot.on };
      await turn.tx.insert(spotMeasurement).values({ ...authored(turn), id: turn.newId(), ...measured });
    }
    await turn.tell({ action: 'machine-lens.added', subjectType: 'machine-lens', subjectId: id, after: pair });
  }
  return placed;
}

/** A second profile that only shows a panel in a better order: it does not touch what was proved. */
async function relabel(turn: Turn, { physical, panel, name, serialNumber }: BenchSpec, { id }: Placed): Promise<Placed> {
  const profileId = turn.newId();
  const profile = {
    machineId: id,
    number: 2,
    physicalNumber: 1,
    sourceKind: physical.sourceKind,
    physical: { ...physical },
    panel: { ...panel },
  };
  await turn.tx.insert(machineProfile).values({ ...authored(turn), id: profileId, ...profile });
  await turn.tx
    .update(machine)
    .set({ profileNumber: 2, version: 2 })
    .where(and(eq(machine.shopId, turn.shopId), eq(machine.id, id)));
  const told = { name, serialNumber, physicalNumber: 1, physical, panel };
  const entry = { action: 'machine.changed', subjectType: 'machine', subjectId: id };
  await turn.tell({ ...entry, before: { ...told, profileNumber: 1 }, after: { ...told, profileNumber: 2 } });
  return { id, profileId };
}

/** Out of use from the first day: it only carries a table from elsewhere, whose machine nobody names. Its numbers are placeholders. */
async function placeUnstatedBench(turn: Turn): Promise<Placed> {
  const placed = { id: turn.newId(), profileId: turn.newId() };
  const sourceKind = 'fibre-q-switched';
  const values = {
    name: 'Not stated (published table)',
    serialNumber: 'none: placeholder',
    warmUpMinutes: 0,
    sourceKind,
    profileNumber: 1,
  };
  await turn.tx.insert(machine).values({ ...authored(turn), id: placed.id, ...values, archivedAt: turn.at });
  const physical = { sourceKind, wavelengthNm: 1064, ratedPowerW: 1 };
  const panel = { fields: PUBLISHED_PANEL.fields.map((field) => ({ ...field })) };
  const profile = { machineId: placed.id, number: 1, physicalNumber: 1, sourceKind, physical, panel };
  await turn.tx.insert(machineProfile).values({ ...authored(turn), id: placed.profileId, ...profile });
  await turn.tell({ action: 'machine.created', subjectType: 'machine', subjectId: placed.id, after: { ...values, physical, panel } });
  await turn.tell({ action: 'machine.archived', subjectType: 'machine', subjectId: placed.id });
  return placed;
}
