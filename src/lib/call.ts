import type { z } from 'zod';
import type { Endpoint, Parsed, Sent } from '#shared/http/endpoint.ts';
import { ProblemBody } from '#shared/http/problem.ts';

/** An error answer of the server, with its field pointers. */
export class CallProblem extends Error {
  constructor(readonly problem: ProblemBody) {
    super(problem.detail ?? problem.title);
  }

  get status(): number {
    return this.problem.status;
  }
}

/** No answer at all: out of reception, or the server is down. */
export class NoReception extends Error {
  constructor() {
    super('No reception: nothing was sent, and nothing you typed is lost');
  }
}

type Shape = z.ZodType | undefined;
type Given<Name extends string, S extends Shape> = S extends z.ZodType ? Record<Name, Sent<S>> : { [K in Name]?: undefined };

export type CallInput<P extends Shape, Q extends Shape, B extends Shape> = Given<'params', P> & Given<'query', Q> & Given<'body', B> & { version?: number; signal?: AbortSignal };

/** Address of an entry with its parameters filled in; undefined query values are left out. */
export function addressOf(entry: Pick<Endpoint, 'path'>, params: object = {}, query: object = {}): string {
  const values = new Map<string, unknown>(Object.entries(params));
  const path = entry.path.replaceAll(/:(\w+)/g, (_all, name: string) => encodeURIComponent(String(values.get(name))));
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query)) {
    if (value !== undefined && value !== null && value !== '') search.set(name, Array.isArray(value) ? value.join(',') : String(value));
  }
  const text = search.toString();
  return text ? `${path}?${text}` : path;
}

/**
 * Calls an entry of the contract and gives its parsed reply.
 *
 * @throws CallProblem for an error answer, NoReception when there was no answer
 */
export async function call<P extends Shape, Q extends Shape, B extends Shape, R extends Shape>(
  entry: Endpoint<P, Q, B, R>,
  input: CallInput<P, Q, B> = {} as CallInput<P, Q, B>,
): Promise<Parsed<R>> {
  const { params, query, body, version, signal } = input as { params?: object; query?: object; body?: unknown; version?: number; signal?: AbortSignal };
  const headers: Record<string, string> = { Accept: 'application/json' };
  if (body !== undefined) headers['Content-Type'] = 'application/json';
  if (version !== undefined) headers['If-Match'] = `"${version}"`;
  let response: Response;
  try {
    response = await fetch(addressOf(entry, params, query), {
      method: entry.method.toUpperCase(),
      headers,
      credentials: 'same-origin',
      ...(body === undefined ? {} : { body: JSON.stringify(body) }),
      ...(signal ? { signal } : {}),
    });
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw new NoReception();
  }
  if (!response.ok) throw new CallProblem(await problemIn(response));
  return (entry.reply ? entry.reply.parse(await response.json()) : undefined) as Parsed<R>;
}

/** The problem in an error answer; one is made up when a proxy answered in its own words. */
export async function problemIn(response: Response): Promise<ProblemBody> {
  const read = ProblemBody.safeParse(await response.json().catch(() => undefined));
  return read.success ? read.data : { type: '/problems/unexpected', title: 'Something went wrong on our side', status: response.status };
}
