import { type CanActivate, type ExecutionContext, Injectable } from '@nestjs/common';
import { Reflector } from '@nestjs/core';
import { type Role, roleAtLeast } from '@proofplate/recipe-model';
import { REQUIRED_ROLE } from '../decorators/at-least.decorator';
import { actorOf } from '../decorators/current-member.decorator';
import { ForbiddenError } from '../errors/domain-error';

/** Enforces `@AtLeast(role)`; runs after the guard that establishes who is calling. */
@Injectable()
export class RoleGuard implements CanActivate {
  constructor(private readonly reflector: Reflector) {}

  canActivate(context: ExecutionContext): boolean {
    const required = this.reflector.getAllAndOverride<Role | undefined>(REQUIRED_ROLE, [context.getHandler(), context.getClass()]);
    if (required === undefined) return true;
    const actor = actorOf(context);
    if (roleAtLeast(actor.role, required)) return true;
    throw new ForbiddenError(`This needs the role ${required} or a higher one; yours is ${actor.role}. Ask an owner of the shop.`);
  }
}
