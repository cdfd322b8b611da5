import { Catch, HttpException, Logger, type ArgumentsHost, type ExceptionFilter } from '@nestjs/common';
import { problemStatus, type Problem, type ProblemCode } from '@windchest/contracts';
import type { Request, Response } from 'express';
import { ZodError } from 'zod';
import { errnoOf } from '../database/errors.js';
import { Refusal } from './refusal.js';

const titles: Partial<Record<ProblemCode, string>> = {
  'not-found': 'Not found',
  forbidden: 'Not allowed',
  'not-signed-in': 'Sign in first',
  'validation-failed': 'Something is missing or wrong',
  'too-many-requests': 'Too many requests',
  'busy-try-again': 'Busy',
  internal: 'A fault of ours',
};

/** Every error leaves as `application/problem+json` with a code of the contract; nothing inner is shown. */
@Catch()
export class ProblemFilter implements ExceptionFilter {
  private readonly log = new Logger('Problem');

  catch(fault: unknown, host: ArgumentsHost): void {
    const context = host.switchToHttp();
    const request = context.getRequest<Request & { id?: unknown }>();
    const response = context.getResponse<Response>();
    const refusal = toRefusal(fault);
    const requestId = String(request.id ?? '');
    if (refusal.status >= 500)
      this.log.error(
        `${refusal.code} ${requestId}: ${fault instanceof Error ? (fault.stack ?? fault.message) : String(fault)}`,
      );
    if (response.headersSent) {
      response.destroy();
      return;
    }
    if (refusal.more.retryAfterSeconds)
      response.setHeader('Retry-After', String(refusal.more.retryAfterSeconds));
    const body: Problem = {
      type: 'about:blank',
      title:
        titles[refusal.code] ??
        refusal.code.replaceAll('-', ' ').replace(/^./, (first) => first.toUpperCase()),
      status: refusal.status,
      code: refusal.code,
      detail: refusal.detail,
      requestId,
      ...(refusal.more.fields ? { fields: refusal.more.fields } : {}),
    };
    response.status(refusal.status).type('application/problem+json').send(JSON.stringify(body));
  }
}

const byStatus: Record<number, ProblemCode> = {
  400: 'bad-request',
  401: 'not-signed-in',
  403: 'forbidden',
  404: 'not-found',
  405: 'method-not-allowed',
  413: 'file-too-large',
  416: 'range-not-satisfiable',
  429: 'too-many-requests',
};

export const toRefusal = (fault: unknown): Refusal => {
  if (fault instanceof Refusal) return fault;
  if (fault instanceof ZodError)
    return new Refusal(
      'internal',
      'The shop could not answer as it should. Nothing was changed by this answer.',
    );
  if (fault instanceof HttpException)
    return new Refusal(byStatus[fault.getStatus()] ?? 'internal', sentenceFor(fault));
  const status = (fault as { status?: unknown; statusCode?: unknown } | null)?.status;
  if (typeof status === 'number' && status < 500 && byStatus[status])
    return new Refusal(byStatus[status], 'The request could not be read.');
  if ([1020, 1205, 1213, 1040].includes(errnoOf(fault) ?? 0))
    return new Refusal(
      'busy-try-again',
      'Too many people are here at this moment. Try again in a few seconds.',
      { retryAfterSeconds: 2 },
    );
  return new Refusal(
    'internal',
    'Something went wrong on our side. Try again; if it stays, tell us the request number.',
  );
};

const sentenceFor = (fault: HttpException): string =>
  fault.getStatus() === 404
    ? 'There is nothing at this address.'
    : problemStatus.internal === fault.getStatus()
      ? 'Something went wrong on our side.'
      : fault.message;
