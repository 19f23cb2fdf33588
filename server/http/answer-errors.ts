import type { ErrorRequestHandler, RequestHandler } from 'express';
import type { Logger } from 'pino';
import { AppError, BadRequest, NotFound, NotReady, problemOf, problemType, TooLarge } from './problem';
import { isUnavailable } from './unavailable';

/** The last handler but one: an address that nothing answers. */
export const answerUnknownAddress: RequestHandler = (req) => {
  throw new NotFound(`There is nothing at ${req.method} ${req.path}.`);
};

/** The one error middleware: known failures as they are, the rest as 500 without detail. */
export function answerErrors(log: Logger): ErrorRequestHandler {
  // Express tells an error handler by its four parameters.
  return (error: unknown, req, res, _next) => {
    const known = knownError(error);
    if (res.headersSent) {
      res.destroy();
      return;
    }
    if (known === undefined) log.error({ err: error, requestId: req.id }, 'request failed');
    if (known instanceof NotReady) log.warn({ err: error, requestId: req.id }, 'not ready');
    const problem =
      known === undefined
        ? {
            type: problemType('internal'),
            code: 'internal',
            title: 'The server failed',
            status: 500,
            instance: req.path,
          }
        : problemOf(known, req.path);
    res
      .status(problem.status)
      .set({ ...known?.headers, 'Cache-Control': 'no-store' })
      .type('application/problem+json')
      .send(JSON.stringify(problem));
  };
}

function knownError(error: unknown): AppError | undefined {
  if (error instanceof AppError) return error;
  // The body reader and the router fail with a status of their own (http-errors).
  const { status, type, limit } = (error ?? {}) as { status?: unknown; type?: unknown; limit?: unknown };
  if (type === 'entity.too.large') return new TooLarge(`More than ${String(limit)} bytes are not taken here.`);
  if (error instanceof URIError || status === 400) return new BadRequest('The request can not be read.');
  if (status === 415) return new BadRequest('The body is encoded in a way that is not known here.');
  if (isUnavailable(error)) return new NotReady('The database can not serve at the moment. Ask again.');
  return undefined;
}
