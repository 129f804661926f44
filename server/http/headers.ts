import type { RequestHandler } from 'express';
import helmet from 'helmet';

const YEAR_S = 365 * 24 * 60 * 60;

/** @param https whether people reach the program by https: only then may a browser be told to insist on it. */
export function securityHeaders(https: boolean): RequestHandler {
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        'default-src': ["'none'"],
        'script-src': ["'self'"],
        'worker-src': ["'self'", 'blob:'],
        // Quasar sets inline styles.
        'style-src': ["'self'", "'unsafe-inline'"],
        'img-src': ["'self'", 'data:', 'blob:'],
        'font-src': ["'self'", 'data:'],
        'media-src': ["'self'", 'blob:'],
        'connect-src': ["'self'"],
        'manifest-src': ["'self'"],
        'form-action': ["'self'"],
        'base-uri': ["'none'"],
        'frame-ancestors': ["'none'"],
        ...(https ? { 'upgrade-insecure-requests': [] } : {}),
      },
    },
    strictTransportSecurity: https ? { maxAge: YEAR_S, includeSubDomains: true } : false,
    xFrameOptions: { action: 'deny' },
  });
}

/** No answer of the API may be kept: after sign-out the back button must show nothing. */
export const noStore: RequestHandler = (_req, res, next) => {
  res.set('Cache-Control', 'no-store');
  next();
};

const METHODS = new Set(['GET', 'HEAD', 'POST', 'PUT', 'PATCH', 'DELETE']);

export const knownMethodsOnly: RequestHandler = (req, res, next) => {
  if (METHODS.has(req.method)) return next();
  res
    .set('Allow', [...METHODS].join(', '))
    .status(405)
    .end();
};
