import type { Request, Response } from 'express';
import { peopleApi } from '../../shared/people/people.api.ts';
import type { Mount } from '../http/mount.ts';
import { ProblemError } from '../http/problems.ts';
import type { PeopleService, SignedIn } from './people.service.ts';
import type { SessionCookies } from './sessions.ts';

export function peopleRoutes(mount: Mount, people: PeopleService, cookies: SessionCookies): void {
  const device = (req: Request) => req.get('User-Agent') ?? 'unknown';
  const welcome = (res: Response, signedIn: SignedIn) => {
    cookies.give(res, signedIn);
    return signedIn.me;
  };

  mount.on(peopleApi.register, async ({ body, req, res }) => welcome(res, await people.register(body, device(req))));
  mount.on(peopleApi.signIn, async ({ body, req, res }) => {
    const signedIn = await people.signIn(body.email, body.password, device(req));
    // Whatever session the browser held before ends here, and only now: a sign-in never continues another's, a mistyped password ends none.
    await people.signOut(cookies.refreshToken(req));
    return welcome(res, signedIn);
  });
  mount.on(peopleApi.refresh, async ({ req, res }) => {
    const token = cookies.refreshToken(req);
    if (!token) throw new ProblemError('sign-in-needed', 'Please sign in to go on.');
    return welcome(res, await people.refresh(token));
  });
  mount.on(peopleApi.signOut, async ({ req, res }) => {
    await people.signOut(cookies.refreshToken(req));
    cookies.clear(res);
    return { done: true as const };
  });
  mount.on(peopleApi.me, ({ who }) => people.me(who));
  mount.on(peopleApi.members, ({ who }) => people.members(who));
  mount.on(peopleApi.addMember, ({ who, body }) => people.addMember(who, body));
}
