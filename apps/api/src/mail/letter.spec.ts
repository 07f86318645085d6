import { composeLetter } from './compose-letter';
import { escapeHtml, oneLine, writeMail } from './letter';
import type { Mail } from './mail-kinds';
import { mailLinks } from './mail-links';

const links = mailLinks('https://proofs.example.invalid');
const EVIL = `Mallory <img src=x onerror="alert(1)">\r\nBcc: everyone@example.invalid`;
const to = { name: EVIL, address: 'lead@example.invalid' };
const revision = {
  to,
  shopName: EVIL,
  recipeId: 'r/1',
  revisionId: 'v?1',
  recipeCode: 'R-0001',
  recipeTitle: EVIL,
  revisionNumber: 3,
  by: EVIL,
};
const MAILS: Mail[] = [
  {
    kind: 'invitation',
    payload: { to, shopName: EVIL, invitedBy: EVIL, role: 'operator', token: 'secret+/=', expiresAt: '2030-01-02T03:04:05Z' },
  },
  { kind: 'password-reset', payload: { to, token: 'secret+/=', expiresAt: '2030-01-02T03:04:05Z' } },
  { kind: 'revision-submitted', payload: { ...revision, comment: EVIL } },
  { kind: 'revision-approved', payload: revision },
  { kind: 'revision-returned', payload: { ...revision, reason: EVIL } },
  { kind: 'revision-withdrawn', payload: { ...revision, reason: EVIL, stayingNumber: null } },
  { kind: 'hold-placed', payload: { to, shopName: EVIL, subject: EVIL, reason: EVIL, by: EVIL } },
  {
    kind: 'bad-result',
    payload: {
      to,
      shopName: EVIL,
      runCode: 'J-0007',
      setting: EVIL,
      machine: EVIL,
      jobReference: EVIL,
      outcome: 'Faint',
      note: EVIL,
      by: EVIL,
    },
  },
];

describe.each(MAILS.map((mail) => [mail.kind, mail] as const))('the mail %s', (_, mail) => {
  const written = writeMail(composeLetter(mail, links, 'Europe/Berlin'));

  it('has a subject of one line', () => {
    expect(written.subject).not.toMatch(/[\r\n]/);
    expect(written.subject.length).toBeGreaterThan(5);
  });

  it('shows typed text as text', () => {
    expect(written.html).not.toContain('<img');
    expect(written.html).toContain('&lt;img');
  });

  it('says the same in both parts', () => {
    const url = /https:\/\/\S+/.exec(written.text)?.[0] ?? '';
    expect(url).not.toBe('');
    expect(written.html).toContain(`href="${escapeHtml(url)}"`);
  });
});

describe('the mail of a withdrawal', () => {
  const textOf = (stayingNumber: number | null) =>
    writeMail(
      composeLetter({ kind: 'revision-withdrawn', payload: { ...revision, reason: 'Brown rims', stayingNumber } }, links, 'Europe/Berlin'),
    ).text;

  it('leads to the recipe by the code that people read', () => {
    expect(textOf(null)).toContain('https://proofs.example.invalid/recipes/R-0001/revisions/v%3F1');
  });

  it('says what holds afterwards', () => {
    expect(textOf(null)).toContain('this recipe has no approved setting now');
    expect(textOf(2)).toContain('revision 2 stays the approved one');
    expect(textOf(2)).not.toContain('no approved setting');
  });
});

describe('links in mail', () => {
  it('carry a secret in the fragment only, and give it back unchanged', () => {
    for (const href of [links.acceptInvitation('secret+/=&x'), links.resetPassword('secret+/=&x')]) {
      const url = new URL(href);
      expect(url.search).toBe('');
      expect(url.pathname).not.toContain('secret');
      expect(new URLSearchParams(url.hash.slice(1)).get('token')).toBe('secret+/=&x');
    }
  });

  it('stay on our own origin whatever an id looks like', () => {
    expect(new URL(links.revision('//evil.example', '../..')).origin).toBe('https://proofs.example.invalid');
  });
});

describe('oneLine', () => {
  it('takes out everything that could end a header line', () => {
    expect(oneLine('a\r\nb\u2028c\u0000d\u202ee')).toBe('a b c d e');
    expect(oneLine('x'.repeat(500))).toHaveLength(200);
  });
});

describe('a time in a letter', () => {
  it.each(MAILS.filter(({ kind }) => kind === 'invitation' || kind === 'password-reset'))(
    'is that of the shop’s clock, with the name of its zone: $kind',
    (mail) => {
      const inBerlin = writeMail(composeLetter(mail, links, 'Europe/Berlin')).text;
      expect(inBerlin).toContain('until 2 January 2030 04:04 in the time zone Europe/Berlin.');
      const inTokyo = writeMail(composeLetter(mail, links, 'Asia/Tokyo')).text;
      expect(inTokyo).toContain('until 2 January 2030 12:04 in the time zone Asia/Tokyo.');
    },
  );
});
