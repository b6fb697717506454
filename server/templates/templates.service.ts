import type { QueryOf } from '../../shared/api/endpoint.ts';
import { placedHangers, placedOutline } from '../../shared/patterns/hangers.ts';
import type { TemplateInput } from '../../shared/templates/template-input.ts';
import type { templatesApi } from '../../shared/templates/templates.api.ts';
import { isConfirmed } from '../../shared/walls/wall.ts';
import { ProblemError } from '../http/problems.ts';
import type { Who } from '../http/who.ts';
import type { JobsService } from '../jobs/jobs.service.ts';
import type { Content, LayoutsService } from '../layouts/layouts.service.ts';
import type { PeopleService } from '../people/people.service.ts';
import type { WorkerPool } from '../workers/pool.ts';

interface Needs {
  layouts: LayoutsService;
  jobs: JobsService;
  people: PeopleService;
  pool: WorkerPool;
  clock: () => Date;
}

/** The hanging template: gathers what the sheets need and has them drawn off the request thread. */
export function templatesService({ layouts, jobs, people, pool, clock }: Needs) {
  return {
    async pdf(who: Who, layoutId: string, { paper }: QueryOf<typeof templatesApi.pdf>, signal: AbortSignal): Promise<{ bytes: Uint8Array; fileName: string }> {
      const { content, told } = await layouts.whole(who, layoutId);
      if (content.frames.length === 0) throw new ProblemError('bad-input', 'There is no frame on the wall yet, so there is nothing to print.');
      const [job, shop] = await Promise.all([jobs.jobFor(who, told.jobId), people.shopOf(who.shopId)]);
      const revision = told.state === 'draft' ? undefined : told.revisions.at(-1);
      const input: TemplateInput = {
        title: { shop: shop.name, job: job.title, wall: content.wall.name, layout: told.name, letter: told.letter, state: told.state, sha256: revision?.sha256 ?? null },
        wall: {
          widthMm: content.wall.widthMm,
          heightMm: content.wall.heightMm,
          studs: content.wall.studs.map((s) => ({ xMm: s.xMm, widthMm: s.widthMm, confirmed: isConfirmed(s) })),
        },
        frames: templateFrames(content),
        units: shop.units,
        paper,
        marginMm: 12.7,
        overlapMm: 12,
        correction: { x: 1, y: 1 },
        drawnAt: `${clock().toISOString().slice(0, 16).replace('T', ' ')} UTC`,
      };
      const bytes = await pool.run<TemplateInput, Uint8Array>('template', input, { signal });
      return { bytes, fileName: `template-${told.letter}-${paper}.pdf` };
    },
  };
}
export type TemplatesService = ReturnType<typeof templatesService>;

/** Frames with outline and screws in wall coordinates; a screw is named by its frame's label and a small letter. */
function templateFrames({ frames, patterns }: Content): TemplateInput['frames'] {
  const designs = new Map(patterns.map((p) => [p.id, p.design]));
  return frames.flatMap((frame) => {
    const design = designs.get(frame.patternId);
    if (!design) return [];
    return [{
      id: frame.id,
      label: frame.label,
      outlineMm: placedOutline(frame, design),
      hangers: placedHangers(frame, design).map((h, i) => ({
        id: h.id, label: `${frame.label}${String.fromCharCode(97 + (i % 26))}`, x: h.x, y: h.y, drillMm: null, hardware: 'bracket and screw as chosen',
      })),
    }];
  });
}
