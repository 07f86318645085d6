import type { Letter } from '../letter';
import type { MailPayloads } from '../mail-kinds';
import type { MailLinks } from '../mail-links';

export function invitationLetter(
  { to, shopName, invitedBy, role, token, expiresAt }: MailPayloads['invitation'],
  links: MailLinks,
): Letter {
  return {
    subject: `${invitedBy} invites you to ${shopName}`,
    paragraphs: [greeting(to.name), `${invitedBy} invites you to work with the settings of ${shopName} as ${withArticle(role)}.`],
    action: { label: 'Accept the invitation', url: links.acceptInvitation(token) },
    footnote: `The link works once, for this address only, until ${asDay(expiresAt)}. If you don't know ${shopName}, leave this mail alone: nothing happens.`,
  };
}

export function passwordResetLetter({ to, token, expiresAt }: MailPayloads['password-reset'], links: MailLinks): Letter {
  return {
    subject: 'Choose a new password',
    paragraphs: [greeting(to.name), 'Somebody, probably you, asked for a new password for this address.'],
    action: { label: 'Choose a new password', url: links.resetPassword(token) },
    footnote: `The link works once, until ${asDay(expiresAt)}. If it wasn't you, leave this mail alone: your password stays as it is.`,
  };
}

export function greeting(name: string): string {
  return name.trim() === '' ? 'Hello,' : `Hello ${name},`;
}

function withArticle(role: string): string {
  return /^[aeiou]/i.test(role) ? `an ${role}` : `a ${role}`;
}

/** Readers sit anywhere, so the zone is said. */
function asDay(iso: string): string {
  return `${new Date(iso).toISOString().slice(0, 16).replace('T', ' ')} UTC`;
}
