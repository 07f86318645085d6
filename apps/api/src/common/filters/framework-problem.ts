import { type Problem, problem } from './problem';

const NO_TIME = 'A day or a time is none that can be stored. Enter it again.';
const RETRY_SOON = { 'retry-after': '1' };

/** SQLSTATE → problem. Classes of two characters stand for all their members. */
const BY_SQLSTATE: Readonly<Record<string, () => Problem>> = {
  '23505': () => problem('already-exists'),
  '23503': () => problem('still-in-use', 'It refers to something that is not there, or something else refers to it. Load the page again.'),
  '23514': () => problem('conflict', 'The database refused a value that breaks a rule. Load the page again and check the entries.'),
  '22P05': () => problem('invalid-fields', 'A text holds a character that cannot be stored. Type it again.'),
  '22021': () => problem('invalid-fields', 'A text holds a character that cannot be stored. Type it again.'),
  '22007': () => problem('invalid-fields', NO_TIME),
  '22008': () => problem('invalid-fields', NO_TIME),
  '22003': () => problem('invalid-fields', 'A number is too large to be stored.'),
  '40001': () => problem('try-again', undefined, RETRY_SOON),
  '40P01': () => problem('try-again', undefined, RETRY_SOON),
  '55P03': () => problem('try-again', undefined, RETRY_SOON),
  '57014': () => problem('took-too-long', undefined, RETRY_SOON),
  '08': () => problem('try-again', undefined, RETRY_SOON),
  '3D': () => problem('try-again', undefined, RETRY_SOON),
  '53': () => problem('try-again', undefined, RETRY_SOON),
  '57': () => problem('try-again', undefined, RETRY_SOON),
};

/** Error codes of the driver, of Node's sockets and of Fastify. */
const BY_CODE: Readonly<Record<string, () => Problem>> = {
  CONNECTION_WAIT: () => problem('try-again', undefined, RETRY_SOON),
  CONNECTION_CLOSED: () => problem('try-again', undefined, RETRY_SOON),
  CONNECTION_ENDED: () => problem('try-again', undefined, RETRY_SOON),
  CONNECTION_DESTROYED: () => problem('try-again', undefined, RETRY_SOON),
  CONNECT_TIMEOUT: () => problem('try-again', undefined, RETRY_SOON),
  ECONNREFUSED: () => problem('try-again', undefined, RETRY_SOON),
  ECONNRESET: () => problem('try-again', undefined, RETRY_SOON),
  EPIPE: () => problem('try-again', undefined, RETRY_SOON),
  FST_ERR_HANDLER_TIMEOUT: () => problem('took-too-long', undefined, RETRY_SOON),
  FST_REQ_FILE_TOO_LARGE: () => problem('too-large'),
};

const BY_STATUS: Readonly<Record<number, () => Problem>> = {
  400: () => problem('bad-request'),
  401: () => problem('not-signed-in'),
  403: () => problem('not-permitted'),
  404: () => problem('not-found', 'This address leads nowhere. Check it, or go back to the start page.'),
  405: () => problem('method-not-allowed'),
  413: () => problem('too-large'),
  415: () => problem('unsupported-type'),
  429: () => problem('too-many-tries'),
  503: () => problem('try-again', undefined, RETRY_SOON),
};

/** The problem for a failure of the database, the driver or the framework; undefined when it is none that a caller can act on. */
export function frameworkProblem(error: unknown): Problem | undefined {
  for (const link of causes(error)) {
    const known = byCode(textOf(link, 'code')) ?? byName(textOf(link, 'name'));
    if (known !== undefined) return known;
  }
  const status = typeof error === 'object' && error !== null && 'statusCode' in error ? error.statusCode : undefined;
  return typeof status === 'number' ? (BY_STATUS[status]?.() ?? otherClientFault(status)) : undefined;
}

/** SQLSTATE of a failed statement, however deep the driver's error is wrapped. */
export function sqlStateOf(error: unknown): string | undefined {
  return causes(error)
    .map((link) => textOf(link, 'code'))
    .find((code) => code !== undefined && /^[0-9A-Z]{5}$/.test(code));
}

/** What is left of a statement whose connection went away under it. The server has rolled its transaction back. */
const CONNECTION_LOSSES = ['57P01', 'CONNECTION_CLOSED', 'CONNECTION_DESTROYED', 'ECONNRESET', 'EPIPE'];

/** True when the failure is the loss of a connection, which says nothing about the statement itself. */
export function isConnectionLoss(error: unknown): boolean {
  return causes(error).some((link) => CONNECTION_LOSSES.includes(textOf(link, 'code') ?? ''));
}

function causes(error: unknown): object[] {
  const chain: object[] = [];
  let link = error;
  while (typeof link === 'object' && link !== null && !chain.includes(link)) {
    chain.push(link);
    link = 'cause' in link ? link.cause : undefined;
  }
  return chain;
}

function textOf(link: object, field: string): string | undefined {
  const value: unknown = Reflect.get(link, field);
  return typeof value === 'string' ? value : undefined;
}

function byCode(code: string | undefined): Problem | undefined {
  if (code === undefined) return undefined;
  const exact = BY_SQLSTATE[code] ?? BY_CODE[code];
  if (exact !== undefined) return exact();
  return /^[0-9A-Z]{5}$/.test(code) ? BY_SQLSTATE[code.slice(0, 2)]?.() : undefined;
}

const byName = (name: string | undefined) => (name === 'ConnectionWaitError' ? problem('try-again', undefined, RETRY_SOON) : undefined);

const otherClientFault = (status: number) => (status >= 400 && status < 500 ? problem('bad-request') : undefined);
