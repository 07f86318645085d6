import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { InvalidError, StaleError } from '../common/errors/domain-error';
import { NameTakenError } from '../common/errors/name-taken.error';
import type { ArchivedQuery } from '../common/pagination/archived.query';
import { decodeCursor, type Page, pageOf } from '../common/pagination/page';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import type { CreateMachineDto } from './dto/create-machine.dto';
import type { MachineDto } from './dto/machine.dto';
import type { MachineProfileListDto } from './dto/machine-profile.dto';
import type { UpdateMachineDto } from './dto/update-machine.dto';
import { MachineLensesRepository, NOTHING_KNOWN } from './machine-lenses.repository';
import { MachineArchivedError, MachineNotFoundError } from './machines.errors';
import { toMachineDto, toMachineProfileDto } from './machines.mapper';
import { type MachineProfileRow, MachinesRepository, type MachineView } from './machines.repository';
import { asStored, nextProfileNumbers, type ProfileParts, panelAsStored } from './next-profile';
import { panelProblems, physicalProblems } from './profile-problems';

@Injectable()
export class MachinesService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly machines: MachinesRepository,
    private readonly pairs: MachineLensesRepository,
    private readonly ledger: LedgerService,
  ) {}

  async list(actor: Actor, query: ArchivedQuery): Promise<Page<MachineDto>> {
    const [name, id] = decodeCursor(query.cursor, ['string', 'id']) ?? [];
    const after = name === undefined ? {} : { after: { name: String(name), id: String(id) } };
    const views = await this.unitOfWork.read(actor, (tx) =>
      this.machines.list(tx, actor.shopId, { archived: query.archived, limit: query.limit + 1, ...after }),
    );
    return pageOf(views, query.limit, {
      item: (view) => toMachineDto(view, actor),
      cursor: ({ machine }) => [machine.name, machine.id],
    });
  }

  async get(actor: Actor, id: string): Promise<MachineDto> {
    return this.unitOfWork.read(actor, async (tx) => toMachineDto(await this.getMachineWithProfile(tx, actor.shopId, id), actor));
  }

  /** Every version of the profile, newest first. */
  async listProfiles(actor: Actor, id: string): Promise<MachineProfileListDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      await this.getMachineWithProfile(tx, actor.shopId, id);
      const rows = await this.machines.profiles(tx, actor.shopId, id);
      return { items: rows.map(toMachineProfileDto), nextCursor: null };
    });
  }

  async create(actor: Actor, dto: CreateMachineDto): Promise<MachineDto> {
    const parts = partsOf(dto);
    refuseProblems(parts);
    return this.unitOfWork.run(actor, async (tx) => {
      await this.refuseTakenName(tx, actor.shopId, dto.name);
      await this.refuseUnknownLens(tx, actor.shopId, dto.mountedLensId);
      const { name, serialNumber = '', warmUpMinutes = 0, mountedLensId = null } = dto;
      const sourceKind = parts.physical.sourceKind;
      const values = { name, serialNumber, warmUpMinutes, mountedLensId, sourceKind, profileNumber: 1 };
      const { id } = await this.machines.insert(tx, actor.shopId, actor.memberId, values);
      const profile = { machineId: id, number: 1, physicalNumber: 1, sourceKind, ...parts };
      await this.machines.insertProfile(tx, actor.shopId, actor.memberId, profile);
      await this.ledger.record(tx, {
        actor,
        action: 'machine.created',
        subjectType: 'machine',
        subjectId: id,
        after: { ...values, ...parts },
      });
      await this.putMountedOn(tx, actor, id, mountedLensId);
      return toMachineDto(await this.getMachineWithProfile(tx, actor.shopId, id), actor);
    });
  }

  /** Changes what is given. A changed source or panel becomes the next profile; the earlier ones stay as they are. */
  async update(actor: Actor, id: string, version: number, dto: UpdateMachineDto): Promise<MachineDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const before = await this.lockVersion(tx, actor, id, version);
      if (before.machine.archivedAt !== null) throw new MachineArchivedError();
      const parts = partsOf({ physical: dto.physical ?? before.profile.physical, panel: dto.panel ?? before.profile.panel });
      refuseProblems(parts);
      if (dto.name != null) await this.refuseTakenName(tx, actor.shopId, dto.name, id);
      if (dto.mountedLensId !== before.machine.mountedLensId) await this.refuseUnknownLens(tx, actor.shopId, dto.mountedLensId);
      const numbers = nextProfileNumbers(before.profile, parts);
      if (numbers !== undefined) {
        const profile = { machineId: id, ...numbers, sourceKind: parts.physical.sourceKind, ...parts };
        await this.machines.insertProfile(tx, actor.shopId, actor.memberId, profile);
      }
      await this.machines.update(tx, actor.shopId, id, {
        name: dto.name ?? before.machine.name,
        serialNumber: dto.serialNumber ?? before.machine.serialNumber,
        warmUpMinutes: dto.warmUpMinutes ?? before.machine.warmUpMinutes,
        mountedLensId: dto.mountedLensId === undefined ? before.machine.mountedLensId : dto.mountedLensId,
        sourceKind: parts.physical.sourceKind,
        profileNumber: numbers?.number ?? before.profile.number,
      });
      const after = await this.getMachineWithProfile(tx, actor.shopId, id);
      await this.recordChange(tx, actor, before, after);
      await this.putMountedOn(tx, actor, id, after.machine.mountedLensId);
      return toMachineDto(after, actor);
    });
  }

  /** Takes the machine out of the choices, or back; what was proved on it keeps it. */
  async setArchived(actor: Actor, id: string, version: number, isArchived: boolean): Promise<MachineDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const before = await this.lockVersion(tx, actor, id, version);
      if ((before.machine.archivedAt !== null) === isArchived) return toMachineDto(before, actor);
      await this.machines.update(tx, actor.shopId, id, { archivedAt: isArchived ? new Date() : null });
      const action = isArchived ? 'machine.archived' : 'machine.restored';
      await this.ledger.record(tx, { actor, action, subjectType: 'machine', subjectId: id });
      return toMachineDto(await this.getMachineWithProfile(tx, actor.shopId, id), actor);
    });
  }

  /** A machine with the profile in force, for other modules' use cases. @throws MachineNotFoundError also for another shop's machine */
  async getMachineWithProfile(tx: Tx, shopId: string, machineId: string): Promise<MachineView> {
    const view = await this.machines.findView(tx, shopId, machineId);
    if (view === undefined) throw new MachineNotFoundError();
    return view;
  }

  /** One version of a profile, which may be an earlier one. @throws MachineNotFoundError also for another shop's profile */
  async getProfile(tx: Tx, shopId: string, profileId: string): Promise<MachineProfileRow> {
    const profile = await this.machines.findProfile(tx, shopId, profileId);
    if (profile === undefined) throw new MachineNotFoundError();
    return profile;
  }

  private async lockVersion(tx: Tx, actor: Actor, id: string, version: number): Promise<MachineView> {
    const row = await this.machines.lockById(tx, actor.shopId, id);
    if (row === undefined) throw new MachineNotFoundError();
    const view = await this.getMachineWithProfile(tx, actor.shopId, id);
    if (row.version !== version) throw new StaleError(toMachineDto(view, actor));
    return view;
  }

  private async recordChange(tx: Tx, actor: Actor, before: MachineView, after: MachineView): Promise<void> {
    const entry = { actor, action: 'machine.changed', subjectType: 'machine', subjectId: after.machine.id };
    await this.ledger.record(tx, { ...entry, before: ledgerBody(before), after: ledgerBody(after) });
  }

  /** A lens that is mounted is on the machine; working distance and spot may be said later. */
  private async putMountedOn(tx: Tx, actor: Actor, machineId: string, lensId: string | null): Promise<void> {
    if (lensId === null || (await this.pairs.find(tx, actor.shopId, machineId, lensId)) !== undefined) return;
    const pair = { machineId, lensId, ...NOTHING_KNOWN };
    const id = await this.pairs.insert(tx, actor.shopId, actor.memberId, pair);
    await this.ledger.record(tx, { actor, action: 'machine-lens.added', subjectType: 'machine-lens', subjectId: id, after: pair });
  }

  private async refuseTakenName(tx: Tx, shopId: string, name: string, exceptId?: string): Promise<void> {
    if (await this.machines.isNameTaken(tx, shopId, name, exceptId)) throw new NameTakenError('machine', name);
  }

  private async refuseUnknownLens(tx: Tx, shopId: string, lensId: string | null | undefined): Promise<void> {
    if (lensId == null || (await this.machines.isLensOfShop(tx, shopId, lensId))) return;
    throw new InvalidError('One field needs another look.', [
      { pointer: '#/mountedLensId', detail: 'This lens is not in use in the shop. Choose another one.' },
    ]);
  }
}

const partsOf = ({ physical, panel }: ProfileParts): ProfileParts => ({ physical: asStored(physical), panel: panelAsStored(panel) });

function refuseProblems({ physical, panel }: ProfileParts): void {
  const problems = [...physicalProblems(physical), ...panelProblems(panel)];
  if (problems.length === 0) return;
  throw new InvalidError(
    problems.length === 1 ? 'One field needs another look.' : `${problems.length} fields need another look.`,
    problems,
  );
}

function ledgerBody({ machine, profile }: MachineView) {
  const { name, serialNumber, warmUpMinutes, mountedLensId, profileNumber } = machine;
  const { physicalNumber, physical, panel } = profile;
  return { name, serialNumber, warmUpMinutes, mountedLensId, profileNumber, physicalNumber, physical, panel };
}
