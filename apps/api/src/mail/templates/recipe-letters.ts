import type { Letter } from '../letter';
import type { MailPayloads } from '../mail-kinds';
import type { MailLinks } from '../mail-links';
import { greeting } from './account-letters';

type RevisionMail = Omit<MailPayloads['revision-submitted'], 'comment'>;

export function submittedLetter(mail: MailPayloads['revision-submitted'], links: MailLinks): Letter {
  return {
    subject: `To sign: ${name(mail)}`,
    paragraphs: [
      greeting(mail.to.name),
      `${mail.by} submitted ${name(mail)} at ${mail.shopName}. It waits for a signature.`,
      ...said(mail.by, mail.comment),
    ],
    action: { label: 'Look at the evidence', url: links.signOff() },
  };
}

export function approvedLetter(mail: MailPayloads['revision-approved'], links: MailLinks): Letter {
  return {
    subject: `Approved: ${name(mail)}`,
    paragraphs: [greeting(mail.to.name), `${mail.by} approved ${name(mail)} at ${mail.shopName}.`, ...said(mail.by, mail.comment)],
    action: revisionAction(mail, links),
  };
}

export function returnedLetter(mail: MailPayloads['revision-returned'], links: MailLinks): Letter {
  return {
    subject: `Sent back: ${name(mail)}`,
    paragraphs: [greeting(mail.to.name), `${mail.by} sent ${name(mail)} back at ${mail.shopName}.`, ...said(mail.by, mail.reason)],
    action: revisionAction(mail, links),
    footnote: 'A new draft can copy it and be submitted again.',
  };
}

export function withdrawnLetter(mail: MailPayloads['revision-withdrawn'], links: MailLinks): Letter {
  return {
    subject: `Withdrawn: ${name(mail)}`,
    paragraphs: [
      greeting(mail.to.name),
      `${mail.by} withdrew ${name(mail)} at ${mail.shopName}. ${afterwards(mail)}`,
      ...said(mail.by, mail.reason),
    ],
    action: revisionAction(mail, links),
  };
}

function afterwards({ stayingNumber }: MailPayloads['revision-withdrawn']): string {
  return stayingNumber == null
    ? 'Do not mark with it any more: this recipe has no approved setting now.'
    : `It never takes effect: revision ${stayingNumber} stays the approved one.`;
}

export function holdLetter({ to, shopName, subject, reason, by }: MailPayloads['hold-placed'], links: MailLinks): Letter {
  return {
    subject: `On hold: ${subject}`,
    paragraphs: [
      greeting(to.name),
      `${by} put ${subject} on hold at ${shopName}. No run can be started with it until a lead releases it.`,
      ...said(by, reason),
    ],
    action: { label: 'See what is held', url: links.atTheMachine() },
  };
}

export function badResultLetter(mail: MailPayloads['bad-result'], links: MailLinks): Letter {
  const { to, shopName, runCode, setting, machine, jobReference, outcome, note, by } = mail;
  const job = jobReference === '' ? '' : `, job ${jobReference}`;
  return {
    subject: `Bad result: ${runCode}, ${outcome.toLowerCase()}`,
    paragraphs: [
      greeting(to.name),
      `${by} told a bad result at ${shopName}: ${outcome.toLowerCase()}. Run ${runCode}${job} on ${machine} with ${setting}.`,
      ...said(by, note),
      'Look at the pieces. A hold stops the recipe or the machine until it is clear what went wrong.',
    ],
    action: { label: 'Open the run', url: links.run(runCode) },
  };
}

function name({ recipeCode, recipeTitle, revisionNumber }: RevisionMail): string {
  return `${recipeCode} ${recipeTitle}, revision ${revisionNumber}`;
}

function said(by: string, words: string | undefined): string[] {
  return words === undefined || words.trim() === '' ? [] : [`${by} wrote: ${words}`];
}

function revisionAction({ recipeCode, revisionId }: RevisionMail, links: MailLinks) {
  return { label: 'Open the revision', url: links.revision(recipeCode, revisionId) };
}
