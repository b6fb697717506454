import type { CookieOptions, Request, Response } from 'express';
import jwt from 'jsonwebtoken';
import { z } from 'zod';

/** How long an access token is believed without asking the database, and how long a sign-in lasts unused. */
export const accessSeconds = 10 * 60;
export const refreshDays = 30;

const accessCookie = 'cw_access';
const refreshCookie = 'cw_refresh';
const issuer = 'combwright';
const audience = 'combwright-web';

const Claims = z.object({ sub: z.uuid(), sid: z.uuid() });

/** Reads and writes the two cookies of a session. Tokens follow RFC 8725: one algorithm, checked issuer, audience and type. */
export function sessionCookies(secret: string, secure: boolean) {
  const base: CookieOptions = { httpOnly: true, sameSite: 'lax', secure, path: '/api' };
  return {
    give(res: Response, session: { userId: string; sessionId: string; refreshToken: string | null }): void {
      const access = jwt.sign({ sid: session.sessionId }, secret, {
        algorithm: 'HS256', subject: session.userId, issuer, audience, expiresIn: accessSeconds, header: { alg: 'HS256', typ: 'at+jwt' },
      });
      res.cookie(accessCookie, access, { ...base, maxAge: accessSeconds * 1000 });
      if (session.refreshToken !== null) res.cookie(refreshCookie, session.refreshToken, { ...base, path: '/api/people', maxAge: refreshDays * 86_400_000 });
    },
    clear(res: Response): void {
      res.clearCookie(accessCookie, base);
      res.clearCookie(refreshCookie, { ...base, path: '/api/people' });
    },
    refreshToken(req: Request): string | null {
      const token = (req.cookies as Record<string, unknown>)[refreshCookie];
      return typeof token === 'string' && token.length <= 200 ? token : null;
    },
    /** Who the access cookie names, or null when it is missing, forged or over. */
    claims(req: Request): { userId: string; sessionId: string } | null {
      const token = (req.cookies as Record<string, unknown>)[accessCookie];
      if (typeof token !== 'string') return null;
      try {
        const decoded = jwt.verify(token, secret, { algorithms: ['HS256'], issuer, audience, complete: true });
        if (decoded.header.typ !== 'at+jwt') return null;
        const claims = Claims.parse(decoded.payload);
        return { userId: claims.sub, sessionId: claims.sid };
      } catch {
        return null;
      }
    },
  };
}
export type SessionCookies = ReturnType<typeof sessionCookies>;
