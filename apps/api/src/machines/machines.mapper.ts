import type { Actor } from '../common/actor';
import type { MachineDto } from './dto/machine.dto';
import type { MachineProfileDto } from './dto/machine-profile.dto';
import { machineActions } from './machines.policy';
import type { MachineProfileRow, MachineView } from './machines.repository';

export function toMachineDto({ machine, profile, mountedLens, latestCalibrationOn }: MachineView, actor: Pick<Actor, 'role'>): MachineDto {
  return {
    id: machine.id,
    name: machine.name,
    sourceKind: profile.sourceKind,
    serialNumber: machine.serialNumber,
    warmUpMinutes: machine.warmUpMinutes,
    mountedLens,
    profile: toMachineProfileDto(profile),
    latestCalibrationOn,
    archivedAt: machine.archivedAt?.toISOString() ?? null,
    version: machine.version,
    allowedActions: machineActions(actor, machine),
  };
}

export function toMachineProfileDto(row: MachineProfileRow): MachineProfileDto {
  const { id, number, physicalNumber, physical, panel, createdAt, createdByName } = row;
  return { id, number, physicalNumber, physical, panel, createdAt: createdAt.toISOString(), createdByName };
}
