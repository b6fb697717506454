import { In, type DataSource, type EntityManager } from 'typeorm';
import { PhotoRow, StudRow, WallRow } from '../database/entities/walls.ts';
import { duplicateKey, errorNumber, inTransaction } from '../database/transaction.ts';
import { photosRepository } from './photos.repository.ts';

/** A wall with its studs from left to right and the photo in force. */
export type WallWhole = WallRow & { studs: StudRow[]; photo: PhotoRow | null };

export type WallValues = Partial<Pick<WallRow, 'name' | 'widthMm' | 'heightMm' | 'construction' | 'coveringMm' | 'studSpecies' | 'outlineMm' | 'obstructions' | 'zones'>>;

export function wallsRepository(data: DataSource) {
  const walls = data.getRepository(WallRow);
  const studs = data.getRepository(StudRow);
  const photos = data.getRepository(PhotoRow);

  async function whole(rows: WallRow[]): Promise<WallWhole[]> {
    if (rows.length === 0) return [];
    const photoIds = rows.flatMap((r) => (r.photoId ? [r.photoId] : []));
    const [allStuds, allPhotos] = await Promise.all([
      studs.find({ where: { wallId: In(rows.map((r) => r.id)) }, order: { xMm: 'ASC', id: 'ASC' } }),
      photoIds.length > 0 ? photos.findBy({ id: In(photoIds) }) : [],
    ]);
    return rows.map((row) => ({
      ...row,
      studs: allStuds.filter((s) => s.wallId === row.id),
      photo: allPhotos.find((p) => p.id === row.photoId && p.wallId === row.id) ?? null,
    }));
  }

  return {
    async add(wall: WallRow): Promise<void> {
      await walls.insert(wall);
    },
    async ofJob(shopId: string, jobId: string): Promise<WallWhole[]> {
      return whole(await walls.find({ where: { shopId, jobId }, order: { createdAt: 'ASC', id: 'ASC' } }));
    },
    async find(shopId: string, id: string): Promise<WallWhole | null> {
      return (await whole(await walls.findBy({ id, shopId })))[0] ?? null;
    },

    /** Writes on the given version only. `stale`: someone saved before; `taken`: a stud's identifier is another's. */
    async change(shopId: string, id: string, version: number, values: WallValues, newStuds: StudRow[] | undefined): Promise<'saved' | 'stale' | 'taken'> {
      try {
        return await inTransaction(data, async (m: EntityManager) => {
          const result = await m.update(WallRow, { id, shopId, version }, { ...values, version: version + 1 });
          if (result.affected !== 1) return 'stale';
          if (newStuds) {
            await m.delete(StudRow, { wallId: id });
            if (newStuds.length > 0) await m.insert(StudRow, newStuds);
          }
          return 'saved';
        });
      } catch (error) {
        if (errorNumber(error) === duplicateKey) return 'taken';
        throw error;
      }
    },

    ...photosRepository(data),
  };
}
export type WallsRepository = ReturnType<typeof wallsRepository>;
