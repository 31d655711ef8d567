import { randomUUID } from 'node:crypto';
import type { RequestHandler } from 'express';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';

/** One line a request: method, route template, status, milliseconds, request id. Never bodies, addresses, tokens or URLs. */
export function requestLog(logger: Logger): RequestHandler {
  return pinoHttp({
    logger,
    genReqId: () => randomUUID(),
    quietReqLogger: true,
    serializers: { req: () => undefined, res: () => undefined },
    customProps: (request, response) => ({
      method: request.method,
      route: (response as unknown as { locals?: Record<string, unknown> }).locals?.['route'] ?? 'static',
      status: response.statusCode,
    }),
    customLogLevel: (_request, response, error) => (error || response.statusCode >= 500 ? 'error' : 'info'),
    customSuccessMessage: () => 'request',
    customErrorMessage: () => 'request',
    autoLogging: { ignore: (request) => (request.url ?? '').startsWith('/api/health/') || !(request.url ?? '').startsWith('/api/') },
  });
}
