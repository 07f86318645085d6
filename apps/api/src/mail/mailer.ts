import { Injectable } from '@nestjs/common';
import { createTransport, type NodemailerError } from 'nodemailer';
import { Env } from '../config/env.validation';
import { type Letter, oneLine, writeMail } from './letter';
import type { Recipient } from './mail-kinds';

/** `later`: the same mail may pass at another time. `never`: the server refuses this mail for good. */
export type Delivery = { readonly outcome: 'sent' } | { readonly outcome: 'later' | 'never'; readonly reason: string };

const CONNECT_TIMEOUT_MS = 5000;
const SILENCE_TIMEOUT_MS = 10_000;
const LONGEST_REASON = 500;
const ADDRESS = /^[^\s@<>,;:"()[\]\\]+@[^\s@<>,;:"()[\]\\]+$/;

/** Hands mail to the SMTP server of the service or, in development, to the local fake. */
@Injectable()
export class Mailer {
  private readonly transport;

  constructor(private readonly env: Env) {
    this.transport = createTransport({
      url: env.SMTP_URL,
      connectionTimeout: CONNECT_TIMEOUT_MS,
      greetingTimeout: CONNECT_TIMEOUT_MS,
      dnsTimeout: CONNECT_TIMEOUT_MS,
      socketTimeout: SILENCE_TIMEOUT_MS,
      disableFileAccess: true,
      disableUrlAccess: true,
    });
  }

  /** `mailId` makes the Message-ID, the same at each try: a mail program shows a mail that was sent twice once. */
  async deliver(mailId: string, to: Recipient, letter: Letter): Promise<Delivery> {
    if (!ADDRESS.test(to.address)) return { outcome: 'never', reason: 'The address of the recipient is not one mailbox.' };
    const { subject, text, html } = writeMail(letter);
    try {
      await this.transport.sendMail({
        messageId: `<${mailId}@${new URL(this.env.PUBLIC_ORIGIN).hostname}>`,
        from: this.env.MAIL_FROM,
        to: { name: oneLine(to.name), address: to.address },
        subject,
        text,
        html,
        headers: { 'Auto-Submitted': 'auto-generated' },
      });
      return { outcome: 'sent' };
    } catch (error) {
      return refusal(error);
    }
  }
}

/** Only a 5xx answer to this sender, recipient or text is final. A wrong password or a lost connection is our trouble, not the mail's. */
function refusal(error: unknown): Delivery {
  const { code, responseCode, message } = readError(error);
  const isAboutThisMail = code === 'EENVELOPE' || code === 'EMESSAGE';
  const isFinal = isAboutThisMail && (responseCode === undefined || responseCode >= 500);
  return { outcome: isFinal ? 'never' : 'later', reason: oneLine(message).slice(0, LONGEST_REASON) };
}

function readError(error: unknown): { code?: string; responseCode?: number; message: string } {
  if (!(error instanceof Error)) return { message: String(error) };
  const { code, responseCode, message }: NodemailerError = error;
  return { code, responseCode, message };
}
