import { NotFoundException } from '@nestjs/common';
import { InvalidError, StaleError, TooManyError } from '../errors/domain-error';
import { problemBody, problemOf } from './problem-details.filter';

describe('problemOf()', () => {
  it('keeps code, status and the present state of a stale edit', () => {
    expect(problemOf(new StaleError({ version: 4 }))).toMatchObject({
      code: 'stale-version',
      status: 412,
      extensions: { current: { version: 4 } },
    });
  });

  it('says when to try again after too many tries', () => {
    expect(problemOf(new TooManyError('Wait.', 11.2))).toMatchObject({ status: 429, headers: { 'retry-after': '12' } });
  });

  it.each([
    ['23505', 'already-exists', 409],
    ['23503', 'still-in-use', 409],
    ['22008', 'invalid-fields', 422],
    ['40001', 'try-again', 503],
    ['57014', 'took-too-long', 503],
    ['57P01', 'try-again', 503],
    ['CONNECTION_WAIT', 'try-again', 503],
    ['FST_ERR_HANDLER_TIMEOUT', 'took-too-long', 503],
  ])('finds %s in the cause of a wrapped error', (code, expected, status) => {
    const wrapped = new Error('Failed query', { cause: Object.assign(new Error('driver text'), { code }) });
    expect(problemOf(wrapped)).toMatchObject({ code: expected, status });
  });

  it('maps the answers of the framework by their status', () => {
    expect(problemOf(new NotFoundException('Cannot GET /x'))).toMatchObject({ code: 'not-found', status: 404 });
    expect(problemOf(Object.assign(new Error('x'), { statusCode: 413 }))).toMatchObject({ code: 'too-large' });
  });

  it('tells nothing of an unknown failure', () => {
    const answer = problemOf(new Error('select secret from person'));
    expect(answer).toMatchObject({ code: 'internal-error', status: 500 });
    expect(JSON.stringify(problemBody(answer, 'id'))).not.toContain('secret');
  });

  it('survives a chain of causes that bites its own tail', () => {
    const error = new Error('loop');
    error.cause = error;
    expect(problemOf(error).code).toBe('internal-error');
  });
});

describe('problemBody()', () => {
  it('has the members of RFC 9457 and the list of wrong fields', () => {
    const errors = [{ pointer: '#/name', detail: 'This is needed.' }];
    expect(problemBody(problemOf(new InvalidError('One field needs another look.', errors)), 'abc')).toEqual({
      type: '/problems/invalid-fields',
      title: 'Some fields need another look',
      status: 422,
      detail: 'One field needs another look.',
      instance: 'urn:uuid:abc',
      code: 'invalid-fields',
      errors,
    });
  });
});
