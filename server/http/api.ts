import type { Express, Request, RequestHandler, Response } from 'express';
import type { DataSource } from 'typeorm';
import type { z } from 'zod';
import type { Endpoint, Parsed } from '#shared/http/endpoint.ts';
import { roleHas } from '#shared/words/rights.ts';
import { inLobby, inWorkshop, type ActingMember, type LobbyTransaction, type TransactionKind, type WorkshopTransaction } from '../db/workshop-transaction.ts';
import { forbidden, notSignedIn, unsupportedMedia } from '../problem.ts';
import { actingMember } from './acting-member.ts';
import { etagOf, versionSeen } from './etag.ts';

type AnySchema = z.ZodType | undefined;
export type AnyEndpoint = Endpoint<AnySchema, AnySchema, AnySchema, AnySchema>;

interface Asked<P extends AnySchema, Q extends AnySchema, B extends AnySchema> {
  params: Parsed<P>;
  query: Parsed<Q>;
  body: Parsed<B>;
  /** The version named by If-Match; 0 where the entry is not versioned. */
  version: number;
  request: Request;
}

type ReplyInput<R extends AnySchema> = R extends z.ZodType ? z.input<R> : void;

/** Runs one step in a transaction of the acting member's workshop. */
export type Work = <T>(step: (tx: WorkshopTransaction) => Promise<T>) => Promise<T>;

/** What a `creates` handler answers: the record, and whether an earlier try had made it already. */
export interface Created<View> {
  view: View;
  again: boolean;
}

/**
 * Serves the entries of the contract. In this order: session, right, schemas, transaction,
 * handler, reply schema, commit, and only then the first byte.
 */
export class Api {
  readonly served: AnyEndpoint[] = [];

  constructor(
    private readonly app: Express,
    private readonly source: DataSource,
    /** Own small pool for what reads much, so that it cannot starve the bench. */
    private readonly heavySource: DataSource,
  ) {}

  /** Serves an entry that needs a right of a workshop's member. */
  serve<P extends AnySchema, Q extends AnySchema, B extends AnySchema, R extends AnySchema>(
    entry: Endpoint<P, Q, B, R>,
    handler: (asked: Asked<P, Q, B> & { tx: WorkshopTransaction }) => Promise<ReplyInput<R>>,
  ): void {
    this.route(entry, async (request, response, now) => {
      const member = await this.signedIn(request, entry, now);
      const asked = parseAsked(entry, request);
      const answer = await this.inWorkshopFor(entry, member, request, now, (tx) => handler({ ...asked, tx } as never) as Promise<unknown>);
      send(entry, response, answer);
    });
  }

  /** Serves an entry that makes a record once: 201, or 200 when the same request comes again. */
  create<P extends AnySchema, Q extends AnySchema, B extends AnySchema, R extends AnySchema>(
    entry: Endpoint<P, Q, B, R>,
    handler: (asked: Asked<P, Q, B> & { tx: WorkshopTransaction }) => Promise<Created<ReplyInput<R>>>,
  ): void {
    this.route(entry, async (request, response, now) => {
      const member = await this.signedIn(request, entry, now);
      const asked = parseAsked(entry, request);
      const { view, again } = await this.inWorkshopFor(entry, member, request, now, (tx) => handler({ ...asked, tx } as never));
      response.status(again ? 200 : 201);
      send(entry, response, view);
    });
  }

  /** Serves an entry that needs no workshop: sign-in, sign-up, health, a link by mail. */
  open<P extends AnySchema, Q extends AnySchema, B extends AnySchema, R extends AnySchema>(
    entry: Endpoint<P, Q, B, R>,
    handler: (asked: Asked<P, Q, B> & { lobby: <T>(work: (tx: LobbyTransaction) => Promise<T>) => Promise<T>; now: Date; response: Response }) => Promise<ReplyInput<R>>,
  ): void {
    this.route(entry, async (request, response, now) => {
      const asked = parseAsked(entry, request);
      const lobby = <T>(work: (tx: LobbyTransaction) => Promise<T>) => inLobby(this.source, { requestId: String(request.id), now }, work);
      send(entry, response, await handler({ ...asked, lobby, now, response } as never));
    });
  }

  /** Serves an entry for whoever is signed in, whatever the role; `member` may be undefined where `right` is public. */
  account<P extends AnySchema, Q extends AnySchema, B extends AnySchema, R extends AnySchema>(
    entry: Endpoint<P, Q, B, R>,
    handler: (asked: Asked<P, Q, B> & { member: ActingMember; lobby: <T>(work: (tx: LobbyTransaction) => Promise<T>) => Promise<T>; now: Date }) => Promise<ReplyInput<R>>,
  ): void {
    this.route(entry, async (request, response, now) => {
      const member = await this.signedIn(request, entry, now);
      const asked = parseAsked(entry, request);
      const lobby = <T>(work: (tx: LobbyTransaction) => Promise<T>) => inLobby(this.source, { requestId: String(request.id), now }, work);
      send(entry, response, await handler({ ...asked, member, lobby, now } as never));
    });
  }

  /**
   * Serves an entry whose reply is written by the handler itself: files and streams.
   * The transaction stays open while the handler runs; headers go out only after the first row was read.
   */
  stream<P extends AnySchema, Q extends AnySchema, B extends AnySchema>(
    entry: Endpoint<P, Q, B, AnySchema>,
    handler: (asked: Asked<P, Q, B> & { tx: WorkshopTransaction; response: Response }) => Promise<void>,
  ): void {
    this.route(entry, async (request, response, now) => {
      const member = await this.signedIn(request, entry, now);
      const asked = parseAsked(entry, request);
      await this.inWorkshopFor(entry, member, request, now, (tx) => handler({ ...asked, tx, response } as never));
    });
  }

  /**
   * Serves a file whose bytes the handler sends itself: `work` opens a transaction for what must be
   * looked up, and none is held while a slow reader takes the bytes.
   */
  file<P extends AnySchema, Q extends AnySchema>(
    entry: Endpoint<P, Q, undefined, AnySchema>,
    handler: (asked: Asked<P, Q, undefined> & { work: Work; response: Response }) => Promise<void>,
  ): void {
    this.route(entry, async (request, response, now) => {
      const member = await this.signedIn(request, entry, now);
      const asked = parseAsked(entry, request);
      const work: Work = (step) => this.inWorkshopFor(entry, member, request, now, step);
      await handler({ ...asked, work, response } as never);
    });
  }

  /**
   * Serves an upload: right first, then the file is taken in, then the handler.
   * `work` opens transactions itself, so that none is held while bytes arrive.
   */
  upload<P extends AnySchema, Q extends AnySchema, R extends AnySchema>(
    entry: Endpoint<P, Q, AnySchema, R>,
    takeIn: RequestHandler,
    handler: (asked: Asked<P, Q, undefined> & { work: Work; response: Response }) => Promise<ReplyInput<R>>,
  ): void {
    this.route(entry, async (request, response, now) => {
      const member = await this.signedIn(request, entry, now);
      const asked = parseAsked({ ...entry, body: undefined }, request);
      await new Promise<void>((resolve, reject) => takeIn(request, response, (error?: unknown) => (error ? reject(error as Error) : resolve())));
      const work: Work = (step) => this.inWorkshopFor(entry, member, request, now, step);
      send(entry, response, await handler({ ...asked, work, response } as never));
    });
  }

  /**
   * Serves an entry that works in several transactions of its own. `aside` takes a connection of the
   * ordinary pool, e.g. to show how far the work has come, and so never waits for `work` itself.
   */
  steps<P extends AnySchema, Q extends AnySchema, B extends AnySchema, R extends AnySchema>(
    entry: Endpoint<P, Q, B, R>,
    handler: (asked: Asked<P, Q, B> & { work: Work; aside: Work }) => Promise<ReplyInput<R>>,
  ): void {
    this.route(entry, async (request, response, now) => {
      const member = await this.signedIn(request, entry, now);
      const asked = parseAsked(entry, request);
      const work: Work = (step) => this.inWorkshopFor(entry, member, request, now, step);
      const aside: Work = (step) => this.inWorkshopFor({ ...entry, heavy: false }, member, request, now, step);
      send(entry, response, await handler({ ...asked, work, aside } as never));
    });
  }

  private route(entry: AnyEndpoint, handle: (request: Request, response: Response, now: Date) => Promise<void>): void {
    this.served.push(entry);
    const path = entry.path;
    this.app[entry.method](path, async (request, response) => {
      response.locals['route'] = path;
      await handle(request, response, new Date());
    });
  }

  private async signedIn(request: Request, entry: AnyEndpoint, now: Date): Promise<ActingMember> {
    const member = await actingMember(this.source, request, now);
    if (!member) throw notSignedIn();
    if (entry.right !== 'account' && entry.right !== 'public' && !roleHas(member.role, entry.right)) throw forbidden(entry.right);
    return member;
  }

  private inWorkshopFor<T>(entry: AnyEndpoint, member: ActingMember, request: Request, now: Date, work: (tx: WorkshopTransaction) => Promise<T>): Promise<T> {
    const reads = entry.method === 'get' || entry.readOnly === true;
    const kind: TransactionKind = reads ? (entry.heavy ? 'analysis' : 'read') : 'write';
    return inWorkshop(entry.heavy ? this.heavySource : this.source, member, { requestId: String(request.id), now, kind }, work);
  }
}

/** Params, query and body through their schemas, once; all issues come back together. */
function parseAsked(entry: AnyEndpoint, request: Request): Asked<AnySchema, AnySchema, AnySchema> {
  if (entry.body && !request.is('application/json')) throw unsupportedMedia('Send JSON (Content-Type: application/json)');
  return {
    params: entry.params?.parse({ ...request.params }),
    query: entry.query?.parse({ ...request.query }),
    body: entry.body?.parse(request.body),
    version: entry.versioned ? versionSeen(request) : 0,
    request,
  } as Asked<AnySchema, AnySchema, AnySchema>;
}

/** The reply schema drops what it does not name, so it is the presenter. */
function send(entry: AnyEndpoint, response: Response, answer: unknown): void {
  if (response.headersSent) return;
  if (!entry.reply) {
    response.status(response.statusCode === 201 ? 201 : 204).end();
    return;
  }
  const body: unknown = entry.reply.parse(answer);
  if (hasVersion(body)) response.set('ETag', etagOf(body.version));
  response.set('Cache-Control', 'no-store').json(body);
}

function hasVersion(body: unknown): body is { version: number } {
  return typeof body === 'object' && body !== null && 'version' in body && typeof body.version === 'number';
}
