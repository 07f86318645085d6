import type { Role } from './session';

export const ROLES: readonly { value: Role; label: string; may: string }[] = [
  { value: 'trainee', label: 'trainee', may: 'looks up approved settings and runs them' },
  { value: 'operator', label: 'operator', may: 'also marks coupons and drafts recipes' },
  { value: 'lead', label: 'lead operator', may: 'also signs' },
  { value: 'owner', label: 'owner', may: 'also decides who works here and by which rules' },
];

export function roleWord(role: Role): string {
  return ROLES.find(({ value }) => value === role)?.label ?? role;
}

export const ROLE_OPTIONS = ROLES.map(({ value, label, may }) => ({ value, label: `${label}: ${may}` }));
