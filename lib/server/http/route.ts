import { randomUUID } from 'node:crypto';
import type { z } from 'zod';
import type { Role } from '@/lib/contracts/common';
import { AppError, unauthenticated } from '../errors';
import { logger } from '../logger';
import { demandRole } from '../policy';
import type { MemberActor } from '../policy';
import { readActor } from '../session';
import { readBearer } from '../session/bearer';
import { answer } from './answer';
import { parseInput, parseParams, readJson } from './input';
import { problemResponse, toAppError } from './problem';
import { demandSameOrigin } from './same-origin';

type Schema = z.ZodType | undefined;
type Parsed<S> = S extends z.ZodType ? z.output<S> : undefined;
type BodyOption = z.ZodType | 'none' | 'stream' | undefined;

interface RouteOptions<R extends Role | 'public', P extends Schema, Q extends Schema, B extends BodyOption> {
  /** At least this role; 'public' asks for no session. */
  role: R;
  params?: P;
  query?: Q;
  /** A schema for JSON; 'stream' leaves `request.body` to the handler; 'none' (also when left out) reads nothing. */
  body?: B;
  /** Lets a request in that no page of ours sent; only for a public route whose address is itself the permission. */
  fromAnywhere?: true;
}

export interface RouteContext<R extends Role | 'public', P, Q, B> {
  actor: R extends 'public' ? null : MemberActor;
  params: Parsed<P>;
  query: Parsed<Q>;
  body: Parsed<B>;
  request: Request;
  requestId: string;
}

/**
 * Wraps a route handler: same origin for what changes anything, session, role, zod for params, query and body, a request
 * id, one log line, and problem+json for every refusal. What the handler returns is answered as JSON; a Response as it is.
 * @example export const GET = route({ role: 'viewer', params: z.object({ projectId: idSchema }) }, async ({ actor, params }) => …)
 */
export function route<
  R extends Role | 'public',
  P extends Schema = undefined,
  Q extends Schema = undefined,
  B extends BodyOption = undefined,
>(options: RouteOptions<R, P, Q, B>, handle: (context: RouteContext<R, P, Q, B>) => Promise<unknown>) {
  const handler = async (request: Request, context?: { params: Promise<object> }): Promise<Response> => {
    const requestId = randomUUID();
    const startedAt = performance.now();
    let response: Response;
    try {
      // A browser adds a cookie by itself, an Authorization header never: only the cookie needs the page's word.
      if (!options.fromAnywhere && readBearer(request) === null) demandSameOrigin(request);
      const actor = options.role === 'public' ? null : await demandActor(request, options.role);
      const params = options.params && parseParams(options.params, await context?.params);
      const query = options.query && parseInput(options.query, Object.fromEntries(new URL(request.url).searchParams));
      const body = typeof options.body === 'object' ? parseInput(options.body, await readJson(request)) : undefined;
      const result = await handle({ actor, params, query, body, request, requestId } as RouteContext<R, P, Q, B>);
      response = result instanceof Response ? result : answer(result);
    } catch (error) {
      const refusal = toAppError(error, requestId);
      if (refusal.status >= 500) logger.error({ requestId, err: error }, 'request failed');
      response = problemResponse(refusal, requestId);
    }
    response.headers.set('x-request-id', requestId);
    // What a member may see is nobody else's: no cache keeps it unless the route says so.
    if (!response.headers.has('cache-control')) response.headers.set('cache-control', 'no-store');
    const ms = Math.round(performance.now() - startedAt);
    logger.info(
      { requestId, method: request.method, path: loggedPath(request), status: response.status, ms },
      'request',
    );
    return response;
  };
  // Says what it takes, so that the OpenAPI document can be held against it.
  return Object.assign(handler, { takes: options });
}

async function demandActor(request: Request, role: Role): Promise<MemberActor> {
  const actor = await readActor(request);
  if (!actor) throw unauthenticated();
  if (actor.apiToken?.readOnly && request.method !== 'GET') throw readOnlyToken();
  demandRole(actor, role);
  return actor;
}

function readOnlyToken(): AppError {
  const detail = 'This token may only read. Make one that may change things, under API tokens in the account menu.';
  return new AppError({ status: 403, code: 'token_read_only', detail });
}

/** Tokens of share, invitation and reset links are keys: they stay out of the log. */
function loggedPath(request: Request): string {
  return new URL(request.url).pathname.replace(/\/[\w-]{40,}(?=\/|$)/g, '/[token]');
}
