import { randomUUID } from 'node:crypto';
import bcrypt from 'bcryptjs';
import { utf8Length, type Me, type Member } from '../../shared/people/people.api.ts';
import type { Role } from '../../shared/people/permissions.ts';
import { ProblemError } from '../http/problems.ts';
import { hashToken, newToken } from '../http/tokens.ts';
import type { Who } from '../http/who.ts';
import type { PeopleRepository, UserWithShop } from './people.repository.ts';
import { refreshDays } from './sessions.ts';

/** Two tabs may refresh at once: a token just replaced is still understood for this long. */
const graceMs = 20_000;

export interface SignedIn {
  me: Me;
  userId: string;
  sessionId: string;
  /** null: the browser already holds the one in force. */
  refreshToken: string | null;
}

/** Shops, their people, and who is signed in. `furnish` is told of each new shop, to give it what every shop starts with. */
export function peopleService(people: PeopleRepository, clock: () => Date, furnish: (shopId: string) => Promise<void>, bcryptCost = 12) {
  // Compared against when the address is unknown, so that both answers take as long.
  const decoy = bcrypt.hash(newToken(), bcryptCost);

  async function begin(user: UserWithShop, device: string): Promise<SignedIn> {
    const now = clock();
    const refreshToken = newToken();
    const sessionId = randomUUID();
    await people.addSession({
      id: sessionId, userId: user.id, refreshHash: hashToken(refreshToken), previousHash: null, createdAt: now, refreshedAt: now,
      expiresAt: new Date(now.getTime() + refreshDays * 86_400_000), revokedAt: null, device: device.slice(0, 200),
    });
    return { me: meOf(user), userId: user.id, sessionId, refreshToken };
  }

  return {
    async register(input: { shopName: string; name: string; email: string; password: string; units: 'in' | 'mm' }, device: string): Promise<SignedIn> {
      const now = clock();
      const shop = { id: randomUUID(), name: input.shopName, units: input.units, createdAt: now };
      const owner = await newUser(shop.id, { ...input, role: 'owner' }, now, bcryptCost);
      if (!(await people.addShop(shop, owner))) throw emailTaken();
      await furnish(shop.id);
      return begin({ ...owner, shop }, device);
    },

    async signIn(email: string, password: string, device: string): Promise<SignedIn> {
      const user = await people.userByEmail(email);
      const fits = await bcrypt.compare(password, user?.passwordHash ?? (await decoy));
      if (!user || !fits || !user.active || utf8Length(password) > 72) {
        throw new ProblemError('sign-in-needed', 'E-mail address and password do not go together.');
      }
      return begin(user, device);
    },

    /** Trades a refresh token. One that was already traded, past the grace, ends the session: somebody copied it. */
    async refresh(token: string): Promise<SignedIn> {
      const now = clock();
      const hash = hashToken(token);
      const session = await people.sessionByHash(hash);
      const over = new ProblemError('sign-in-needed', 'Your session is over. Please sign in again.');
      if (!session || session.revokedAt || session.expiresAt <= now) throw over;
      if (session.refreshHash !== hash) {
        if (now.getTime() - session.refreshedAt.getTime() > graceMs) {
          await people.revoke(session.id, now);
          throw over;
        }
      }
      const user = await people.userById(session.userId);
      if (!user?.active) throw over;
      const next = newToken();
      // A tab that comes second within the grace keeps the cookie that the first was given.
      const rotated = session.refreshHash === hash && (await people.rotate(session.id, hash, hashToken(next), now));
      return { me: meOf(user), userId: user.id, sessionId: session.id, refreshToken: rotated ? next : null };
    },

    async signOut(token: string | null): Promise<void> {
      const session = token === null ? null : await people.sessionByHash(hashToken(token));
      if (session) await people.revoke(session.id, clock());
    },

    /** The member behind an access token, as they stand now: a closed session or account counts at once. */
    async whoIs(claims: { userId: string; sessionId: string }): Promise<Who | null> {
      const [user, session] = await Promise.all([people.userById(claims.userId), people.session(claims.sessionId)]);
      if (!user?.active || !session || session.userId !== user.id || session.revokedAt || session.expiresAt <= clock()) return null;
      return { userId: user.id, shopId: user.shopId, role: user.role, name: user.name, sessionId: session.id };
    },

    async me(who: Who): Promise<Me> {
      const user = await people.userById(who.userId);
      if (!user) throw new ProblemError('sign-in-needed', 'Please sign in to go on.');
      return meOf(user);
    },

    async members(who: Who): Promise<Member[]> {
      return (await people.usersOf(who.shopId)).map(memberOf);
    },

    async addMember(who: Who, input: { name: string; email: string; role: Role; password: string }): Promise<Member> {
      const user = await newUser(who.shopId, input, clock(), bcryptCost);
      if (!(await people.addUser(user))) throw emailTaken();
      return memberOf(user);
    },

    /** Refuses ids that are not active members of the shop. */
    async requireMembers(who: Who, ids: readonly string[]): Promise<void> {
      const known = new Set((await people.usersOf(who.shopId)).filter((u) => u.active).map((u) => u.id));
      if (ids.some((id) => !known.has(id))) {
        throw new ProblemError('bad-input', 'One of the people named is not in this shop.', { fields: [{ path: 'assignedTo', words: 'Not a person of this shop.' }] });
      }
    },

    async shopOf(shopId: string): Promise<{ name: string; units: 'in' | 'mm'; replyTo: string | null }> {
      const users = await people.usersOf(shopId);
      const owner = users.find((u) => u.role === 'owner' && u.active);
      const withShop = owner && (await people.userById(owner.id));
      return { name: withShop?.shop.name ?? '', units: withShop?.shop.units ?? 'in', replyTo: owner?.email ?? null };
    },
  };
}
export type PeopleService = ReturnType<typeof peopleService>;

async function newUser(shopId: string, input: { name: string; email: string; role: Role; password: string }, now: Date, cost: number) {
  return {
    id: randomUUID(), shopId, email: input.email, name: input.name, role: input.role,
    passwordHash: await bcrypt.hash(input.password, cost), active: true, createdAt: now,
  };
}

const emailTaken = () =>
  new ProblemError('conflict', 'This e-mail address already has an account.', { fields: [{ path: 'email', words: 'This address already has an account.' }] });

const meOf = (u: UserWithShop): Me => ({
  userId: u.id, name: u.name, email: u.email, role: u.role, shop: { id: u.shop.id, name: u.shop.name, units: u.shop.units },
});

const memberOf = (u: { id: string; name: string; email: string; role: Role; active: boolean; createdAt: Date }): Member => ({
  id: u.id, name: u.name, email: u.email, role: u.role, active: Boolean(u.active), createdAt: u.createdAt.toISOString(),
});
