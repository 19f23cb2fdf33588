import type { RequestHandler } from 'express';
import helmet from 'helmet';

/**
 * The headers that keep other people's code and frames out. Scripts come from us alone, without inline or eval;
 * styles may be inline, since the app's framework inserts each component's own.
 */
export function securityHeaders(options: { readonly isHttps: boolean }): RequestHandler[] {
  return [
    helmet({
      contentSecurityPolicy: {
        useDefaults: false,
        directives: {
          defaultSrc: ["'self'"],
          scriptSrc: ["'self'"],
          scriptSrcAttr: ["'none'"],
          styleSrc: ["'self'", "'unsafe-inline'"],
          imgSrc: ["'self'", 'data:', 'blob:'],
          mediaSrc: ["'self'", 'blob:'],
          fontSrc: ["'self'"],
          connectSrc: ["'self'"],
          workerSrc: ["'self'"],
          manifestSrc: ["'self'"],
          objectSrc: ["'none'"],
          baseUri: ["'self'"],
          formAction: ["'self'"],
          frameAncestors: ["'none'"],
          ...(options.isHttps ? { upgradeInsecureRequests: [] } : {}),
        },
      },
      strictTransportSecurity: options.isHttps ? { maxAge: 15_552_000, includeSubDomains: false } : false,
      xFrameOptions: { action: 'deny' },
      referrerPolicy: { policy: 'no-referrer' },
    }),
    (_req, res, next) => {
      res.setHeader('Permissions-Policy', 'camera=(self), microphone=(self), screen-wake-lock=(self), geolocation=()');
      next();
    },
  ];
}
