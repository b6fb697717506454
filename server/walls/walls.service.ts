import { randomUUID } from 'node:crypto';
import type { BodyOf } from '../../shared/api/endpoint.ts';
import { elevationPlan } from '../../shared/walls/elevation-plan.ts';
import { marksTrouble, type Mark } from '../../shared/walls/marks.ts';
import type { Photo, Stud, Wall, WallShape } from '../../shared/walls/wall.ts';
import type { wallsApi } from '../../shared/walls/walls.api.ts';
import type { PhotoRow } from '../database/entities/walls.ts';
import type { FileStore } from '../files/file-store.ts';
import { readPicture, writePreview } from '../files/read-picture.ts';
import { notFound, ProblemError } from '../http/problems.ts';
import type { Who } from '../http/who.ts';
import type { JobsService } from '../jobs/jobs.service.ts';
import type { WorkerPool } from '../workers/pool.ts';
import type { StraightenInput, StraightenResult } from '../workers/tasks/straighten.ts';
import type { WallsRepository, WallWhole } from './walls.repository.ts';

interface Needs {
  walls: WallsRepository;
  jobs: JobsService;
  files: FileStore;
  pool: WorkerPool;
  clock: () => Date;
}

/** The walls of a job: their size, studs and obstructions, and the photo from which they are measured. */
export function wallsService({ walls, jobs, files, pool, clock }: Needs) {
  async function wallFor(who: Who, wallId: string) {
    const wall = await walls.find(who.shopId, wallId);
    if (!wall) throw notFound('wall');
    const job = await jobs.jobFor(who, wall.jobId);
    return { wall, job };
  }

  async function photoFor(who: Who, wallId: string, photoId: string) {
    const { wall, job } = await wallFor(who, wallId);
    if (wall.photo?.id !== photoId) throw notFound('photo');
    return { wall, job, photo: wall.photo };
  }

  const filesOf = (photo: PhotoRow) => [photo.originalKey, photo.previewKey, photo.elevationKey];

  return {
    files,

    async list(who: Who, jobId: string): Promise<Wall[]> {
      await jobs.jobFor(who, jobId);
      return (await walls.ofJob(who.shopId, jobId)).map(told);
    },

    async create(who: Who, jobId: string, shape: WallShape): Promise<Wall> {
      const job = await jobs.jobFor(who, jobId);
      const row = { id: randomUUID(), shopId: who.shopId, jobId, ...shape, obstructions: [], zones: [], photoId: null, version: 1, createdAt: clock() };
      await walls.add(row);
      await jobs.touch(job);
      return told({ ...row, studs: [], photo: null });
    },

    async read(who: Who, wallId: string): Promise<Wall> {
      return told((await wallFor(who, wallId)).wall);
    },

    async change(who: Who, wallId: string, change: BodyOf<typeof wallsApi.change>): Promise<Wall> {
      const { wall, job } = await wallFor(who, wallId);
      const { version, studs, ...values } = change;
      if (studs) requireStudsOnWall(studs, values.widthMm ?? wall.widthMm);
      const outcome = await walls.change(who.shopId, wallId, version, values, studs?.map((s) => ({ ...s, wallId })));
      if (outcome === 'taken') throw new ProblemError('bad-input', 'Two studs carry the same identifier. Reload the page and set them again.');
      const current = await this.read(who, wallId);
      if (outcome === 'stale') throw new ProblemError('stale', 'Someone changed this wall since you opened it. Look at what stands now and save again.', { current });
      await jobs.touch(job);
      return current;
    },

    /** Takes a photo (a file of any content, still unproved) and puts it in force in place of the one before. */
    async upload(who: Who, wallId: string, file: string): Promise<Photo> {
      const { wall, job } = await wallFor(who, wallId);
      const picture = await readPicture(file);
      const preview = await files.make(who.shopId, 'jpg', (place) => writePreview(file, place));
      const kept: string[] = [preview.key];
      try {
        kept.push(await files.take(who.shopId, picture.ending, file));
        const row: PhotoRow = {
          id: randomUUID(), shopId: who.shopId, wallId: wall.id, originalKey: kept[1]!, previewKey: preview.key, elevationKey: null, elevationSha256: null,
          widthPx: picture.widthPx, heightPx: picture.heightPx, marks: null, elevation: null, createdAt: clock(),
        };
        const before = await walls.setPhoto(who.shopId, wall.id, row);
        await files.remove(...before.flatMap(filesOf));
        await jobs.touch(job);
        return toldPhoto(row);
      } catch (error) {
        await files.remove(...kept);
        throw error;
      }
    },

    async straighten(who: Who, wallId: string, photoId: string, marks: Mark[], signal: AbortSignal): Promise<Photo> {
      const { wall, job, photo } = await photoFor(who, wallId, photoId);
      const trouble = marksTrouble(marks, photo);
      if (trouble) {
        throw new ProblemError('bad-input', trouble.words, { fields: trouble.which.map((i) => ({ path: `marks.${i}`, words: trouble.words })) });
      }
      const plan = elevationPlan(marks, photo, wall);
      if (!plan) {
        throw new ProblemError('bad-input', 'By these positions the photo shows nothing of the wall. Check the marks’ positions and the wall’s width and height.');
      }
      const { key, made } = await files.make(who.shopId, 'jpg', (elevationFile) =>
        pool.run<StraightenInput, StraightenResult>(
          'straighten',
          { photoFile: files.pathOf(photo.originalKey), elevationFile, widthPx: photo.widthPx, heightPx: photo.heightPx, plan },
          { signal },
        ),
      );
      const { leftMm, bottomMm, widthMm, heightMm, pxPerMm } = plan;
      const values = { marks, elevation: { leftMm, bottomMm, widthMm, heightMm, pxPerMm }, elevationKey: key, elevationSha256: made.sha256 };
      const saved = await walls.setElevation(photo.id, values);
      if (!saved) {
        await files.remove(key);
        throw notFound('photo');
      }
      await files.remove(saved.before);
      await jobs.touch(job);
      return toldPhoto({ ...photo, ...values });
    },

    async removePhoto(who: Who, wallId: string, photoId: string): Promise<Wall> {
      const { wall, job } = await photoFor(who, wallId, photoId);
      const before = await walls.setPhoto(who.shopId, wall.id, null);
      await files.remove(...before.flatMap(filesOf));
      await jobs.touch(job);
      return this.read(who, wallId);
    },

    async previewKey(who: Who, wallId: string, photoId: string): Promise<string> {
      return (await photoFor(who, wallId, photoId)).photo.previewKey;
    },

    async elevationKey(who: Who, wallId: string, photoId: string): Promise<string> {
      const { photo } = await photoFor(who, wallId, photoId);
      if (!photo.elevationKey) throw new ProblemError('not-found', 'This photo has not been straightened yet.');
      return photo.elevationKey;
    },

    /** For other rooms, which have asked who may read: the walls of a job, one wall, and its straightened picture. */
    async ofJob(shopId: string, jobId: string): Promise<Wall[]> {
      return (await walls.ofJob(shopId, jobId)).map(told);
    },
    async ofShop(shopId: string, wallId: string): Promise<Wall | null> {
      const wall = await walls.find(shopId, wallId);
      return wall && told(wall);
    },
    async elevationOf(shopId: string, wallId: string) {
      const photo = (await walls.find(shopId, wallId))?.photo;
      if (!photo?.elevation || !photo.elevationKey || !photo.elevationSha256) return null;
      return { photoId: photo.id, key: photo.elevationKey, sha256: photo.elevationSha256, ...photo.elevation };
    },
  };
}
export type WallsService = ReturnType<typeof wallsService>;

function requireStudsOnWall(studs: readonly Stud[], widthMm: number): void {
  const fields = studs.flatMap((s, i) =>
    s.xMm < -s.widthMm || s.xMm > widthMm + s.widthMm
      ? [{ path: `studs.${i}.xMm`, words: `This stud stands off the wall: at ${Math.round(s.xMm)} mm on a wall ${Math.round(widthMm)} mm wide.` }]
      : [],
  );
  if (fields[0]) throw new ProblemError('bad-input', fields[0].words, { fields });
}

function told(wall: WallWhole): Wall {
  return {
    id: wall.id, jobId: wall.jobId, name: wall.name, widthMm: wall.widthMm, heightMm: wall.heightMm, construction: wall.construction,
    coveringMm: wall.coveringMm, studSpecies: wall.studSpecies, version: wall.version, obstructions: wall.obstructions, zones: wall.zones,
    studs: wall.studs.map(({ id, xMm, widthMm, foundBy, uncertaintyMm }) => ({ id, xMm, widthMm, foundBy, uncertaintyMm })),
    photo: wall.photo && toldPhoto(wall.photo),
  };
}

function toldPhoto(photo: PhotoRow): Photo {
  const base = `/api/walls/${photo.wallId}/photos/${photo.id}`;
  return {
    id: photo.id, widthPx: photo.widthPx, heightPx: photo.heightPx, marks: photo.marks, createdAt: photo.createdAt.toISOString(),
    previewUrl: `${base}/preview`,
    // The picture may be straightened anew: its address changes with its content.
    elevation: photo.elevation && { url: `${base}/elevation?v=${photo.elevationSha256?.slice(0, 12) ?? ''}`, ...photo.elevation },
  };
}
