import type { QueryOf } from '../../shared/api/endpoint.ts';
import { assessBody } from '../../shared/findings/hung-body.ts';
import { placeFrame } from '../../shared/findings/placed-frame.ts';
import { usualLimits } from '../../shared/findings/scene.ts';
import type { HardwareBook } from '../../shared/hardware/hardware-book.ts';
import { leadHole } from '../../shared/hardware/lead-hole.ts';
import { studSpecies, type StudSpecies } from '../../shared/hardware/stud-species.ts';
import type { PatternDesign } from '../../shared/patterns/pattern.ts';
import type { TemplateInput } from '../../shared/templates/template-input.ts';
import type { templatesApi } from '../../shared/templates/templates.api.ts';
import { isConfirmed } from '../../shared/walls/wall.ts';
import { ProblemError } from '../http/problems.ts';
import type { HardwareService } from '../hardware/hardware.service.ts';
import type { Who } from '../http/who.ts';
import type { JobsService } from '../jobs/jobs.service.ts';
import type { Content, LayoutsService } from '../layouts/layouts.service.ts';
import type { PeopleService } from '../people/people.service.ts';
import type { WorkerPool } from '../workers/pool.ts';

interface Needs {
  layouts: LayoutsService;
  jobs: JobsService;
  people: PeopleService;
  hardware: HardwareService;
  pool: WorkerPool;
  clock: () => Date;
}

/** The hanging template: gathers what the sheets need and has them drawn off the request thread. */
export function templatesService({ layouts, jobs, people, hardware, pool, clock }: Needs) {
  return {
    async pdf(who: Who, layoutId: string, { paper, correctionX, correctionY }: QueryOf<typeof templatesApi.pdf>, signal: AbortSignal): Promise<{ bytes: Uint8Array; fileName: string }> {
      const { content, told } = await layouts.whole(who, layoutId);
      if (content.frames.length === 0) throw new ProblemError('bad-input', 'There is no frame on the wall yet, so there is nothing to print.');
      const [job, shop, book] = await Promise.all([jobs.jobFor(who, told.jobId), people.shopOf(who.shopId), hardware.bookOf(who.shopId)]);
      const revision = told.state === 'draft' ? undefined : told.revisions.at(-1);
      const input: TemplateInput = {
        title: { shop: shop.name, job: job.title, wall: content.wall.name, layout: told.name, letter: told.letter, state: told.state, sha256: revision?.sha256 ?? null },
        wall: {
          widthMm: content.wall.widthMm,
          heightMm: content.wall.heightMm,
          studs: content.wall.studs.map((s) => ({ xMm: s.xMm, widthMm: s.widthMm, confirmed: isConfirmed(s) })),
        },
        frames: templateFrames(content, book),
        units: shop.units,
        paper,
        marginMm: 12.7,
        overlapMm: 12,
        correction: { x: correctionX, y: correctionY },
        drawnAt: `${clock().toISOString().slice(0, 16).replace('T', ' ')} UTC`,
      };
      const bytes = await pool.run<TemplateInput, Uint8Array>('template', input, { signal });
      return { bytes, fileName: `template-${told.letter}-${paper}.pdf` };
    },
  };
}
export type TemplatesService = ReturnType<typeof templatesService>;

/** Frames with outline and screws in wall coordinates; a screw is named by its frame's label and a small letter. */
function templateFrames({ frames, patterns, wall }: Content, book: HardwareBook): TemplateInput['frames'] {
  const byId = new Map(patterns.map((p) => [p.id, p]));
  return frames.flatMap((frame) => {
    const pattern = byId.get(frame.patternId);
    if (!pattern) return [];
    const placed = placeFrame(frame, pattern);
    const { hangers } = assessBody(frame.id, [placed], { wall, book, limits: usualLimits });
    return [{
      id: frame.id,
      label: frame.label,
      outlineMm: placed.outline,
      hangers: hangers.map(({ hanger, x, y, meeting }, i) => ({
        id: hanger.id, label: `${frame.label}${String.fromCharCode(97 + (i % 26))}`, x, y, ...fastener(hanger, meeting?.inStud === true || wall.construction === 'solid wood' ? wall.studSpecies : null, book),
      })),
    }];
  });
}

/** What is drilled and driven for one hanger: its screw in wood of a species, else its anchor, whose hole its packet states. */
function fastener(hanger: PatternDesign['hangers'][number], wood: StudSpecies | null, book: HardwareBook): { drillMm: number | null; hardware: string } {
  const bracket = book.brackets.find((b) => b.id === hanger.bracketId)?.name ?? 'bracket not chosen';
  const screw = book.screws.find((s) => s.id === hanger.wallScrewId);
  const anchor = book.anchors.find((a) => a.id === hanger.anchorId);
  if (wood) return { drillMm: screw ? leadHole(screw, studSpecies[wood]) : null, hardware: `${bracket}; ${screw?.name ?? 'screw not chosen'}` };
  return { drillMm: null, hardware: `${bracket}; ${anchor ? `${anchor.name}, hole as its packet says` : 'anchor not chosen'}` };
}
