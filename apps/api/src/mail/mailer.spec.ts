import { type MailSink, startMailSink } from '../../test/support/mail-sink';
import { Env } from '../config/env.validation';
import { Mailer } from './mailer';
import { isPastPatience, retryDelayS } from './retry-delay';

const LETTER = { subject: 'Approved\r\nBcc: everyone@example.invalid', paragraphs: ['R-0001 is approved.'] };
const mailerFor = (port: number) =>
  new Mailer(Object.assign(new Env(), { SMTP_URL: `smtp://127.0.0.1:${port}`, PUBLIC_ORIGIN: 'https://proofs.example.invalid' }));

describe('Mailer', () => {
  let sink: MailSink;

  beforeAll(async () => {
    sink = await startMailSink();
  });

  beforeEach(() => {
    sink.mails.length = 0;
    sink.refuseWith(undefined);
  });

  afterAll(() => sink.stop());

  it('sends one mail with intact header fields, whatever a name or subject contains', async () => {
    const to = { name: 'Ann "The\r\nBcc: other@example.invalid" Lee', address: 'ann@example.invalid' };
    expect(await mailerFor(sink.port).deliver('0190-a', to, LETTER)).toEqual({ outcome: 'sent' });
    expect(sink.mails).toHaveLength(1);
    const [mail] = sink.mails;
    expect(mail?.bcc).toBeUndefined();
    expect(mail?.subject).toBe('Approved Bcc: everyone@example.invalid');
    expect(mail?.messageId).toBe('<0190-a@proofs.example.invalid>');
    expect([mail?.to].flat().flatMap((field) => field?.value.map((entry) => entry.address))).toEqual(['ann@example.invalid']);
    expect(mail?.text).toContain('R-0001 is approved.');
    expect(mail?.html).toContain('<p');
  });

  it.each(['a@example.invalid, b@example.invalid', 'a@example.invalid\r\nRCPT TO:<b@example.invalid>', 'nobody', ''])(
    'sends nothing to %j, which is not one mailbox',
    async (address) => {
      expect(await mailerFor(sink.port).deliver('0190-b', { name: '', address }, LETTER)).toMatchObject({ outcome: 'never' });
      expect(sink.mails).toEqual([]);
    },
  );

  it('takes a final refusal as final and a passing one as passing', async () => {
    const to = { name: 'Ann', address: 'ann@example.invalid' };
    sink.refuseWith(550);
    expect(await mailerFor(sink.port).deliver('0190-c', to, LETTER)).toMatchObject({
      outcome: 'never',
      reason: expect.stringContaining('550'),
    });
    sink.refuseWith(451);
    expect(await mailerFor(sink.port).deliver('0190-c', to, LETTER)).toMatchObject({ outcome: 'later' });
    expect(await mailerFor(1).deliver('0190-c', to, LETTER)).toMatchObject({ outcome: 'later' });
  });
});

describe('retryDelayS', () => {
  it('grows to less than a minute during the first half hour and to five minutes after it', () => {
    const delays = Array.from({ length: 60 }, (_, index) => retryDelayS(index + 1, 0.999));
    expect(delays[0]).toBe(2);
    expect(Math.max(...delays)).toBe(45);
    expect(retryDelayS(61, 0.999)).toBe(300);
    expect(retryDelayS(10_000, 0)).toBe(150);
  });

  it('spreads tries that failed together', () => {
    expect(retryDelayS(8, 0)).toBeLessThan(retryDelayS(8, 0.9));
  });
});

describe('isPastPatience', () => {
  it('gives a mail up after two days', () => {
    const written = new Date('2030-01-01T00:00:00Z');
    expect(isPastPatience(written, new Date('2030-01-02T23:59:59Z'))).toBe(false);
    expect(isPastPatience(written, new Date('2030-01-03T00:00:01Z'))).toBe(true);
  });
});
