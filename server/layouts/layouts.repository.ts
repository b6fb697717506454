import { In, type DataSource } from 'typeorm';
import type { Edit, Frame, LayoutSheet } from '../../shared/layouts/layout.ts';
import { FrameRow, LayoutRow, RevisionRow } from '../database/entities/layouts.ts';
import { inTransaction } from '../database/transaction.ts';

export interface LayoutWhole {
  layout: LayoutRow;
  frames: Frame[];
  revisions: RevisionRow[];
}

export function layoutsRepository(data: DataSource) {
  const layouts = data.getRepository(LayoutRow);
  const frames = data.getRepository(FrameRow);
  const revisions = data.getRepository(RevisionRow);

  async function whole(rows: LayoutRow[]): Promise<LayoutWhole[]> {
    if (rows.length === 0) return [];
    const ids = rows.map((r) => r.id);
    const [allFrames, allRevisions] = await Promise.all([
      frames.find({ where: { layoutId: In(ids) }, order: { label: 'ASC', id: 'ASC' } }),
      revisions.find({ where: { layoutId: In(ids) }, order: { sentAt: 'ASC', letter: 'ASC' } }),
    ]);
    return rows.map((layout) => ({
      layout,
      frames: allFrames.filter((f) => f.layoutId === layout.id).map(frameOf),
      revisions: allRevisions.filter((r) => r.layoutId === layout.id),
    }));
  }

  return {
    add: async (row: LayoutRow): Promise<void> => void (await layouts.insert(row)),
    async find(shopId: string, id: string): Promise<LayoutWhole | null> {
      return (await whole(await layouts.findBy({ id, shopId })))[0] ?? null;
    },
    async version(shopId: string, id: string): Promise<{ version: number; jobId: string } | null> {
      return layouts.findOne({ where: { id, shopId }, select: { version: true, jobId: true } });
    },
    async ofJob(shopId: string, jobId: string): Promise<LayoutWhole[]> {
      return whole(await layouts.find({ where: { shopId, jobId }, order: { createdAt: 'ASC', id: 'ASC' } }));
    },
    /** Writes edits and the sheet on the given version only; false when someone saved before. */
    async save(id: string, version: number, sheet: LayoutSheet, edits: readonly Edit[], by: string, now: Date): Promise<boolean> {
      return inTransaction(data, async (m) => {
        const result = await m.update(LayoutRow, { id, version }, { ...sheet, version: version + 1, updatedAt: now, updatedBy: by });
        if (result.affected !== 1) return false;
        const gone = new Set<string>();
        const kept = new Map<string, Frame>();
        for (const edit of edits) {
          if (edit.kind !== 'frame') continue;
          if (edit.after) {
            kept.set(edit.frameId, edit.after);
            gone.delete(edit.frameId);
          } else {
            kept.delete(edit.frameId);
            gone.add(edit.frameId);
          }
        }
        if (gone.size > 0) await m.delete(FrameRow, { layoutId: id, id: In([...gone]) });
        if (kept.size > 0) await m.upsert(FrameRow, [...kept.values()].map((f) => ({ ...f, hangerSlides: f.hangerSlides ?? null, layoutId: id })), ['layoutId', 'id']);
        return true;
      });
    },
    async remove(id: string): Promise<void> {
      await layouts.delete({ id });
    },
  };
}
export type LayoutsRepository = ReturnType<typeof layoutsRepository>;

const frameOf = (row: FrameRow): Frame => ({
  id: row.id, patternId: row.patternId, xMm: row.xMm, yMm: row.yMm, turnRad: row.turnRad, flipped: Boolean(row.flipped), locked: Boolean(row.locked),
  label: row.label, contentsKg: row.contentsKg, hungGroup: row.hungGroup, ...(row.hangerSlides ? { hangerSlides: row.hangerSlides } : {}),
});
