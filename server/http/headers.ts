import type { RequestHandler } from 'express';
import helmet from 'helmet';

/** Strict headers on every answer: no inline script, no frame, nothing from elsewhere. */
export function securityHeaders(publicUrl: string): RequestHandler[] {
  const https = publicUrl.startsWith('https:');
  return [
    helmet({
      contentSecurityPolicy: {
        useDefaults: false,
        directives: {
          defaultSrc: ["'none'"],
          scriptSrc: ["'self'"],
          styleSrc: ["'self'"],
          imgSrc: ["'self'", 'blob:', 'data:'],
          fontSrc: ["'self'"],
          connectSrc: ["'self'"],
          workerSrc: ["'self'"],
          manifestSrc: ["'self'"],
          formAction: ["'self'"],
          baseUri: ["'none'"],
          frameAncestors: ["'none'"],
          ...(https ? { upgradeInsecureRequests: [] } : {}),
        },
      },
      crossOriginOpenerPolicy: { policy: 'same-origin' },
      crossOriginResourcePolicy: { policy: 'same-origin' },
      strictTransportSecurity: https ? { maxAge: 31_536_000 } : false,
      referrerPolicy: { policy: 'no-referrer' },
    }),
    (_request, response, next) => {
      response.set('Permissions-Policy', 'camera=(self), geolocation=(), microphone=()');
      next();
    },
  ];
}
