import type { RequestHandler } from 'express';
import { forbidden } from './app-error';

const SAFE_METHODS = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Refuses what another site makes a browser send, before any body is read. A browser names the
 * origin of every unsafe request, and no page can change what it says, so no token is needed
 * beside it; SameSite=Lax alone would let through another port of the same host.
 */
export function sameOriginOnly(publicUrl: string): RequestHandler {
  const publicOrigin = new URL(publicUrl).origin;
  return (req, _res, next) => {
    const origin = req.get('origin');
    const site = req.get('sec-fetch-site');
    const host = req.get('host');
    const isOurs =
      SAFE_METHODS.has(req.method) ||
      origin === publicOrigin ||
      (site === undefined ? isSameHost(origin, host) : site === 'same-origin' || site === 'none');
    if (!isOurs) throw forbidden('The request came from another site.');
    next();
  };
}

/** Over plain http outside localhost browsers send no Sec-Fetch-Site; programs send no Origin. */
function isSameHost(origin: string | undefined, host: string | undefined): boolean {
  return origin === undefined || (URL.canParse(origin) && new URL(origin).host === host);
}
