import type { RequestHandler } from 'express';
import { Problem } from '../problem.ts';

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Refuses writes that another site could have caused.
 *
 * Every browser that sends cookies across sites names the origin of a write by
 * `Sec-Fetch-Site` or `Origin`; a caller that sends neither is not a browser.
 */
export function refuseCrossSite(ownOrigin: () => string): RequestHandler {
  return (request, _response, next) => {
    if (SAFE.has(request.method)) return next();
    const site = request.get('Sec-Fetch-Site');
    if (site !== undefined) {
      if (site === 'same-origin' || site === 'none') return next();
      throw new Problem('forbidden', 'Writes are accepted from this site only');
    }
    const origin = request.get('Origin');
    if (origin === undefined || origin === ownOrigin() || origin === `${request.protocol}://${request.get('Host') ?? ''}`) return next();
    throw new Problem('forbidden', 'Writes are accepted from this site only');
  };
}
