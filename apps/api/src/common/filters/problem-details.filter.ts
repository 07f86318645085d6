import { type ArgumentsHost, Catch, type ExceptionFilter, HttpException, Logger } from '@nestjs/common';
import type { FastifyReply, FastifyRequest } from 'fastify';
import { DomainError } from '../errors/domain-error';
import { frameworkProblem } from './framework-problem';
import { type Problem, problem } from './problem';

/** What a route says of the content it would have answered with; a refusal in its place must be neither kept nor saved as a file. */
const ABOUT_THE_CONTENT = ['cache-control', 'content-disposition', 'content-security-policy', 'etag'];

/** Turns every failure into RFC 9457 problem details. What is not known becomes 500 without internals, logged with the request id. */
@Catch()
export class ProblemDetailsFilter implements ExceptionFilter {
  private readonly logger = new Logger(ProblemDetailsFilter.name);

  catch(error: unknown, host: ArgumentsHost): void {
    const http = host.switchToHttp();
    const request = http.getRequest<FastifyRequest>();
    const reply = http.getResponse<FastifyReply>();
    if (reply.sent) return;
    const answer = problemOf(error);
    if (answer.status >= 500) this.logger.error({ err: error, requestId: request.id, code: answer.code }, answer.title);
    for (const name of ABOUT_THE_CONTENT) reply.removeHeader(name);
    void reply
      .code(answer.status)
      .headers(answer.headers)
      .type('application/problem+json; charset=utf-8')
      .send(problemBody(answer, request.id));
  }
}

/** Members of the answer in the order of RFC 9457, extensions last. */
export function problemBody({ code, title, status, detail, extensions }: Problem, requestId: string) {
  return { type: `/problems/${code}`, title, status, detail, instance: `urn:uuid:${requestId}`, code, ...extensions };
}

/** The problem that stands for a failure. */
export function problemOf(error: unknown): Problem {
  if (error instanceof DomainError) {
    const { code, title, status, detail, extensions, headers } = error;
    return { code, title, status, detail, extensions, headers };
  }
  const known = frameworkProblem(error instanceof HttpException ? { statusCode: error.getStatus() } : error);
  return known ?? problem('internal-error', 'Try again. If it stays, tell whoever runs this server the id of this answer.');
}
