import { In, type DataSource, type EntityManager } from 'typeorm';
import { AssignmentRow, JobRow } from '../database/entities/jobs.ts';
import { inTransaction } from '../database/transaction.ts';

export type JobWithPeople = JobRow & { assignedTo: string[] };

export function jobsRepository(data: DataSource) {
  const jobs = data.getRepository(JobRow);
  const assignments = data.getRepository(AssignmentRow);

  async function withPeople(rows: JobRow[]): Promise<JobWithPeople[]> {
    const all = rows.length > 0 ? await assignments.findBy({ jobId: In(rows.map((r) => r.id)) }) : [];
    return rows.map((row) => ({ ...row, assignedTo: all.filter((a) => a.jobId === row.id).map((a) => a.userId).sort() }));
  }

  return {
    async add(job: JobRow): Promise<void> {
      await jobs.insert(job);
    },
    async ofShop(shopId: string): Promise<JobWithPeople[]> {
      return withPeople(await jobs.find({ where: { shopId }, order: { updatedAt: 'DESC', id: 'ASC' } }));
    },
    async find(shopId: string, id: string): Promise<JobWithPeople | null> {
      const row = await jobs.findOneBy({ id, shopId });
      return row ? ((await withPeople([row]))[0] ?? null) : null;
    },
    /** Writes on the given version only; false when someone saved before. */
    async change(id: string, version: number, values: Partial<JobRow>, assignedTo: string[] | undefined): Promise<boolean> {
      return inTransaction(data, async (m: EntityManager) => {
        const result = await m.update(JobRow, { id, version }, { ...values, version: version + 1 });
        if (result.affected !== 1) return false;
        if (assignedTo) {
          await m.delete(AssignmentRow, { jobId: id });
          if (assignedTo.length > 0) await m.insert(AssignmentRow, [...new Set(assignedTo)].map((userId) => ({ jobId: id, userId })));
        }
        return true;
      });
    },
    async touch(id: string, now: Date, state?: JobRow['state']): Promise<void> {
      await jobs.update({ id }, { updatedAt: now, ...(state ? { state } : {}) });
    },
  };
}
export type JobsRepository = ReturnType<typeof jobsRepository>;
