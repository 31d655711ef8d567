import type { z } from 'zod';
import type { Access } from '../words/rights.ts';

type Shape = z.ZodType | undefined;

/**
 * One entry of the contract: the server serves it, the client calls it, and the
 * OpenAPI document and the test of rights are made from it.
 *
 * `path` holds `:name` parameters. `versioned` entries need If-Match and answer with
 * an ETag. `creates` entries take a client-made id and answer 201, or 200 to a repeat.
 * `accepts` and `streams` name a media type in place of a JSON body or reply.
 */
export interface Endpoint<Params extends Shape = Shape, Query extends Shape = Shape, Body extends Shape = Shape, Reply extends Shape = Shape> {
  method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  path: `/api/${string}`;
  summary: string;
  right: Access;
  params?: Params;
  query?: Query;
  body?: Body;
  reply?: Reply;
  versioned?: boolean;
  creates?: boolean;
  /** Media type of an upload, e.g. `multipart/form-data`. */
  accepts?: string;
  /** Media type of a streamed reply, e.g. `text/csv`. */
  streams?: string;
  /** Reads many rows or fits models: longer time limit, own pool, shed first. */
  heavy?: boolean;
  /** A read although it is a POST (a preview, a what-if): nothing is changed. */
  readOnly?: boolean;
}

export function endpoint<Params extends Shape = undefined, Query extends Shape = undefined, Body extends Shape = undefined, Reply extends Shape = undefined>(
  entry: Endpoint<Params, Query, Body, Reply>,
): Endpoint<Params, Query, Body, Reply> {
  return entry;
}

/** What a schema gives after parsing; undefined where the entry has none. */
export type Parsed<S extends Shape> = S extends z.ZodType ? z.output<S> : undefined;
/** What may be sent for a schema. */
export type Sent<S extends Shape> = S extends z.ZodType ? z.input<S> : undefined;
