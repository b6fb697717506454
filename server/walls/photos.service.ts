import { randomUUID } from 'node:crypto';
import type { Knowledge } from '../../shared/walls/knowledge.ts';
import type { ListedPhoto, Photo, Progress } from '../../shared/walls/photo.ts';
import type { Wall } from '../../shared/walls/wall.ts';
import type { PhotoRow } from '../database/entities/walls.ts';
import type { FileStore } from '../files/file-store.ts';
import { readPicture, writePreview } from '../files/read-picture.ts';
import { notFound, ProblemError } from '../http/problems.ts';
import type { Who } from '../http/who.ts';
import type { JobsService } from '../jobs/jobs.service.ts';
import type { WorkerPool } from '../workers/pool.ts';
import { progressCell, progressOf, setProgress } from '../workers/progress.ts';
import type { FitInput, FitResult } from '../workers/tasks/fit.ts';
import type { StraightenInput, StraightenResult } from '../workers/tasks/straighten.ts';
import { told, toldPhoto } from './wall-told.ts';
import type { WallsRepository, WallWhole } from './walls.repository.ts';

interface Needs {
  walls: WallsRepository;
  jobs: JobsService;
  files: FileStore;
  pool: WorkerPool;
  clock: () => Date;
}

type Job = Awaited<ReturnType<JobsService['jobFor']>>;

/** A wall has at most so many photos. */
export const mostPhotos = 12;

/** What is known of a photo; only the marks must be said. */
export type Known = Pick<Knowledge, 'marks'> & Partial<Knowledge>;

/** The photos from which a wall is measured. One is in force: its elevation is the wall's picture. */
export function photosService({ walls, jobs, files, pool, clock }: Needs, wallFor: (who: Who, wallId: string) => Promise<{ wall: WallWhole; job: Job }>) {
  /** Straightenings under way in this process, by photo. */
  const under = new Map<string, SharedArrayBuffer>();

  async function photoFor(who: Who, wallId: string, photoId: string) {
    const { wall, job } = await wallFor(who, wallId);
    const photo = await walls.findPhoto(who.shopId, wallId, photoId);
    if (!photo) throw notFound('photo');
    return { wall, job, photo };
  }

  const filesOf = (photo: PhotoRow) => [photo.originalKey, photo.previewKey, photo.elevationKey];

  /** A busy pool is no reason to refuse a photo: its sharpness is then not known. */
  const sharpnessOf = (previewKey: string) => pool.run<{ file: string }, number>('sharpness', { file: files.pathOf(previewKey) }).catch(() => null);

  return {
    /** Takes a photo (a file of any content, still unproved) and puts it in force; those before stay to be chosen again. */
    async upload(who: Who, wallId: string, file: string): Promise<Photo> {
      const { wall, job } = await wallFor(who, wallId);
      const picture = await readPicture(file);
      const preview = await files.make(who.shopId, 'jpg', (place) => writePreview(file, place));
      const kept: string[] = [preview.key];
      try {
        kept.push(await files.take(who.shopId, picture.ending, file));
        const row: PhotoRow = {
          id: randomUUID(), shopId: who.shopId, wallId: wall.id, originalKey: kept[1]!, previewKey: preview.key, elevationKey: null, elevationSha256: null,
          widthPx: picture.widthPx, heightPx: picture.heightPx, focal35Mm: picture.focal35Mm, sharpness: await sharpnessOf(preview.key),
          marks: null, known: null, fit: null, elevation: null, createdAt: clock(),
        };
        const outcome = await walls.addPhoto(who.shopId, wall.id, row, mostPhotos);
        if (outcome === 'gone') throw notFound('wall');
        if (outcome === 'full') throw new ProblemError('bad-input', `This wall has ${mostPhotos} photos, which is the most it may have. Take one off first.`);
        await jobs.touch(job);
        return toldPhoto(row);
      } catch (error) {
        await files.remove(...kept);
        throw error;
      }
    },

    async straighten(who: Who, wallId: string, photoId: string, { marks, straightEdges = [], lines = [], lengths = [], focal35Mm }: Known, signal: AbortSignal): Promise<Photo> {
      const { wall, job, photo } = await photoFor(who, wallId, photoId);
      const known: Knowledge = { marks, straightEdges, lines, lengths, focal35Mm: focal35Mm ?? photo.focal35Mm ?? undefined };
      const progress = progressCell();
      under.set(photo.id, progress);
      try {
        setProgress(progress, 'fitting', 0);
        const { widthPx, heightPx } = photo;
        const fitted = await pool.run<FitInput, FitResult>('fit', { known, photo: { widthPx, heightPx }, wall: { widthMm: wall.widthMm, heightMm: wall.heightMm } }, { signal });
        if (fitted.state === 'refused') {
          const fields = fitted.marks.map((i) => ({ path: `marks.${i}`, words: fitted.words }));
          throw new ProblemError('bad-input', fitted.words, fields.length > 0 ? { fields } : {});
        }
        const { plan, report } = fitted;
        const { key, made } = await files.make(who.shopId, 'jpg', (elevationFile) =>
          pool.run<StraightenInput, StraightenResult>('straighten', { photoFile: files.pathOf(photo.originalKey), elevationFile, widthPx, heightPx, plan, progress }, { signal }),
        );
        const { leftMm, bottomMm, widthMm, heightMm, pxPerMm } = plan;
        const values = {
          marks, known: { straightEdges, lines, lengths }, fit: report,
          elevation: { leftMm, bottomMm, widthMm, heightMm, pxPerMm }, elevationKey: key, elevationSha256: made.sha256,
        };
        const saved = await walls.setElevation(photo.id, values);
        if (!saved) {
          await files.remove(key);
          throw notFound('photo');
        }
        await files.remove(saved.before);
        await jobs.touch(job);
        return toldPhoto({ ...photo, ...values });
      } finally {
        if (under.get(photo.id) === progress) under.delete(photo.id);
      }
    },

    async progress(who: Who, wallId: string, photoId: string): Promise<Progress> {
      return progressOf(under.get((await photoFor(who, wallId, photoId)).photo.id));
    },

    async photos(who: Who, wallId: string): Promise<ListedPhoto[]> {
      const { wall } = await wallFor(who, wallId);
      return (await walls.photosOf(who.shopId, wallId)).map((p) => ({ ...toldPhoto(p), inForce: p.id === wall.photo?.id }));
    },

    async choosePhoto(who: Who, wallId: string, photoId: string): Promise<Wall> {
      const { job } = await wallFor(who, wallId);
      if (!(await walls.choosePhoto(who.shopId, wallId, photoId))) throw notFound('photo');
      await jobs.touch(job);
      return told((await wallFor(who, wallId)).wall);
    },

    async removePhoto(who: Who, wallId: string, photoId: string): Promise<Wall> {
      const { wall, job, photo } = await photoFor(who, wallId, photoId);
      const gone = await walls.removePhoto(who.shopId, wall.id, photo.id);
      await files.remove(...gone.flatMap(filesOf));
      await jobs.touch(job);
      return told((await wallFor(who, wallId)).wall);
    },

    async previewKey(who: Who, wallId: string, photoId: string): Promise<string> {
      return (await photoFor(who, wallId, photoId)).photo.previewKey;
    },

    async elevationKey(who: Who, wallId: string, photoId: string): Promise<string> {
      const { photo } = await photoFor(who, wallId, photoId);
      if (!photo.elevationKey) throw new ProblemError('not-found', 'This photo has not been straightened yet.');
      return photo.elevationKey;
    },
  };
}
