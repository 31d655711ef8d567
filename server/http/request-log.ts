import { randomUUID } from 'node:crypto';
import type { IncomingMessage, ServerResponse } from 'node:http';
import type { RequestHandler } from 'express';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';

/** An error without the statement and the values it was about: those may be formulas or addresses. */
function plainError(error: Error): object {
  return { type: error.name, message: error.message, stack: error.stack };
}

function requestLine(request: IncomingMessage, response: ServerResponse): object {
  const { route } = (response as ServerResponse & { locals?: { route?: string } }).locals ?? {};
  return { method: request.method, route: route ?? 'none', status: response.statusCode };
}

/** One line a request: method, route template, status, milliseconds, request id. Never bodies, addresses, tokens or URLs. */
export function requestLog(logger: Logger): RequestHandler {
  return pinoHttp({
    logger,
    genReqId: () => randomUUID(),
    quietReqLogger: true,
    serializers: { req: () => undefined, res: () => undefined, err: plainError },
    customSuccessObject: (request, response, line: object) => ({ ...line, ...requestLine(request, response) }),
    customErrorObject: (request, response, _error, line: object) => ({ ...line, err: undefined, ...requestLine(request, response) }),
    // A 503 mends itself: load was shed.
    customLogLevel: (_request, response, error) => (response.statusCode === 503 ? 'warn' : error || response.statusCode >= 500 ? 'error' : 'info'),
    customSuccessMessage: () => 'request',
    customErrorMessage: () => 'request',
    autoLogging: { ignore: (request) => (request.url ?? '').startsWith('/api/health/') || !(request.url ?? '').startsWith('/api/') },
  });
}
