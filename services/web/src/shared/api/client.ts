import type { RouteKey } from '@noonwell/schema';
import type { z } from 'zod';
import { ApiProblem, ContractError, NoAnswerError, problemOf } from './problem.js';
import { routeRequest, type QueryValues, type RouteParams } from './route-url.js';
import { currentToken, endSession, getSession, refreshSession } from './session.js';

interface CallOptions {
  query?: QueryValues;
  /** Sent as JSON. */
  body?: unknown;
  headers?: Readonly<Record<string, string>>;
  signal?: AbortSignal;
}

export type RouteCall<Route extends RouteKey> = CallOptions & RouteParams<Route>;

/**
 * Calls a route of the shared table and checks the answer against its schema.
 *
 * @throws ApiProblem when the server refuses, NoAnswerError when it is out of reach, ContractError when
 *   the answer has another form than agreed
 */
export async function request<Route extends RouteKey, Schema extends z.ZodType>(
  route: Route,
  schema: Schema,
  ...[call]: CallArguments<Route>
): Promise<z.output<Schema>> {
  const response = await requestRaw(route, ...([call] as CallArguments<Route>));
  let body: unknown;
  try {
    body = await response.json();
  } catch (error) {
    throw new ContractError(route, error);
  }
  const parsed = schema.safeParse(body);
  if (!parsed.success) throw new ContractError(route, parsed.error);
  return parsed.data;
}

/** The options may be left out where the route has no parameters. */
type CallArguments<Route extends RouteKey> =
  RouteParams<Route> extends { params: object } ? [call: RouteCall<Route>] : [call?: RouteCall<Route>];

/** Calls a route whose answer has no body, or one that is read by the caller (Arrow, text, events). */
export async function requestRaw<Route extends RouteKey>(
  route: Route,
  ...[call]: CallArguments<Route>
): Promise<Response> {
  const { params, query, ...options }: CallOptions & { params?: Readonly<Record<string, string>> } =
    call ?? {};
  const target = routeRequest(route, params, query);
  let response = await send(route, target, options, await currentToken());
  if (response.status === 401 && getSession().status === 'signedIn') {
    // The token was refused early (server restarted, clock changed): one new token, one more try.
    if (await refreshSession()) response = await send(route, target, options, await currentToken());
    if (response.status === 401) endSession();
  }
  if (response.ok) return response;
  const body: unknown = await response.json().catch(() => null);
  throw new ApiProblem(problemOf(response.status, body), route);
}

async function send(
  route: RouteKey,
  target: { method: string; url: string },
  { body, headers, signal }: CallOptions,
  token: string | null,
): Promise<Response> {
  const init: RequestInit = {
    method: target.method,
    credentials: 'same-origin',
    headers: {
      accept: 'application/json, application/problem+json',
      ...(body === undefined ? {} : { 'content-type': 'application/json' }),
      ...(token === null ? {} : { authorization: `Bearer ${token}` }),
      ...headers,
    },
  };
  if (body !== undefined) init.body = JSON.stringify(body);
  if (signal !== undefined) init.signal = signal;
  try {
    return await fetch(target.url, init);
  } catch (error) {
    // A cancelled request is the caller's own wish, not a fault.
    if (signal?.aborted === true) throw error;
    throw new NoAnswerError(route, error);
  }
}
