import type { ErrorRequestHandler } from 'express';
import { MulterError } from 'multer';
import { QueryFailedError } from 'typeorm';
import { ZodError } from 'zod';
import { PROBLEMS, type ProblemBody } from '#shared/http/problem.ts';
import { Problem, busy, conflict, invalid, malformed, tooLarge, unsupportedMedia } from '../problem.ts';

/** RFC 6901 pointer into the part of the request that the issue is about. */
export function pointerTo(path: readonly PropertyKey[]): string {
  return `#${path.map((step) => `/${String(step).replaceAll('~', '~0').replaceAll('/', '~1')}`).join('')}`;
}

/** All issues of a failed parse, each with its field; an unknown field is named too. */
export function problemFromZod(error: ZodError): Problem {
  return invalid(
    error.issues.flatMap((issue) =>
      issue.code === 'unrecognized_keys'
        ? issue.keys.map((key) => ({ pointer: pointerTo([...issue.path, key]), detail: `${key} is not a field here` }))
        : [{ pointer: pointerTo(issue.path), detail: issue.message }],
    ),
  );
}

const MULTER_PROBLEMS: Partial<Record<string, (error: MulterError) => Problem>> = {
  LIMIT_FILE_SIZE: () => tooLarge('A file is larger than allowed'),
  LIMIT_FILE_COUNT: () => tooLarge('Too many files at once'),
};

interface BodyParserError extends Error {
  type?: string;
  status?: number;
}

function problemOf(error: unknown): Problem | undefined {
  if (error instanceof Problem) return error;
  if (error instanceof ZodError) return problemFromZod(error);
  if (error instanceof MulterError) return MULTER_PROBLEMS[error.code]?.(error) ?? malformed(`The upload could not be read: ${error.message}`);
  if (error instanceof QueryFailedError) return problemOfQuery(error.driverError as { code?: string });
  if (error instanceof Error && /timeout exceeded when trying to connect|Connection terminated|ECONNREFUSED/.test(error.message)) {
    return busy('The database cannot be reached just now');
  }
  const parser = error as BodyParserError;
  if (parser?.type === 'entity.too.large') return tooLarge('The request is larger than 256 KiB');
  if (parser?.type === 'entity.parse.failed') return new Problem('malformed', 'The body is not valid JSON', { errors: [{ pointer: '#', detail: 'Not valid JSON' }] });
  // The file server's own word for a missing asset.
  if (parser?.status === 404) return new Problem('not-found', 'There is no such file');
  if (typeof parser?.status === 'number' && parser.status >= 400 && parser.status < 500) {
    return parser.status === 415 ? unsupportedMedia(parser.message) : malformed('The request could not be read');
  }
  return undefined;
}

/** PostgreSQL errors that a person or a second server can run into; all others are ours to mend. */
function problemOfQuery({ code }: { code?: string }): Problem | undefined {
  if (code === '57014') return busy('This took too long and was stopped', 5);
  if (code === '55P03' || code === '40P01' || code === '40001') return busy('Somebody else is writing the same record; try again', 1);
  if (code === '23505') return conflict('A record like this already exists');
  if (code === '57P01' || code === '57P03' || code === '53300') return busy('The database cannot be reached just now');
  return undefined;
}

/** The last handler: every error leaves as `application/problem+json`, the unknown ones told by reference only. */
export const problemHandler: ErrorRequestHandler = (error: unknown, request, response, next) => {
  if (response.headersSent) {
    next(error);
    return;
  }
  const known = problemOf(error);
  if (!known) request.log.error({ err: error }, 'unexpected');
  const problem = known ?? new Problem('unexpected', `Nothing was lost. Tell us this reference: ${String(request.id)}`);
  const { status, title } = PROBLEMS[problem.code];
  const body: ProblemBody = {
    type: `/problems/${problem.code}`,
    title,
    status,
    detail: problem.detail,
    instance: String(request.id),
    ...(problem.extra.errors ? { errors: problem.extra.errors } : {}),
    ...(problem.extra.current === undefined ? {} : { current: problem.extra.current }),
  };
  if (problem.extra.retryAfterSeconds) response.set('Retry-After', String(problem.extra.retryAfterSeconds));
  response.status(status).type('application/problem+json').send(JSON.stringify(body));
};
