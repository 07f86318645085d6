import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { PasswordCheck } from '../common/password-check';
import { UnitOfWork } from '../database/unit-of-work';
import type { RecipeRevisionDto } from '../recipes/dto/recipe-revision.dto';
import type { ApproveRevisionDto, WithdrawRevisionDto } from './dto/sign-off-acts.dto';
import { SigningActsService } from './signing-acts.service';

/** Acts that are signed with the password. It is confirmed before the transaction: hashing takes time and must not hold locks. */
@Injectable()
export class ApprovalsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly password: PasswordCheck,
    private readonly acts: SigningActsService,
  ) {}

  /**
   * Makes a revision the setting of its recipe, now or on its day. Everything is checked again under the locks: the state, the content
   * that was shown, the signer, and all that an approval needs.
   */
  async approve(actor: Actor, id: string, dto: ApproveRevisionDto): Promise<RecipeRevisionDto> {
    await this.password.confirm(actor, dto.password);
    return this.unitOfWork.run(actor, (tx) => this.acts.approve(tx, actor, id, dto));
  }

  /** Leaves the recipe without an approved revision, at once; one that was yet to take effect never does, and the present one stays. */
  async withdraw(actor: Actor, id: string, dto: WithdrawRevisionDto): Promise<RecipeRevisionDto> {
    await this.password.confirm(actor, dto.password);
    return this.unitOfWork.run(actor, (tx) => this.acts.withdraw(tx, actor, id, dto));
  }
}
