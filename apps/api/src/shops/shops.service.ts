import { Injectable } from '@nestjs/common';
import { InvalidError, NotFoundError, StaleError } from '../common/errors/domain-error';
import { PasswordCheck } from '../common/password-check';
import { type Actor, type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { ShopDto } from './dto/shop.dto';
import { UpdateShopDto } from './dto/update-shop.dto';
import { isSamePolicy } from './shop-policy';
import { toShopDto } from './shops.mapper';
import { type NewShop, type ShopRow, ShopsRepository } from './shops.repository';

@Injectable()
export class ShopsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly repository: ShopsRepository,
    private readonly ledger: LedgerService,
    private readonly passwordCheck: PasswordCheck,
  ) {}

  /** Makes the shop and begins its ledger; the caller adds the first owner in the same transaction. */
  async create(tx: Tx, shop: NewShop): Promise<void> {
    await this.repository.insert(tx, shop);
    await this.ledger.open(tx, shop.id);
  }

  /** For use cases of other modules, which read the policy inside their own transaction. */
  async getRow(tx: Tx, shopId: string): Promise<ShopRow> {
    const row = await this.repository.find(tx, shopId);
    if (row === undefined) throw new NotFoundError();
    return row;
  }

  /** The day it is now where the shop is: a day that somebody enters is one of the shop's calendar. */
  async today(tx: Tx, shopId: string): Promise<string> {
    const today = await this.repository.today(tx, shopId);
    if (today === undefined) throw new NotFoundError();
    return today;
  }

  /** The day on the shop's calendar on which something was. */
  async dayOf(tx: Tx, shopId: string, at: Date): Promise<string> {
    const day = await this.repository.dayOf(tx, shopId, at);
    if (day === undefined) throw new NotFoundError();
    return day;
  }

  async get(actor: Actor): Promise<ShopDto> {
    return this.unitOfWork.read(actor, async (tx) => toShopDto(await this.getRow(tx, actor.shopId), actor.role));
  }

  /** Changes the shop. A change of the policy is signed: it needs the owner's password and says so in the ledger. */
  async update(actor: Actor, version: number, dto: UpdateShopDto): Promise<ShopDto> {
    const { password, ...change } = dto;
    const isSigned = await this.confirmPolicyChange(actor, dto);
    return this.unitOfWork.run(actor, async (tx) => {
      const before = await this.getRow(tx, actor.shopId);
      const changesPolicy = change.policy !== undefined && !isSamePolicy(before.policy, change.policy);
      if (changesPolicy && !isSigned) throw passwordNeeded();
      const after = await this.repository.update(tx, actor.shopId, version, change);
      if (after === undefined) throw new StaleError(toShopDto(before, actor.role));
      const action = changesPolicy ? 'shop.policy-signed' : 'shop.changed';
      await this.ledger.record(tx, {
        actor,
        action,
        subjectType: 'shop',
        subjectId: actor.shopId,
        before: told(before),
        after: told(after),
      });
      return toShopDto(after, actor.role);
    });
  }

  private async confirmPolicyChange(actor: Actor, dto: UpdateShopDto): Promise<boolean> {
    if (dto.policy === undefined) return false;
    const present = await this.get(actor);
    if (isSamePolicy(present.policy, dto.policy)) return false;
    if (dto.password === undefined) throw passwordNeeded();
    await this.passwordCheck.confirm(actor, dto.password);
    return true;
  }
}

const passwordNeeded = () =>
  new InvalidError('Changing the policy is a signed act.', [{ pointer: '#/password', detail: 'Type your password to sign the change.' }]);

const told = ({ name, unitSystem, timeZone, locale, policy }: ShopRow) => ({ name, unitSystem, timeZone, locale, policy });
