import type { Role } from '@proofplate/recipe-model';

/** The member on whose behalf a request runs, as the database knows it at this moment. */
export type Actor = {
  readonly shopId: string;
  readonly memberId: string;
  readonly personId: string;
  readonly printedName: string;
  readonly role: Role;
  readonly sessionId: string;
};
