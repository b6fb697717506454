import type { RequestHandler } from 'express';
import { ProblemError } from './problems.ts';

/**
 * Refuses requests that change something and were sent by another site's page.
 * Browsers name the sending page in Sec-Fetch-Site or Origin; a program without either holds no cookies of a person.
 */
export function sameOriginOnly(appOrigin: string): RequestHandler {
  return (req, _res, next) => {
    if (req.method === 'GET' || req.method === 'HEAD' || req.method === 'OPTIONS') return next();
    const site = req.get('Sec-Fetch-Site');
    const origin = req.get('Origin');
    const own = origin === undefined || origin === appOrigin || origin === `${req.protocol}://${req.get('Host')}`;
    if ((site !== undefined && site !== 'same-origin' && site !== 'none') || !own) {
      throw new ProblemError('not-allowed', 'This request came from another site and was not carried out.');
    }
    next();
  };
}
