import { In, type DataSource, type EntityManager } from 'typeorm';
import { PhotoRow, WallRow } from '../database/entities/walls.ts';
import { inTransaction } from '../database/transaction.ts';

const newestFirst = { createdAt: 'DESC', id: 'ASC' } as const;

/** The photos of walls, of which one is in force. */
export function photosRepository(data: DataSource) {
  const photos = data.getRepository(PhotoRow);

  /** A wall locked against others who would put a photo in force. */
  const locked = (m: EntityManager, shopId: string, wallId: string) =>
    m.findOne(WallRow, { where: { id: wallId, shopId }, lock: { mode: 'pessimistic_write' } });

  return {
    async photosOf(shopId: string, wallId: string): Promise<PhotoRow[]> {
      return photos.find({ where: { shopId, wallId }, order: newestFirst });
    },
    async findPhoto(shopId: string, wallId: string, id: string): Promise<PhotoRow | null> {
      return photos.findOneBy({ id, shopId, wallId });
    },

    /** Adds a photo and puts it in force, unless the wall is gone or has `most` already. */
    async addPhoto(shopId: string, wallId: string, photo: PhotoRow, most: number): Promise<'added' | 'gone' | 'full'> {
      return inTransaction(data, async (m) => {
        if (!(await locked(m, shopId, wallId))) return 'gone';
        if ((await m.countBy(PhotoRow, { wallId, shopId })) >= most) return 'full';
        await m.insert(PhotoRow, photo);
        await m.update(WallRow, { id: wallId, shopId }, { photoId: photo.id });
        return 'added';
      });
    },

    /** Puts a photo of the wall in force; false where it is gone. */
    async choosePhoto(shopId: string, wallId: string, photoId: string): Promise<boolean> {
      return inTransaction(data, async (m) => {
        const wall = await locked(m, shopId, wallId);
        if (!wall || !(await m.existsBy(PhotoRow, { id: photoId, wallId, shopId }))) return false;
        await m.update(WallRow, { id: wallId, shopId }, { photoId });
        return true;
      });
    },

    /** Takes a photo off; where it was in force, the newest left comes in force. Returns the rows that are gone. */
    async removePhoto(shopId: string, wallId: string, photoId: string): Promise<PhotoRow[]> {
      return inTransaction(data, async (m) => {
        const wall = await locked(m, shopId, wallId);
        const gone = await m.findBy(PhotoRow, { id: photoId, wallId, shopId });
        if (gone.length > 0) await m.delete(PhotoRow, { id: In(gone.map((p) => p.id)) });
        if (wall?.photoId === photoId) {
          const [next] = await m.find(PhotoRow, { where: { wallId, shopId }, order: newestFirst, take: 1 });
          await m.update(WallRow, { id: wallId, shopId }, { photoId: next?.id ?? null });
        }
        return gone;
      });
    },

    /** Records a straightening; returns the key of the elevation it took the place of, or false where the photo is gone. */
    async setElevation(photoId: string, values: Pick<PhotoRow, 'marks' | 'known' | 'fit' | 'elevation' | 'elevationKey' | 'elevationSha256'>): Promise<{ before: string | null } | false> {
      return inTransaction(data, async (m) => {
        const photo = await m.findOne(PhotoRow, { where: { id: photoId }, lock: { mode: 'pessimistic_write' } });
        if (!photo) return false;
        await m.update(PhotoRow, { id: photoId }, values);
        return { before: photo.elevationKey };
      });
    },
  };
}
