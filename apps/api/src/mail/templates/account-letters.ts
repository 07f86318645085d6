import type { Letter } from '../letter';
import type { MailPayloads } from '../mail-kinds';
import type { MailLinks } from '../mail-links';

export function invitationLetter(
  { to, shopName, invitedBy, role, token, expiresAt }: MailPayloads['invitation'],
  links: MailLinks,
  timeZone: string,
): Letter {
  return {
    subject: `${invitedBy} invites you to ${shopName}`,
    paragraphs: [greeting(to.name), `${invitedBy} invites you to work with the settings of ${shopName} as ${withArticle(role)}.`],
    action: { label: 'Accept the invitation', url: links.acceptInvitation(token) },
    footnote: `The link works once, for this address only, until ${zonedTime(expiresAt, timeZone)}. If you don't know ${shopName}, leave this mail alone: nothing happens.`,
  };
}

export function passwordResetLetter({ to, token, expiresAt }: MailPayloads['password-reset'], links: MailLinks, timeZone: string): Letter {
  return {
    subject: 'Choose a new password',
    paragraphs: [greeting(to.name), 'Somebody, probably you, asked for a new password for this address.'],
    action: { label: 'Choose a new password', url: links.resetPassword(token) },
    footnote: `The link works once, until ${zonedTime(expiresAt, timeZone)}. If it wasn't you, leave this mail alone: your password stays as it is.`,
  };
}

export function greeting(name: string): string {
  return name.trim() === '' ? 'Hello,' : `Hello ${name},`;
}

function withArticle(role: string): string {
  return /^[aeiou]/i.test(role) ? `an ${role}` : `a ${role}`;
}

/** "14 May 2026 10:12 in the time zone Europe/Berlin": the shop's clock, with its name, since readers sit anywhere. */
function zonedTime(iso: string, timeZone: string): string {
  const parts = new Intl.DateTimeFormat('en-GB', {
    ...{ timeZone, day: 'numeric', month: 'long', year: 'numeric', hour: '2-digit', minute: '2-digit' },
    hourCycle: 'h23',
  }).formatToParts(new Date(iso));
  const part = (type: Intl.DateTimeFormatPartTypes) => parts.find((one) => one.type === type)?.value ?? '';
  return `${part('day')} ${part('month')} ${part('year')} ${part('hour')}:${part('minute')} in the time zone ${timeZone}`;
}
