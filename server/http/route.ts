import type { Request, Response } from 'express';
import type { Dto } from './validated';

export type Role = 'technician' | 'lead' | 'apprentice' | 'manager';
export const everyRole: readonly Role[] = ['technician', 'lead', 'apprentice', 'manager'];

/** Who asks, as the access token says. */
export interface Principal {
  readonly personId: string;
  readonly displayName: string;
  readonly role: Role;
  readonly siteId: string;
}

/** What a route takes besides its address. `document` is a JSON object that the feature itself checks. */
export type RouteBody<B extends object> =
  | { readonly kind: 'json'; readonly dto: Dto<B>; readonly limitBytes: number }
  | { readonly kind: 'document'; readonly describedBy?: Dto<object>; readonly limitBytes: number }
  | { readonly kind: 'bytes'; readonly limitBytes: number };

/** What a route says of itself: how its input is checked and how OpenAPI describes it. */
export interface RouteSays<B extends object, Q extends object> {
  readonly summary: string;
  readonly body?: RouteBody<B>;
  readonly query?: Dto<Q>;
  /** Status -> the class of the answer's body (in brackets: a list of them), or words where there is none. */
  readonly answers: Readonly<Record<number, Dto<object> | readonly [Dto<object>] | string>>;
}

/** One request, checked: rights first, then size, then shape. */
export interface Call<B extends object, Q extends object> {
  readonly req: Request;
  readonly res: Response;
  readonly params: Readonly<Record<string, string>>;
  readonly body: B;
  readonly query: Q;
  /** The body as it came over the wire (after decompression), for signatures and attachments. */
  readonly bytes: Buffer;
}

export type Reply =
  | { readonly status: number; readonly json?: unknown; readonly type?: string }
  | { readonly status: number; readonly bytes: Buffer; readonly type: string; readonly cacheControl?: string };

export interface Route {
  readonly method: 'get' | 'post' | 'put' | 'delete';
  readonly path: string;
  readonly roles: readonly Role[] | 'anyone';
  readonly says: RouteSays<object, object>;
  readonly handle: (call: Call<object, object>, person: Principal | undefined) => Promise<Reply>;
}

/** A route for people with one of these roles. */
export function route<B extends object = object, Q extends object = object>(
  method: Route['method'],
  path: string,
  roles: readonly Role[],
  says: RouteSays<B, Q>,
  handle: (call: Call<B, Q>, person: Principal) => Promise<Reply>,
): Route {
  return {
    method,
    path,
    roles,
    says,
    handle: (call, person) => {
      if (person === undefined) throw new TypeError(`${method} ${path} was reached without a person`);
      return handle(call as Call<B, Q>, person);
    },
  };
}

/** A route that needs no sign-in. */
export function openRoute<B extends object = object, Q extends object = object>(
  method: Route['method'],
  path: string,
  says: RouteSays<B, Q>,
  handle: (call: Call<B, Q>) => Promise<Reply>,
): Route {
  return { method, path, roles: 'anyone', says, handle: (call) => handle(call as Call<B, Q>) };
}
