/**
 * The one table of routes. A capability's router is a list of definitions: address, who may, what comes in, what goes out.
 * Authorisation, validation, versions, rate limits and the OpenAPI description all follow from it, so none can be forgotten.
 */
import type { Request, Response } from 'express';
import { z } from 'zod';
import type { Role } from '../../../shared/accounts/accounts-contract';
import type { Actor, Context } from './context';
import { Problem, read } from './problems';
import type { LimitName, RateLimits } from './rate-limits';

/** Who may call a route: anybody, every signed-in person, or people who hold one of the roles. */
export type May = 'anyone' | 'member' | Role;

/** What a handler may do to the request's session, beside its verb. */
export interface SessionActions {
  authenticate(): Promise<Actor | null>;
  start(actor: Actor): Promise<void>;
  end(): Promise<void>;
}

export interface RequestContext extends Context {
  /** The visitor's network address, for rate limits. */
  address: string;
  limits: RateLimits;
  session: SessionActions;
}

/** A file for the browser to save. */
export class Download {
  constructor(
    readonly fileName: string,
    readonly contentType: string,
    readonly content: string | Buffer,
  ) {}
}

/** A page to be shown in a frame of ours: runs nothing, loads nothing, and leads to links in the whole window. */
export class FramedPage {
  constructor(readonly html: string) {}
}

type In<S> = S extends z.ZodType ? z.output<S> : undefined;
type Out<S> = S extends z.ZodType ? z.input<S> : void;

export interface RouteInput<P, Q, B> {
  params: In<P>;
  query: In<Q>;
  body: In<B>;
  /** The version named by If-Match; present on versioned routes. */
  version: number;
}

interface RouteShape<P, Q, B, A> {
  method: 'get' | 'post' | 'put' | 'delete';
  path: `/api/${string}`;
  may: readonly May[];
  summary: string;
  params?: P;
  query?: Q;
  body?: B;
  /** What the answer holds. Anything else a handler returns is left out, so a new column is never published by accident. */
  answer?: A;
  status?: 200 | 201 | 202 | 204;
  /** The request must name the version it changes (If-Match). */
  versioned?: true;
  limit?: LimitName;
  /** Largest body in bytes. */
  bodyLimit?: number;
  handle(ctx: RequestContext, input: RouteInput<P, Q, B>): Promise<Out<A> | Download | FramedPage>;
}

/** A route with its types folded away, for tables. */
export interface Route extends Omit<RouteShape<z.ZodType, z.ZodType, z.ZodType, z.ZodType>, 'handle'> {
  answerTo(ctx: RequestContext, req: Request): Promise<unknown>;
}

export const BODY_LIMIT = 200_000;

/** Declares one route. */
export function route<
  P extends z.ZodType | undefined = undefined,
  Q extends z.ZodType | undefined = undefined,
  B extends z.ZodType | undefined = undefined,
  A extends z.ZodType | undefined = undefined,
>(shape: RouteShape<P, Q, B, A>): Route {
  const { handle, ...table } = shape;
  return {
    ...(table as Omit<Route, 'answerTo'>),
    async answerTo(ctx, req) {
      const input = {
        params: shape.params ? read(shape.params, req.params) : undefined,
        query: shape.query ? read(shape.query, req.query) : undefined,
        body: shape.body ? read(shape.body, req.body ?? {}) : undefined,
        version: shape.versioned ? versionOf(req) : 0,
      };
      const result = await handle(ctx, input as RouteInput<P, Q, B>);
      if (result instanceof Download || result instanceof FramedPage || !shape.answer) return result;
      return shape.answer.parse(result);
    },
  };
}

/** Refuses an actor whom the table does not name. */
export function authorise(table: Pick<Route, 'may'>, actor: Actor | null): void {
  if (table.may.includes('anyone')) return;
  if (!actor) throw new Problem('unauthenticated', 'Please sign in');
  if (table.may.includes('member')) return;
  if (!actor.roles.some((role) => table.may.includes(role)))
    throw new Problem('forbidden', 'Your role does not include this');
}

function versionOf(req: Request): number {
  const header = req.get('if-match');
  if (header === undefined)
    throw new Problem('version-required', 'This request must say which version it changes (If-Match)');
  const version = /^"?(\d{1,9})"?$/.exec(header)?.[1];
  if (version === undefined) throw new Problem('invalid', 'If-Match must hold the version as a number');
  return Number(version);
}

const FRAMED_POLICY =
  "default-src 'none'; style-src 'unsafe-inline'; img-src data:; frame-ancestors 'self'; sandbox allow-top-navigation-by-user-activation";

/** Writes a handler's result as the answer. */
export function send(res: Response, table: Pick<Route, 'status'>, result: unknown): void {
  if (result instanceof Download) {
    res.setHeader('content-disposition', disposition(result.fileName));
    res.type(result.contentType).send(result.content);
    return;
  }
  if (result instanceof FramedPage) {
    res.setHeader('content-security-policy', FRAMED_POLICY);
    res.setHeader('x-frame-options', 'SAMEORIGIN');
    res.type('html').send(result.html.replace('<head>', () => '<head><base target="_top">'));
    return;
  }
  if (result === undefined) {
    res.status(table.status ?? 204).end();
    return;
  }
  if (typeof result === 'object' && result !== null && 'version' in result)
    res.setHeader('etag', `"${String(result.version)}"`);
  res.status(table.status ?? 200).json(result);
}

// RFC 6266: a plain name for old clients, the real one in filename*.
function disposition(fileName: string): string {
  const plain = fileName.normalize('NFKD').replace(/[^A-Za-z0-9 ._-]/g, '_');
  return `attachment; filename="${plain}"; filename*=UTF-8''${encodeURIComponent(fileName)}`;
}
