import { z } from 'zod';

/** The closed list of problems (RFC 9457), each with its status. */
export const PROBLEMS = {
  malformed: { status: 400, title: 'The request could not be read' },
  'not-signed-in': { status: 401, title: 'Please sign in' },
  forbidden: { status: 403, title: 'Your role does not allow this' },
  'not-found': { status: 404, title: 'Not found' },
  conflict: { status: 409, title: 'This does not fit what is already there' },
  stale: { status: 412, title: 'Somebody else changed this meanwhile' },
  'too-large': { status: 413, title: 'Too large' },
  'unsupported-media': { status: 415, title: 'This kind of content is not accepted' },
  invalid: { status: 422, title: 'Some fields need another look' },
  'version-needed': { status: 428, title: 'Say which version you saw (If-Match)' },
  'too-many': { status: 429, title: 'Too many tries' },
  unexpected: { status: 500, title: 'Something went wrong on our side' },
  busy: { status: 503, title: 'Too busy just now' },
} as const;

export type ProblemCode = keyof typeof PROBLEMS;

export const FieldProblem = z.object({ pointer: z.string(), detail: z.string() });
export type FieldProblem = z.infer<typeof FieldProblem>;

/** Body of every error: `application/problem+json`. */
export const ProblemBody = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string().optional(),
  instance: z.string().optional(),
  errors: z.array(FieldProblem).optional(),
  /** With `stale`: the record as it stands now. */
  current: z.unknown().optional(),
});
export type ProblemBody = z.infer<typeof ProblemBody>;
