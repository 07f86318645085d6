import { applyDecorators, SetMetadata } from '@nestjs/common';
import { ApiForbiddenResponse } from '@nestjs/swagger';
import type { Role } from '@proofplate/recipe-model';

export const REQUIRED_ROLE = Symbol('required-role');

/** The route needs this role or a higher one; others get 403 `not-permitted`. */
export const AtLeast = (role: Role) =>
  applyDecorators(SetMetadata(REQUIRED_ROLE, role), ApiForbiddenResponse({ description: `needs the role ${role} or a higher one` }));
