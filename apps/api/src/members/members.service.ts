import { Injectable } from '@nestjs/common';
import type { Role } from '@proofplate/recipe-model';
import { uuidv7 } from 'uuidv7';
import { InvalidError, NotFoundError, StaleError } from '../common/errors/domain-error';
import { decodeCursor, type Page, pageOf } from '../common/pagination/page';
import { type Actor, type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { ListMembersQuery } from './dto/list-members.query.dto';
import { MemberDto } from './dto/member.dto';
import { type ProcessDto, UpdateMemberDto } from './dto/update-member.dto';
import { AlreadyMemberError, LastOwnerError } from './members.errors';
import { type Directory, roleOf, toMemberDto } from './members.mapper';
import { type MemberRow, MembersRepository } from './members.repository';

export type Joining = { readonly shopId: string; readonly personId: string; readonly role: Role; readonly printedName: string };
export type Addressee = { readonly memberId: string; readonly role: Role; readonly name: string; readonly address: string };

@Injectable()
export class MembersService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly repository: MembersRepository,
    private readonly ledger: LedgerService,
  ) {}

  /** Makes a person a member, or a removed member active again. @throws AlreadyMemberError for an active one */
  async join(tx: Tx, joining: Joining): Promise<{ readonly id: string; readonly printedName: string; readonly role: Role }> {
    const row = await this.repository.insertOrRestore(tx, { id: uuidv7(), ...joining });
    if (row === undefined) throw new AlreadyMemberError();
    return { id: row.id, printedName: row.printedName, role: roleOf(row.role) };
  }

  /** True when an active member has this address. */
  async hasAddress(tx: Tx, shopId: string, email: string): Promise<boolean> {
    const wanted = email.toLowerCase();
    const memberIds = [...(await this.repository.addresses(tx))]
      .filter(([, address]) => address.toLowerCase() === wanted)
      .map(([id]) => id);
    for (const id of memberIds) if ((await this.repository.find(tx, shopId, id))?.state === 'active') return true;
    return false;
  }

  /** Active members with their addresses, for mail that another module's use case writes. */
  async addressees(tx: Tx, shopId: string): Promise<Addressee[]> {
    const addresses = await this.repository.addresses(tx);
    const rows = await this.repository.listActive(tx, shopId);
    return rows.flatMap(({ id, role, printedName }) => {
      const address = addresses.get(id);
      return address === undefined ? [] : [{ memberId: id, role: roleOf(role), name: printedName, address }];
    });
  }

  async list(actor: Actor, query: ListMembersQuery): Promise<Page<MemberDto>> {
    const [name, id] = decodeCursor(query.cursor, ['string', 'id']) ?? [];
    const after = typeof name === 'string' && typeof id === 'string' ? { after: [name, id] as const } : {};
    return this.unitOfWork.read(actor, async (tx) => {
      const rows = await this.repository.list(tx, actor.shopId, { state: query.state, ...after }, query.limit + 1);
      const directory = await this.directory(tx, actor.shopId);
      const item = ({ row }: (typeof rows)[number]) => toMemberDto(row, directory, actor);
      return pageOf(rows, query.limit, { item, cursor: ({ row, sortName }) => [sortName, row.id] });
    });
  }

  async get(actor: Actor, id: string): Promise<MemberDto> {
    return this.unitOfWork.read(actor, async (tx) => this.toDto(tx, actor, await this.getRow(tx, actor.shopId, id)));
  }

  async update(actor: Actor, id: string, version: number, dto: UpdateMemberDto): Promise<MemberDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const owners = await this.repository.lockOwners(tx, actor.shopId);
      const before = await this.getActiveRow(tx, actor.shopId, id);
      if (dto.role !== undefined && dto.role !== 'owner' && isLastOwner(owners, id)) throw new LastOwnerError();
      if (dto.signsFor) await this.refuseUnknownEffects(tx, actor.shopId, dto.signsFor);
      const after = await this.repository.update(tx, { shopId: actor.shopId, id, version }, changeOf(dto));
      if (after === undefined) throw new StaleError(await this.toDto(tx, actor, before));
      await this.ledger.record(tx, { actor, action: 'member.changed', ...subject(id), before: told(before), after: told(after) });
      return this.toDto(tx, actor, after);
    });
  }

  /** Ends the membership and, at once, every session in this shop. What the member did and signed stays. */
  async remove(actor: Actor, id: string, version: number): Promise<void> {
    await this.unitOfWork.run(actor, async (tx) => {
      const owners = await this.repository.lockOwners(tx, actor.shopId);
      const before = await this.getActiveRow(tx, actor.shopId, id);
      if (isLastOwner(owners, id)) throw new LastOwnerError();
      const isRemoved = await this.repository.markRemoved(tx, { shopId: actor.shopId, id, version });
      if (!isRemoved) throw new StaleError(await this.toDto(tx, actor, before));
      await this.repository.endSessions(tx, id, 'member removed');
      await this.ledger.record(tx, { actor, action: 'member.removed', ...subject(id), before: told(before) });
    });
  }

  /** @throws NotFoundError also for a member of another shop */
  async getRow(tx: Tx, shopId: string, id: string): Promise<MemberRow> {
    const row = await this.repository.find(tx, shopId, id);
    if (row === undefined) throw new NotFoundError();
    return row;
  }

  /** @throws NotFoundError for a removed member too */
  async getActiveRow(tx: Tx, shopId: string, id: string): Promise<MemberRow> {
    const row = await this.getRow(tx, shopId, id);
    if (row.state !== 'active') throw new NotFoundError('This member was removed. Invite the person again if they come back.');
    return row;
  }

  private async toDto(tx: Tx, actor: Actor, row: MemberRow): Promise<MemberDto> {
    return toMemberDto(row, await this.directory(tx, actor.shopId), actor);
  }

  private async directory(tx: Tx, shopId: string): Promise<Directory> {
    return { addresses: await this.repository.addresses(tx), effectNames: await this.repository.effectNames(tx, shopId) };
  }

  private async refuseUnknownEffects(tx: Tx, shopId: string, processes: readonly ProcessDto[]): Promise<void> {
    const known = await this.repository.effectNames(tx, shopId);
    const errors = processes.flatMap(({ effectId }, index) =>
      known.has(effectId) ? [] : [{ pointer: `#/signsFor/${index}/effectId`, detail: 'The shop has no such effect.' }],
    );
    if (errors.length > 0) throw new InvalidError('Some processes are not of this shop.', errors);
  }
}

const subject = (id: string) => ({ subjectType: 'member', subjectId: id });
const told = ({ role, printedName, signsFor }: MemberRow) => ({ role, printedName, signsFor });
/** Columns hold plain values, not instances of request classes. */
const changeOf = ({ signsFor, ...rest }: UpdateMemberDto) => ({
  ...rest,
  ...(signsFor === undefined ? {} : { signsFor: signsFor?.map(({ effectId, sourceKind }) => ({ effectId, sourceKind })) ?? null }),
});
const isLastOwner = (owners: readonly string[], id: string) => owners.length === 1 && owners[0] === id;
