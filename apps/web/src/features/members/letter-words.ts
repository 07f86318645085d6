/** What a letter was about and what to do when it did not arrive, by the kind the api names. */
const LETTERS: Readonly<Record<string, { about: string; wayOut: string }>> = {
  invitation: { about: 'Invitation', wayOut: 'Check the address and invite again: the link of this letter is gone.' },
  'password-reset': { about: 'New password', wayOut: 'The person asks for a new letter on the sign-in page. Check the address first.' },
  'revision-submitted': { about: 'Revision to sign', wayOut: 'It waits under Sign-off all the same.' },
  'revision-approved': { about: 'Revision approved', wayOut: 'It is in force all the same. Tell the person.' },
  'revision-returned': { about: 'Revision returned', wayOut: 'The reason stands on the recipe’s page. Tell the person.' },
  'revision-withdrawn': { about: 'Revision withdrawn', wayOut: 'The machine shows it already. Tell whoever is at work with it.' },
  'bad-result': { about: 'Bad result at a machine', wayOut: 'It stands under Runs all the same. Tell the person.' },
  'hold-placed': { about: 'Hold placed', wayOut: 'The machine shows it already. Tell whoever is at work with it.' },
};

export function letterWords(kind: string): { about: string; wayOut: string } {
  return LETTERS[kind] ?? { about: kind.replaceAll('-', ' '), wayOut: 'Check the address and tell the person.' };
}
