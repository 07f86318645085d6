// Stands in for a mail server: takes every letter on loopback, sends none on, and shows them on a page.
import { randomBytes } from 'node:crypto';
import { createServer } from 'node:http';
import { SMTPServer } from 'smtp-server';
import { MailBox } from './mail-box.mjs';
import { letterPage, listPage } from './mail-pages.mjs';

const LARGEST_LETTER_BYTES = 2_000_000;
const LOOPBACK = '127.0.0.1';
const HEADERS = { 'content-security-policy': "default-src 'none'; style-src 'unsafe-inline'", 'x-content-type-options': 'nosniff' };

/** @returns {{ smtpUrl: string, viewerUrl: string, box: MailBox, stop: () => Promise<void> }} */
export async function startMail({ directory, smtpPort, viewerPort }) {
  const box = new MailBox(directory);
  const smtp = new SMTPServer({
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    size: LARGEST_LETTER_BYTES,
    logger: false,
    onData: (stream, _session, done) => receive(stream, box, done),
  });
  // A client that hangs up in the middle is its own problem.
  smtp.on('error', () => undefined);
  const viewer = createServer((request, response) => {
    show(request, response, box).catch((error) => answer(response, 500, 'text/plain', String(error)));
  });
  const [usedSmtpPort, usedViewerPort] = await Promise.all([listen(smtp, smtpPort), listen(viewer, viewerPort)]);
  return {
    smtpUrl: `smtp://${LOOPBACK}:${usedSmtpPort}`,
    viewerUrl: `http://localhost:${usedViewerPort}`,
    box,
    stop: () => Promise.all([new Promise((resolve) => smtp.close(resolve)), closeViewer(viewer)]),
  };
}

function receive(stream, box, done) {
  const chunks = [];
  stream.on('data', (chunk) => chunks.push(chunk));
  stream.on('end', () => {
    if (stream.sizeExceeded) return done(Object.assign(new Error('The letter is too large'), { responseCode: 552 }));
    box.add(Buffer.concat(chunks), randomBytes(4).toString('hex'));
    return done();
  });
}

async function show(request, response, box) {
  const path = new URL(request.url ?? '/', 'http://localhost').pathname;
  if (request.method !== 'GET') return answer(response, 405, 'text/plain', 'Only reading.');
  if (path === '/') return answer(response, 200, 'text/html', listPage(await box.list()));
  if (path === '/letters.json') return answer(response, 200, 'application/json', JSON.stringify(await box.list()));
  const letter = path.startsWith('/letters/') ? await box.read(path.slice('/letters/'.length)) : undefined;
  return letter ? answer(response, 200, 'text/html', letterPage(letter)) : answer(response, 404, 'text/plain', 'No such letter.');
}

function answer(response, status, type, body) {
  response.writeHead(status, { ...HEADERS, 'content-type': `${type}; charset=utf-8` }).end(body);
}

function listen(server, port) {
  const listener = server.server ?? server;
  return new Promise((resolve, reject) => {
    listener.once('error', reject);
    server.listen(port, LOOPBACK, () => resolve(listener.address().port));
  });
}

function closeViewer(viewer) {
  viewer.closeAllConnections();
  return new Promise((resolve) => viewer.close(resolve));
}
