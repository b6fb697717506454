import type { DataSource, EntityManager } from 'typeorm';

/** One transaction, passed from a service to whatever must be written with it. */
export type Transaction = EntityManager;

/** MariaDB's numbers for "another transaction was in the way; start again". */
const tryAgain = new Set([1205, 1213]);

/** Runs `work` in one transaction; after a deadlock or lock wait it is run anew, three times at most. */
export async function inTransaction<T>(data: DataSource, work: (manager: EntityManager) => Promise<T>): Promise<T> {
  for (let attempt = 1; ; attempt++) {
    try {
      return await data.transaction('REPEATABLE READ', work);
    } catch (error) {
      if (attempt >= 3 || !tryAgain.has(errorNumber(error))) throw error;
    }
  }
}

/** The database's own number of an error, or 0. */
export function errorNumber(error: unknown): number {
  return (error as { errno?: number; driverError?: { errno?: number } }).driverError?.errno ?? (error as { errno?: number }).errno ?? 0;
}

export const duplicateKey = 1062;
