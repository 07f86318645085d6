import { type Role, roleAtLeast } from '@proofplate/recipe-model';

/** Subjects that only leads and owners may read about. */
const PEOPLE_AND_POLICY = ['member', 'invitation', 'shop'] as const;

/** Kinds of subject whose events this role does not see. */
export function hiddenSubjectTypes(role: Role): readonly string[] {
  return roleAtLeast(role, 'lead') ? [] : PEOPLE_AND_POLICY;
}
