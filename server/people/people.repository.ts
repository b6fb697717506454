import type { DataSource, EntityManager } from 'typeorm';
import { SessionRow, ShopRow, UserRow } from '../database/entities/people.ts';
import { duplicateKey, errorNumber, inTransaction } from '../database/transaction.ts';

export type UserWithShop = UserRow & { shop: ShopRow };

export function peopleRepository(data: DataSource) {
  const users = data.getRepository(UserRow);
  const sessions = data.getRepository(SessionRow);
  return {
    /** Writes shop and owner together; false when the e-mail address is taken. */
    async addShop(shop: ShopRow, owner: UserRow): Promise<boolean> {
      return taken(() =>
        inTransaction(data, async (m: EntityManager) => {
          await m.insert(ShopRow, shop);
          await m.insert(UserRow, owner);
        }),
      );
    },
    async addUser(user: UserRow): Promise<boolean> {
      return taken(() => users.insert(user));
    },
    async userByEmail(email: string): Promise<UserWithShop | null> {
      return (await users.findOne({ where: { email }, relations: { shop: true } })) as UserWithShop | null;
    },
    async userById(id: string): Promise<UserWithShop | null> {
      return (await users.findOne({ where: { id }, relations: { shop: true } })) as UserWithShop | null;
    },
    async usersOf(shopId: string): Promise<UserRow[]> {
      return users.find({ where: { shopId }, order: { createdAt: 'ASC', id: 'ASC' } });
    },
    async addSession(session: SessionRow): Promise<void> {
      await sessions.insert(session);
    },
    async session(id: string): Promise<SessionRow | null> {
      return sessions.findOneBy({ id });
    },
    async sessionByHash(hash: string): Promise<SessionRow | null> {
      return sessions.findOne({ where: [{ refreshHash: hash }, { previousHash: hash }] });
    },
    /** Moves a session to its next refresh token; false when another request already did. */
    async rotate(id: string, from: string, to: string, now: Date): Promise<boolean> {
      const result = await sessions.update({ id, refreshHash: from }, { refreshHash: to, previousHash: from, refreshedAt: now });
      return result.affected === 1;
    },
    async revoke(id: string, now: Date): Promise<void> {
      await sessions.update({ id }, { revokedAt: now });
    },
  };
}
export type PeopleRepository = ReturnType<typeof peopleRepository>;

async function taken(insert: () => Promise<unknown>): Promise<boolean> {
  try {
    await insert();
    return true;
  } catch (error) {
    if (errorNumber(error) === duplicateKey) return false;
    throw error;
  }
}
