import { randomBytes } from 'node:crypto';
import type { RequestHandler, Response } from 'express';
import helmet from 'helmet';

/**
 * Nothing but our own origin. Style sheets that a script adds need the nonce of their page; style
 * attributes are let through, since figures place their parts with them and they load nothing.
 */
function policy(isHttps: boolean, nonce: string | null): Record<string, Iterable<string> | null> {
  return {
    'default-src': ["'self'"],
    'script-src': ["'self'"],
    'style-src': nonce === null ? ["'self'"] : ["'self'", `'nonce-${nonce}'`],
    'style-src-attr': ["'unsafe-inline'"],
    'img-src': ["'self'", 'data:', 'blob:'],
    'object-src': ["'none'"],
    'base-uri': ["'self'"],
    'form-action': ["'self'"],
    'frame-ancestors': ["'none'"],
    'upgrade-insecure-requests': isHttps ? [] : null,
  };
}

export function securityHeaders(isHttps: boolean): RequestHandler {
  return helmet({
    contentSecurityPolicy: { useDefaults: false, directives: policy(isHttps, null) },
    strictTransportSecurity: isHttps,
    referrerPolicy: { policy: 'same-origin' },
  });
}

/** Answers a page of ours; `write` puts the nonce where style sheets are made. */
export function sendPage(res: Response, isHttps: boolean, write: (nonce: string) => string): void {
  const nonce = randomBytes(16).toString('base64');
  const directives = Object.entries(policy(isHttps, nonce)).flatMap(([name, sources]) =>
    sources === null ? [] : [[name, ...sources].join(' ')],
  );
  res
    .set('Content-Security-Policy', directives.join(';'))
    .set('Cache-Control', 'no-cache')
    .type('html')
    .send(write(nonce));
}
