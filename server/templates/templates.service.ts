import { paperProblem } from '../../shared/templates/sheet-format.ts';
import type { SheetPlan } from '../../shared/templates/sheets.ts';
import { optionsOf, type TemplateQuery } from '../../shared/templates/template-options.ts';
import type { TemplateInput } from '../../shared/templates/template-input.ts';
import { planNotes } from '../../shared/templates/template.ts';
import { isConfirmed } from '../../shared/walls/wall.ts';
import { ProblemError } from '../http/problems.ts';
import type { HardwareService } from '../hardware/hardware.service.ts';
import type { Who } from '../http/who.ts';
import type { JobsService } from '../jobs/jobs.service.ts';
import type { LayoutsService } from '../layouts/layouts.service.ts';
import type { PeopleService } from '../people/people.service.ts';
import type { WorkerPool } from '../workers/pool.ts';
import type { TemplateTask } from '../workers/tasks/template.ts';
import type { PrintersService } from './printers.service.ts';
import { pageCell, pagesOf } from './template-progress.ts';
import { openFindings, templateFrames } from './template-sheets.ts';
import type { TemplateStore } from './template-store.ts';

interface Needs {
  layouts: LayoutsService;
  jobs: JobsService;
  people: PeopleService;
  hardware: HardwareService;
  printers: PrintersService;
  store: TemplateStore;
  pool: WorkerPool;
  clock: () => Date;
}


/** The hanging template: gathers what the sheets need and has them drawn off the request thread. */
export function templatesService({ layouts, jobs, people, hardware, printers, store, pool, clock }: Needs) {
  /** Drawings under way in this process, by ticket. */
  const under = new Map<string, SharedArrayBuffer>();

  async function inputFor(who: Who, layoutId: string, query: TemplateQuery): Promise<TemplateInput> {
    const { content, told } = await layouts.whole(who, layoutId);
    if (content.frames.length === 0) throw new ProblemError('bad-input', 'There is no frame on the wall yet, so there is nothing to print.');
    const [job, shop, book, printer] = await Promise.all([
      jobs.jobFor(who, told.jobId), people.shopOf(who.shopId), hardware.bookOf(who.shopId), query.printerId ? printers.read(who, query.printerId) : null,
    ]);
    const revision = told.state === 'draft' ? undefined : told.revisions.at(-1);
    const input: TemplateInput = {
      ...optionsOf(query),
      title: { shop: shop.name, job: job.title, wall: content.wall.name, layout: told.name, letter: told.letter, state: told.state, sha256: revision?.sha256 ?? null },
      wall: {
        widthMm: content.wall.widthMm,
        heightMm: content.wall.heightMm,
        studs: content.wall.studs.map((s) => ({ xMm: s.xMm, widthMm: s.widthMm, confirmed: isConfirmed(s), uncertaintyMm: s.uncertaintyMm })),
      },
      frames: templateFrames(content, book),
      units: shop.units,
      correction: printer ? { x: printer.correctionX, y: printer.correctionY } : { x: query.correctionX, y: query.correctionY },
      printer: printer?.name ?? '',
      findings: openFindings(content, book, shop.units, told.changedSinceSigned),
      drawnAt: `${clock().toISOString().slice(0, 16).replace('T', ' ')} UTC`,
    };
    refuse(input);
    return input;
  }

  async function plan(who: Who, layoutId: string, query: TemplateQuery, signal: AbortSignal): Promise<{ input: TemplateInput; plan: SheetPlan; notes: string[] }> {
    const input = await inputFor(who, layoutId, query);
    const found = await pool.run<TemplateInput, SheetPlan>('template-plan', input, { signal });
    return { input, plan: found, notes: planNotes(input, found) };
  }

  return {
    plan,

    /** The file to send, from the store where the same was drawn before. */
    async file(who: Who, layoutId: string, query: TemplateQuery, output: TemplateTask['output'], signal: AbortSignal, ticket?: string): Promise<{ file: string; fileName: string }> {
      const input = await inputFor(who, layoutId, query);
      const cell = pageCell();
      const name = ticket && `${who.shopId} ${layoutId} ${ticket}`;
      if (name) under.set(name, cell);
      try {
        const { file } = await store.find(who.shopId, store.keyOf(input, output), (place) => pool.run<TemplateTask, void>('template', { input, output, place, cell }, { signal }));
        return { file, fileName: `template-${input.title.letter}-${input.kind.replace(' ', '-')}-${input.paper}.${output}` };
      } finally {
        if (name) under.delete(name);
      }
    },

    /** How far a drawing has come; idle once it is done, or where none is known by this ticket. */
    async progress(who: Who, layoutId: string, ticket = ''): Promise<{ state: 'idle' | 'waiting' | 'drawing'; drawn: number; pages: number }> {
      await layouts.read(who, layoutId);
      const cell = under.get(`${who.shopId} ${layoutId} ${ticket}`);
      if (!cell) return { state: 'idle', drawn: 0, pages: 0 };
      const pages = pagesOf(cell);
      return { state: pages.pages > 0 ? 'drawing' : 'waiting', ...pages };
    },

    root: store.root,
  };
}
export type TemplatesService = ReturnType<typeof templatesService>;

function refuse(input: TemplateInput): void {
  const problem = paperProblem(input);
  if (problem) throw new ProblemError('bad-input', problem.words, { fields: [{ path: problem.path, words: problem.words }] });
  if (input.kind !== 'full' && input.kind !== 'frames' && input.frames.every((f) => f.hangers.length === 0)) {
    throw new ProblemError('bad-input', 'No frame has a hanger yet, so there are no screws to print. Give the patterns hangers, or print the full template.', { fields: [{ path: 'kind', words: 'There are no hangers.' }] });
  }
  if (input.firstFrameId !== null && !input.frames.some((f) => f.id === input.firstFrameId)) {
    throw new ProblemError('bad-input', 'The frame to hang first is not on this wall.', { fields: [{ path: 'firstFrameId', words: 'This frame is not on the wall.' }] });
  }
}
