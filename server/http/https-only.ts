import type { RequestHandler } from 'express';
import { RequestError } from '#server/http/request-error';

/** Where people come by https, a page asked for by http is sent on and the API refuses: what was sent is out already. */
export function httpsOnly(publicUrl: string): RequestHandler {
  return (req, res, next) => {
    if (req.secure) return next();
    if (/^\/api(\/|$)/i.test(req.path)) {
      return next(new RequestError(403, 'https.required', 'This is served by https only.'));
    }
    res.redirect(308, new URL(req.originalUrl.replace(/^[/\\]+/, '/'), publicUrl).href);
  };
}
