import { randomUUID } from 'node:crypto';
import type { LoggerService } from '@nestjs/common';
import { pino, type Logger } from 'pino';
import { pinoHttp, type HttpLogger } from 'pino-http';

/** Tokens stand in some addresses; none may reach a log. */
export const withoutSecrets = (url: string): string =>
  url.replace(/\/(collect|files)\/[^/?]+/g, '/$1/…').replace(/([?&](?:key|token|grant)=)[^&]+/g, '$1…');

export const createLogger = (level: string): Logger =>
  pino({
    level,
    base: null,
    timestamp: pino.stdTimeFunctions.isoTime,
    redact: ['req.headers.cookie', 'req.headers.authorization', 'res.headers["set-cookie"]'],
  });

/** One structured line a request, with its id, which is also answered as `X-Request-Id`. */
export const requestLog = (logger: Logger): HttpLogger =>
  pinoHttp({
    logger,
    genReqId: (request, response) => {
      const given = request.headers['x-request-id'];
      const id = typeof given === 'string' && /^[\w-]{8,64}$/.test(given) ? given : randomUUID();
      response.setHeader('X-Request-Id', id);
      return id;
    },
    autoLogging: { ignore: (request) => /^\/(api\/health|assets)\//.test(request.url ?? '') },
    customLogLevel: (_, response, fault) =>
      fault || response.statusCode >= 500 ? 'error' : response.statusCode >= 400 ? 'warn' : 'info',
    serializers: {
      req: (request: { id: unknown; method: string; url: string }) => ({
        id: request.id,
        method: request.method,
        url: withoutSecrets(request.url),
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
      err: (fault: { type: string; message: string }) => ({ type: fault.type, message: fault.message }),
    },
  });

/** Nest's own lines in the same form. */
export const nestLogger = (logger: Logger): LoggerService => ({
  log: (message: unknown, context?: unknown) => logger.info({ context }, String(message)),
  error: (message: unknown, ...rest: unknown[]) => logger.error({ context: rest.at(-1) }, String(message)),
  warn: (message: unknown, context?: unknown) => logger.warn({ context }, String(message)),
  debug: (message: unknown, context?: unknown) => logger.debug({ context }, String(message)),
  verbose: (message: unknown, context?: unknown) => logger.trace({ context }, String(message)),
});
