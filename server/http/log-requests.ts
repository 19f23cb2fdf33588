import type { RequestHandler } from 'express';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';
import { v7 as uuidv7 } from 'uuid';

const healthPaths = ['/healthz', '/readyz'];

/** Gives each request an id (answered as `x-request-id`) and one log line, without headers, query or content. */
export function logRequests(log: Logger): RequestHandler {
  return pinoHttp({
    logger: log,
    genReqId: (_req, res) => {
      const id = uuidv7();
      res.setHeader('x-request-id', id);
      return id;
    },
    autoLogging: { ignore: (req) => healthPaths.includes(req.url ?? '') },
    // A refused input is the caller's matter; a failure of ours is logged as an error where it is answered.
    customLogLevel: (_req, res) => (res.statusCode >= 500 ? 'warn' : 'info'),
    customSuccessMessage: () => 'request answered',
    customErrorMessage: () => 'request answered',
    wrapSerializers: false,
    serializers: {
      req: (req: { id: unknown; method?: string; url?: string }) => ({
        id: req.id,
        method: req.method,
        path: req.url?.split('?', 1)[0],
      }),
      res: (res: { statusCode: number }) => ({ status: res.statusCode }),
      err: () => undefined,
    },
  });
}
