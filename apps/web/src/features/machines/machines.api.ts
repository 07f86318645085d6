import type { components } from '@proofplate/api-client';
import type { Panel, PhysicalProfile, SourceKind } from '@proofplate/recipe-model';
import type { SWRResponse } from 'swr';
import { type ProblemError, request } from '../../lib/api';
import { revalidate, useRead } from '../../lib/swr';

export type MachineProfile = {
  id: string;
  number: number;
  physicalNumber: number;
  physical: PhysicalProfile;
  panel: Panel;
  createdAt: string;
  createdByName: string;
};

export type Machine = {
  id: string;
  name: string;
  sourceKind: SourceKind;
  serialNumber: string;
  warmUpMinutes: number;
  mountedLens: { id: string; name: string } | null;
  profile: MachineProfile;
  latestCalibrationOn: string | null;
  archivedAt: string | null;
  version: number;
  allowedActions: readonly string[];
};

export type MachineLens = {
  id: string;
  machineId: string;
  lensId: string;
  lensName: string;
  focalLengthMm: number;
  fieldSizeMm: number;
  workingDistanceMm: number | null;
  focusMethod: string;
  measuredSpotUm: number | null;
  spotMethod: string | null;
  spotMeasuredOn: string | null;
  isMounted: boolean;
  version: number;
  allowedActions: readonly string[];
};

export type SpotMeasurement = components['schemas']['SpotMeasurementDto'];

export type ReadingPoint = { percent: number; watts: number };
export type Calibration = {
  id: string;
  machineId: string;
  measuredOn: string;
  meter: string;
  meterDueOn: string | null;
  wavelengthNm: number;
  frequencyKhz: number | null;
  pulseWidthNs: number | null;
  points: readonly ReadingPoint[];
  notes: string;
  createdAt: string;
  createdByName: string;
};

/** A lens to choose from; the route hands them in, lenses are a domain of their own. */
export type LensChoice = { id: string; name: string };
export type MachineBody = {
  name: string;
  serialNumber: string;
  warmUpMinutes: number;
  mountedLensId: string | null;
  physical: PhysicalProfile;
  panel: Panel;
};
export type MachineLensBody = Partial<
  Pick<MachineLens, 'workingDistanceMm' | 'focusMethod' | 'measuredSpotUm' | 'spotMethod' | 'spotMeasuredOn'>
>;
export type CalibrationBody = Omit<Calibration, 'id' | 'machineId' | 'createdAt' | 'createdByName'>;

type Page<T> = { items: readonly T[]; nextCursor: string | null };

const MACHINES = '/api/machines';
const MOST_AT_ONCE = 100;
const one = (id: string) => `${MACHINES}/${encodeURIComponent(id)}`;

// A form must start from the version it shows, so what is edited is not read again in the background.
const FOR_EDITING = { revalidateOnFocus: false, revalidateOnReconnect: false } as const;

export function useMachines(isArchived = false): SWRResponse<Page<Machine>, ProblemError> {
  return useRead<Page<Machine>>(MACHINES, { limit: MOST_AT_ONCE, archived: isArchived });
}

export function useMachine(id: string): SWRResponse<Machine, ProblemError> {
  return useRead<Machine>(one(id), undefined, FOR_EDITING);
}

export function useMachineProfiles(id: string): SWRResponse<Page<MachineProfile>, ProblemError> {
  return useRead<Page<MachineProfile>>(`${one(id)}/profiles`);
}

export function useMachineLenses(id: string): SWRResponse<Page<MachineLens>, ProblemError> {
  return useRead<Page<MachineLens>>(`${one(id)}/lenses`, undefined, FOR_EDITING);
}

export function useSpots({
  machineId,
  lensId,
}: Pick<MachineLens, 'machineId' | 'lensId'>): SWRResponse<Page<SpotMeasurement>, ProblemError> {
  return useRead<Page<SpotMeasurement>>(`${one(machineId)}/lenses/${encodeURIComponent(lensId)}/spots`);
}

export function useCalibrations(id: string): SWRResponse<Page<Calibration>, ProblemError> {
  return useRead<Page<Calibration>>(`${one(id)}/calibrations`, { limit: MOST_AT_ONCE });
}

export async function createMachine(body: MachineBody, idempotencyKey: string): Promise<Machine> {
  const machine = await request<Machine>('post', MACHINES, { body, idempotencyKey });
  await revalidate(MACHINES);
  return machine;
}

export async function changeMachine({ id, version }: Machine, body: Partial<MachineBody>): Promise<Machine> {
  const machine = await request<Machine>('patch', one(id), { body, version });
  await revalidate(MACHINES);
  return machine;
}

/** Takes the machine out of the choices, or back. */
export async function setMachineArchived({ id, version }: Machine, isArchived: boolean): Promise<Machine> {
  const machine = await request<Machine>('post', `${one(id)}/${isArchived ? 'archive' : 'restore'}`, { version });
  await revalidate(MACHINES);
  return machine;
}

export async function addMachineLens(machineId: string, body: MachineLensBody & { lensId: string }, idempotencyKey: string): Promise<void> {
  await request('post', `${one(machineId)}/lenses`, { body, idempotencyKey });
  await revalidate(MACHINES);
}

export async function changeMachineLens({ machineId, lensId, version }: MachineLens, body: MachineLensBody): Promise<void> {
  await request('patch', `${one(machineId)}/lenses/${encodeURIComponent(lensId)}`, { body, version });
  await revalidate(MACHINES);
}

export async function addCalibration(machineId: string, body: CalibrationBody, idempotencyKey: string): Promise<void> {
  await request('post', `${one(machineId)}/calibrations`, { body, idempotencyKey });
  await revalidate(MACHINES);
}
