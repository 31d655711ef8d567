import type { FieldProblem, ProblemCode } from '#shared/http/problem.ts';

/** An answer that is an error of the closed list; thrown by services, written by `server/http/problems.ts`. */
export class Problem extends Error {
  constructor(
    readonly code: ProblemCode,
    readonly detail: string,
    readonly extra: { errors?: FieldProblem[]; current?: unknown; retryAfterSeconds?: number } = {},
  ) {
    super(detail);
  }
}

export const notSignedIn = () => new Problem('not-signed-in', 'Sign in to go on');
export const forbidden = (right: string) => new Problem('forbidden', `This needs the right ${right}, which your role does not have`);
/** The same answer whether the record never was or belongs to another workshop. */
export const notFound = (what: string) => new Problem('not-found', `There is no such ${what} in this workshop`);
export const conflict = (detail: string) => new Problem('conflict', detail);
export const idReused = (what: string) => new Problem('conflict', `Another ${what} already has this id`);
export const stale = (current: unknown) => new Problem('stale', 'Somebody else changed this meanwhile; nothing was overwritten', { current });
export const versionNeeded = () => new Problem('version-needed', 'Send If-Match with the version you saw, for example "3"');
export const tooMany = (retryAfterSeconds: number) => new Problem('too-many', `Too many tries; wait ${retryAfterSeconds} seconds`, { retryAfterSeconds });
export const unsupportedMedia = (detail: string) => new Problem('unsupported-media', detail);
export const tooLarge = (detail: string) => new Problem('too-large', detail);
export const malformed = (detail: string) => new Problem('malformed', detail);
export const busy = (detail: string, retryAfterSeconds = 2) => new Problem('busy', detail, { retryAfterSeconds });

/** One or more fields are wrong; `pointer` is a JSON pointer such as `#/lots/0/loadFraction`. */
export const invalid = (errors: FieldProblem[]) => new Problem('invalid', errors.map((error) => error.detail).join('; '), { errors });
export const invalidField = (pointer: string, detail: string) => invalid([{ pointer, detail }]);
