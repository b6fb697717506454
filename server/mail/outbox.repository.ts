import { LessThanOrEqual, type DataSource, type EntityManager } from 'typeorm';
import { OutboxRow } from '../database/entities/mail.ts';

export function outboxRepository(data: DataSource) {
  const outbox = data.getRepository(OutboxRow);
  return {
    /** Within the transaction of what the mail tells of, so that neither stands without the other. */
    add: async (row: OutboxRow, manager: EntityManager = data.manager): Promise<void> => void (await manager.insert(OutboxRow, row)),
    due: (now: Date) => outbox.find({ where: { state: 'waiting', nextTryAt: LessThanOrEqual(now) }, order: { nextTryAt: 'ASC' }, take: 20 }),
    /** Takes a message for one sender by moving its next try ahead; false when another sender has it. */
    claim: async (row: OutboxRow, until: Date): Promise<boolean> =>
      (await outbox.update({ id: row.id, state: 'waiting', attempts: row.attempts }, { attempts: row.attempts + 1, nextTryAt: until })).affected === 1,
    sent: async (id: string, now: Date): Promise<void> => void (await outbox.update({ id }, { state: 'sent', sentAt: now, lastError: null })),
    failed: async (id: string, error: string, nextTryAt: Date | null): Promise<void> =>
      void (await outbox.update({ id }, { lastError: error.slice(0, 500), ...(nextTryAt ? { nextTryAt } : { state: 'failed' as const }) })),
  };
}
export type OutboxRepository = ReturnType<typeof outboxRepository>;
