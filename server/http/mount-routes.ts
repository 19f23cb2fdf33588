import express, { type Express, type Request, type RequestHandler, type Response } from 'express';
import { BadRequest, NotAllowed, NotSignedIn, WrongMediaType } from './problem';
import type { Principal, Reply, Route, RouteBody } from './route';
import { validated, validatedQuery } from './validated';

/** Reads who asks from the Authorization header; undefined when there is none or it does not hold. */
export type TokenReader = (authorization: string | undefined) => Principal | undefined;

/** Puts every route of the table on the app, with one order of checks: rights, size, shape. */
export function mountRoutes(app: Express, routes: readonly Route[], readToken: TokenReader): void {
  for (const route of routes) app[route.method](route.path, handlerOf(route, readToken));
}

function handlerOf(route: Route, readToken: TokenReader): RequestHandler {
  const readBody = bodyReader(route.says.body);
  return async (req, res) => {
    const person = allowed(route, req, readToken);
    const bytes = await readBody(req, res);
    const reply = await route.handle(
      {
        req,
        res,
        params: req.params as Record<string, string>,
        body: bodyOf(route.says.body, bytes),
        query: route.says.query === undefined ? {} : validatedQuery(route.says.query, req.query),
        bytes,
      },
      person,
    );
    send(res, reply);
  };
}

function allowed(route: Route, req: Request, readToken: TokenReader): Principal | undefined {
  if (route.roles === 'anyone') return undefined;
  const person = readToken(req.headers.authorization);
  if (person === undefined) throw new NotSignedIn('Sign in to do this.');
  if (!route.roles.includes(person.role)) throw new NotAllowed(`Your role (${person.role}) does not do this.`);
  return person;
}

function bodyReader(body: RouteBody<object> | undefined): (req: Request, res: Response) => Promise<Buffer> {
  if (body === undefined) return () => Promise.resolve(Buffer.alloc(0));
  const read = express.raw({ type: () => true, limit: body.limitBytes });
  return (req, res) =>
    new Promise((resolve, reject) => {
      const wanted = body.kind === 'bytes' ? 'application/octet-stream' : 'application/json';
      const hasBody = req.headers['content-length'] !== '0' && req.headers['content-length'] !== undefined;
      if ((hasBody || req.headers['transfer-encoding'] !== undefined) && !req.is(wanted)) {
        reject(new WrongMediaType(`${wanted} is expected.`));
        return;
      }
      read(req, res, (error?: unknown) => {
        if (error !== undefined) reject(error instanceof Error ? error : new BadRequest('The body can not be read.'));
        else resolve(Buffer.isBuffer(req.body) ? req.body : Buffer.alloc(0));
      });
    });
}

function bodyOf(body: RouteBody<object> | undefined, bytes: Buffer): object {
  if (body === undefined || body.kind === 'bytes') return {};
  const parsed = parseJson(bytes);
  if (body.kind === 'json') return validated(body.dto, parsed);
  if (typeof parsed !== 'object' || parsed === null || Array.isArray(parsed)) {
    throw new BadRequest('A JSON object is expected.');
  }
  return parsed;
}

function parseJson(bytes: Buffer): unknown {
  if (bytes.length === 0) return {};
  try {
    return JSON.parse(bytes.toString('utf8'));
  } catch (error) {
    // JSON.parse throws SyntaxError for what is not JSON.
    if (error instanceof SyntaxError) throw new BadRequest('This is not JSON.');
    throw error;
  }
}

function send(res: Response, reply: Reply): void {
  res.status(reply.status);
  if ('bytes' in reply) {
    res
      .set('Content-Type', reply.type)
      .set('Cache-Control', reply.cacheControl ?? 'no-store')
      .send(reply.bytes);
    return;
  }
  res.set('Cache-Control', 'no-store');
  if (reply.json === undefined) res.end();
  else res.type(reply.type ?? 'application/json').send(JSON.stringify(reply.json));
}
