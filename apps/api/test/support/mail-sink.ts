import type { AddressInfo } from 'node:net';
import { type ParsedMail, simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';

export type MailSink = {
  readonly port: number;
  readonly mails: ParsedMail[];
  /** Answer to every recipient from now on; undefined takes them. */
  refuseWith(code: number | undefined): void;
  stop(): Promise<void>;
};

/** A mail server on loopback that keeps what it gets. */
export async function startMailSink({ port = 0 } = {}): Promise<MailSink> {
  const mails: ParsedMail[] = [];
  let refusal: number | undefined;
  const server = new SMTPServer({
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    onRcptTo: (_address, _session, callback) => {
      callback(refusal === undefined ? null : Object.assign(new Error('not here'), { responseCode: refusal }));
    },
    onData: (stream, _session, callback) => {
      simpleParser(stream).then((mail) => {
        mails.push(mail);
        callback();
      }, callback);
    },
  });
  await new Promise<void>((resolve) => server.listen(port, '127.0.0.1', resolve));
  const { port: listening } = server.server.address() as AddressInfo;
  return {
    port: listening,
    mails,
    refuseWith: (code) => {
      refusal = code;
    },
    stop: () => new Promise((resolve) => server.close(() => resolve())),
  };
}
