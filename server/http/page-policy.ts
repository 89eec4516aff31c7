import helmet from 'helmet';
import type { RequestHandler } from 'express';
import type { Config } from '../config';

/** Headers for every answer. No inline script anywhere; inline style only as attributes, which React writes. */
export function pagePolicy(http: Config['http']): RequestHandler {
  const secure = http.origins.every((origin) => origin.startsWith('https:'));
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        'default-src': ["'self'"],
        'script-src': ["'self'"],
        'style-src': ["'self'"],
        'style-src-attr': ["'unsafe-inline'"],
        'img-src': ["'self'", 'data:', 'blob:'],
        'font-src': ["'self'"],
        'connect-src': ["'self'"],
        'worker-src': ["'self'"],
        'manifest-src': ["'self'"],
        'object-src': ["'none'"],
        'base-uri': ["'none'"],
        'form-action': ["'self'"],
        'frame-ancestors': ["'none'"],
        // On loopback http it would send the page to an address where nobody listens.
        ...(secure ? { 'upgrade-insecure-requests': [] } : {}),
      },
    },
    strictTransportSecurity: secure,
    referrerPolicy: { policy: 'no-referrer' },
  });
}
