import { randomUUID } from 'node:crypto';
import type { BodyOf } from '../../shared/api/endpoint.ts';
import type { Stud, Wall, WallShape } from '../../shared/walls/wall.ts';
import type { wallsApi } from '../../shared/walls/walls.api.ts';
import type { FileStore } from '../files/file-store.ts';
import { notFound, ProblemError } from '../http/problems.ts';
import type { Who } from '../http/who.ts';
import type { JobsService } from '../jobs/jobs.service.ts';
import type { WorkerPool } from '../workers/pool.ts';
import { photosService } from './photos.service.ts';
import { told } from './wall-told.ts';
import type { WallsRepository } from './walls.repository.ts';

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

  return {
    files,

    async list(who: Who, jobId: string): Promise<Wall[]> {
      await jobs.jobFor(who, jobId);
      return (await walls.ofJob(who.shopId, jobId)).map(told);
    },

    async create(who: Who, jobId: string, shape: WallShape): Promise<Wall> {
      const job = await jobs.jobFor(who, jobId);
      const row = { id: randomUUID(), shopId: who.shopId, jobId, ...shape, outlineMm: shape.outlineMm ?? null, obstructions: [], zones: [], photoId: null, version: 1, createdAt: clock() };
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

    ...photosService({ walls, jobs, files, pool, clock }, wallFor),

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
