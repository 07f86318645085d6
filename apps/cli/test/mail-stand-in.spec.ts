import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, rmSync } from 'node:fs';
import { createConnection, createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createInterface } from 'node:readline';

const SERVE = join(__dirname, '../fakes/serve.mjs');
const LETTER = [
  'From: Proofplate <no-reply@proofplate.invalid>',
  'To: ada@shop.invalid',
  'Subject: =?UTF-8?Q?Join_<b>us</b>?=',
  'Message-ID: <invitation-1@proofplate.invalid>',
  'Content-Type: text/plain; charset=utf-8',
  '',
  'Open http://localhost:3000/join?a=1&b=2 <script>alert(1)</script>',
];

describe('the stand-in for the mail server', () => {
  let folder: string;
  let smtpPort: number;
  let viewer: string;
  let stopped: () => Promise<void>;

  beforeEach(async () => {
    folder = mkdtempSync(join(tmpdir(), 'proofplate-letters-'));
    ({ smtpPort, viewer, stopped } = await serve(folder));
  });

  afterEach(async () => {
    await stopped();
    rmSync(folder, { recursive: true, force: true });
  });

  it('keeps a letter and gives it back as JSON for programs', async () => {
    await send(smtpPort, LETTER);

    expect(await letters(viewer)).toEqual([
      expect.objectContaining({
        messageId: '<invitation-1@proofplate.invalid>',
        to: ['ada@shop.invalid'],
        subject: 'Join <b>us</b>',
        text: expect.stringContaining('http://localhost:3000/join?a=1&b=2'),
      }),
    ]);
  });

  it('shows what a letter says as text with working addresses, never as markup', async () => {
    await send(smtpPort, LETTER);
    const [letter] = await letters(viewer);

    const page = await (await fetch(`${viewer}/letters/${letter?.id}`)).text();

    expect(page).toContain('<h1>Join &lt;b&gt;us&lt;/b&gt;</h1>');
    expect(page).toContain('href="http://localhost:3000/join?a=1&amp;b=2"');
    expect(page).not.toContain('<script');
  });

  it('still has its letters after a restart', async () => {
    await send(smtpPort, LETTER);
    await stopped();

    ({ smtpPort, viewer, stopped } = await serve(folder));

    expect(await letters(viewer)).toHaveLength(1);
  });

  it('answers 404 for the name of a file outside its folder', async () => {
    const response = await fetch(`${viewer}/letters/..%2f..%2fsecrets.json`);

    expect(response.status).toBe(404);
  });
});

type Letter = { readonly id: string; readonly subject: string; readonly text: string };

async function letters(viewer: string): Promise<Letter[]> {
  return (await fetch(`${viewer}/letters.json`)).json() as Promise<Letter[]>;
}

async function serve(folder: string): Promise<{ smtpPort: number; viewer: string; stopped: () => Promise<void> }> {
  const [storePort, smtpPort, viewerPort] = [await freePort(), await freePort(), await freePort()];
  const options = {
    objectStore: { directory: join(folder, 'objects'), bucket: 'proofplate', port: storePort },
    mail: { directory: join(folder, 'mail'), smtpPort, viewerPort },
  };
  const child: ChildProcess = spawn(process.execPath, [SERVE, JSON.stringify(options)], { stdio: ['ignore', 'ignore', 'inherit', 'ipc'] });
  const gone = once(child, 'exit');
  await once(child, 'message');
  const stopped = async () => {
    child.kill('SIGTERM');
    await gone;
  };
  return { smtpPort, viewer: `http://127.0.0.1:${viewerPort}`, stopped };
}

/** The shortest conversation that hands over a letter. */
async function send(port: number, lines: readonly string[]): Promise<void> {
  const socket = createConnection({ port, host: '127.0.0.1' });
  const answers = createInterface({ input: socket })[Symbol.asyncIterator]();
  const say = async (text: string) => {
    socket.write(`${text}\r\n`);
    for (;;) {
      const { value } = await answers.next();
      // "250-" announces another line of the same answer.
      if (!/^\d{3}-/.test(String(value))) return expect(String(value)).toMatch(/^[23]/);
    }
  };
  await answers.next();
  await say('EHLO test.invalid');
  await say('MAIL FROM:<no-reply@proofplate.invalid>');
  await say('RCPT TO:<ada@shop.invalid>');
  await say('DATA');
  await say(`${lines.join('\r\n')}\r\n.`);
  await say('QUIT');
  socket.destroy();
}

async function freePort(): Promise<number> {
  const probe = createServer().listen(0, '127.0.0.1');
  await once(probe, 'listening');
  const address = probe.address();
  probe.close();
  await once(probe, 'close');
  if (address === null || typeof address === 'string') throw new Error('a listening socket has a port');
  return address.port;
}
