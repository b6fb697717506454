import { createHash, randomUUID } from 'node:crypto';
import type { BodyOf } from '../../shared/api/endpoint.ts';
import { applyEdits } from '../../shared/layouts/edits.ts';
import type { Layout, LayoutPattern, LayoutSheet } from '../../shared/layouts/layout.ts';
import type { layoutsApi } from '../../shared/layouts/layouts.api.ts';
import { nextLetter } from '../../shared/layouts/naming.ts';
import { contentText, type Snapshot } from '../../shared/signoffs/snapshot.ts';
import type { RevisionRow } from '../database/entities/layouts.ts';
import { notFound, ProblemError } from '../http/problems.ts';
import type { Who } from '../http/who.ts';
import type { JobsService } from '../jobs/jobs.service.ts';
import type { PatternsService } from '../patterns/patterns.service.ts';
import type { WallsService } from '../walls/walls.service.ts';
import type { LayoutsRepository, LayoutWhole } from './layouts.repository.ts';

export const sha256 = (text: string) => createHash('sha256').update(text, 'utf8').digest('hex');

/** All of a snapshot but the words around it: what decides whether the bench has changed. */
export type Content = Pick<Snapshot, 'layoutId' | 'sheet' | 'frames' | 'patterns' | 'wall' | 'elevation'>;

interface Needs {
  layouts: LayoutsRepository;
  jobs: JobsService;
  walls: WallsService;
  patterns: PatternsService;
  clock: () => Date;
}

/** Layouts on walls: their frames, edits and what revision the bench holds. */
export function layoutsService({ layouts, jobs, walls, patterns, clock }: Needs) {
  async function wholeFor(who: Who, layoutId: string): Promise<LayoutWhole> {
    const whole = await layouts.find(who.shopId, layoutId);
    if (!whole) throw notFound('layout');
    await jobs.jobFor(who, whole.layout.jobId);
    return whole;
  }

  /** What stands on the bench now, with everything it depends on. */
  async function contentOf({ layout, frames }: LayoutWhole): Promise<Content> {
    const [wall, used] = await Promise.all([
      walls.ofShop(layout.shopId, layout.wallId),
      patterns.some(layout.shopId, frames.map((f) => f.patternId)),
    ]);
    if (!wall) throw notFound('wall');
    const picture = await walls.elevationOf(layout.shopId, layout.wallId);
    return {
      layoutId: layout.id,
      sheet: { name: layout.name, revealMm: layout.revealMm },
      frames,
      patterns: used.map(({ id, name, design }): LayoutPattern => ({ id, name, design })),
      wall: {
        name: wall.name, widthMm: wall.widthMm, heightMm: wall.heightMm, construction: wall.construction, coveringMm: wall.coveringMm, studSpecies: wall.studSpecies,
        outlineMm: wall.outlineMm, studs: wall.studs, obstructions: wall.obstructions, zones: wall.zones,
      },
      elevation: picture && { photoId: picture.photoId, sha256: picture.sha256, leftMm: picture.leftMm, bottomMm: picture.bottomMm, widthMm: picture.widthMm, heightMm: picture.heightMm },
    };
  }

  async function told(whole: LayoutWhole): Promise<Layout> {
    const { layout, frames, revisions } = whole;
    const hash = revisions.length > 0 ? sha256(contentText(await contentOf(whole))) : '';
    const last = revisions.at(-1);
    const lastSigned = revisions.filter((r) => r.state === 'signed').at(-1);
    const unchanged = last !== undefined && last.contentSha256 === hash;
    return {
      id: layout.id, jobId: layout.jobId, wallId: layout.wallId, name: layout.name, revealMm: layout.revealMm, version: layout.version, frames,
      letter: last ? (unchanged ? last.letter : nextLetter(last.letter)) : 'A',
      state: unchanged ? last.state : 'draft',
      changedSinceSigned: lastSigned !== undefined && lastSigned.contentSha256 !== hash,
      revisions: revisions.map(revisionTold),
      updatedAt: layout.updatedAt.toISOString(), updatedBy: layout.updatedBy,
    };
  }

  return {
    async list(who: Who, jobId: string): Promise<Layout[]> {
      await jobs.jobFor(who, jobId);
      return Promise.all((await layouts.ofJob(who.shopId, jobId)).map(told));
    },

    /** For rooms that have already asked who may read. */
    ofJob: async (shopId: string, jobId: string): Promise<Layout[]> => Promise.all((await layouts.ofJob(shopId, jobId)).map(told)),

    async create(who: Who, wallId: string, sheet: LayoutSheet): Promise<Layout> {
      const wall = await walls.read(who, wallId);
      const now = clock();
      const layout = { id: randomUUID(), shopId: who.shopId, jobId: wall.jobId, wallId, ...sheet, version: 1, createdAt: now, updatedAt: now, updatedBy: who.name };
      await layouts.add(layout);
      await jobs.touch(await jobs.jobFor(who, wall.jobId));
      return told({ layout, frames: [], revisions: [] });
    },

    read: async (who: Who, layoutId: string): Promise<Layout> => told(await wholeFor(who, layoutId)),

    async version(who: Who, layoutId: string): Promise<{ version: number }> {
      const found = await layouts.version(who.shopId, layoutId);
      if (!found) throw notFound('layout');
      await jobs.jobFor(who, found.jobId);
      return { version: found.version };
    },

    /** Applies edits made on `version`. Any doubt is answered with what stands now; nothing is overwritten in silence. */
    async edit(who: Who, layoutId: string, { version, edits }: BodyOf<typeof layoutsApi.edit>): Promise<Layout> {
      const whole = await wholeFor(who, layoutId);
      const { layout, frames } = whole;
      const stale = async () => {
        const now = await wholeFor(who, layoutId);
        return new ProblemError('stale', `${now.layout.updatedBy} saved this layout before you. Your edits are kept on your page; nothing was overwritten.`, { current: await told(now) });
      };
      if (layout.version !== version) throw await stale();
      const applied = applyEdits(frames, { name: layout.name, revealMm: layout.revealMm }, edits);
      if (applied.conflicts.length > 0) throw await stale();
      if (applied.frames.length > 1000) throw new ProblemError('bad-input', 'A layout holds at most 1,000 frames.');
      await requirePatterns(who, edits);
      if (!(await layouts.save(layoutId, version, applied.sheet, edits, who.name, clock()))) throw await stale();
      await jobs.touch(await jobs.jobFor(who, layout.jobId));
      return told(await wholeFor(who, layoutId));
    },

    async remove(who: Who, layoutId: string): Promise<void> {
      const { revisions } = await wholeFor(who, layoutId);
      if (revisions.length > 0) throw new ProblemError('conflict', 'This layout was sent to the client; what was sent is kept, so it cannot be deleted.');
      await layouts.remove(layoutId);
    },

    /** A layout with its content, for sending and for papers. */
    async whole(who: Who, layoutId: string): Promise<{ whole: LayoutWhole; content: Content; told: Layout }> {
      const whole = await wholeFor(who, layoutId);
      return { whole, content: await contentOf(whole), told: await told(whole) };
    },
  };

  async function requirePatterns(who: Who, edits: BodyOf<typeof layoutsApi.edit>['edits']): Promise<void> {
    const ids = new Set(edits.flatMap((e) => (e.kind === 'frame' && e.after ? [e.after.patternId] : [])));
    const known = new Set((await patterns.some(who.shopId, [...ids])).map((p) => p.id));
    if ([...ids].some((id) => !known.has(id))) {
      throw new ProblemError('bad-input', 'A frame names a pattern that is not in your pattern book.', { fields: [{ path: 'edits', words: 'Unknown pattern.' }] });
    }
  }
}
export type LayoutsService = ReturnType<typeof layoutsService>;

export const revisionTold = (r: RevisionRow): Layout['revisions'][number] => ({
  id: r.id, letter: r.letter, state: r.state, sha256: r.sha256, sentAt: r.sentAt.toISOString(), signedAt: r.signedAt?.toISOString() ?? null,
  signedName: r.signedName, askedFor: r.askedFor,
});
