import type { Letter } from './letter';
import type { Mail } from './mail-kinds';
import type { MailLinks } from './mail-links';
import { invitationLetter, passwordResetLetter } from './templates/account-letters';
import { approvedLetter, badResultLetter, holdLetter, returnedLetter, submittedLetter, withdrawnLetter } from './templates/recipe-letters';

/** Times of the letter are those of the shop's clock. */
export function composeLetter(mail: Mail, links: MailLinks, timeZone: string): Letter {
  switch (mail.kind) {
    case 'invitation':
      return invitationLetter(mail.payload, links, timeZone);
    case 'password-reset':
      return passwordResetLetter(mail.payload, links, timeZone);
    case 'revision-submitted':
      return submittedLetter(mail.payload, links);
    case 'revision-approved':
      return approvedLetter(mail.payload, links);
    case 'revision-returned':
      return returnedLetter(mail.payload, links);
    case 'revision-withdrawn':
      return withdrawnLetter(mail.payload, links);
    case 'hold-placed':
      return holdLetter(mail.payload, links);
    case 'bad-result':
      return badResultLetter(mail.payload, links);
  }
}
