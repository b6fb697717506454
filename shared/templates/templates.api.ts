import { z } from 'zod';
import { bytes, done, endpoint, id, instant } from '../api/endpoint.ts';
import { MeasuredBars, axisVerdict } from './printer-correction.ts';
import { papers } from './papers.ts';
import { templateQuery } from './template-options.ts';
import { TemplateInput } from './template-input.ts';

const layout = z.object({ layoutId: id });
const ticket = z.uuid({ error: 'This is not a ticket.' });
const finite = z.number();
const rect = z.object({ x: finite, y: finite, width: finite, height: finite });
const point = z.object({ x: finite, y: finite });
const format = z.object({ paper: z.enum(papers), name: z.string(), orientation: z.enum(['portrait', 'landscape']), widthMm: finite, heightMm: finite, live: rect });
const neighbour = z.string().nullable();

/** The plan of sheets as it lies over the wall, in wall coordinates, mm. */
export const PlanTold = z.object({
  format,
  sheets: z.array(z.object({
    name: z.string(), frame: z.string().optional(), row: z.number(), column: z.number(), window: rect, format, step: point,
    left: neighbour, right: neighbour, below: neighbour, above: neighbour,
  })),
  step: point,
  overlap: point,
  origin: point,
  blank: z.number(),
});

/** A printer of the shop's with what its prints need to come out true: stated over measured length, on each axis. */
export const Printer = z.object({ id, name: z.string(), correctionX: z.number(), correctionY: z.number(), measuredAt: instant.nullable() });
export type Printer = z.output<typeof Printer>;
const printers = z.array(Printer);

export const templatesApi = {
  pdf: endpoint({
    method: 'get', path: '/api/layouts/:layoutId/template.pdf', permission: 'read jobs', kind: 'file', limit: 'heavy', summary: 'The hanging template of the layout as it stands, 1:1, in PDF.',
    params: layout,
    query: templateQuery.extend({ ticket: ticket.optional() }),
    reply: bytes,
  }),
  dxf: endpoint({
    method: 'get', path: '/api/layouts/:layoutId/template.dxf', permission: 'read jobs', kind: 'file', limit: 'heavy', summary: 'The same drawing of the wall whole, 1:1 in mm, in DXF for those who cut or plot.',
    params: layout, query: templateQuery, reply: bytes,
  }),
  svg: endpoint({
    method: 'get', path: '/api/layouts/:layoutId/template.svg', permission: 'read jobs', kind: 'file', limit: 'heavy', summary: 'The same drawing of the wall whole, 1:1 in mm, in SVG.',
    params: layout, query: templateQuery, reply: bytes,
  }),
  plan: endpoint({
    method: 'get', path: '/api/layouts/:layoutId/template/plan', permission: 'read jobs', summary: 'Which sheets the template would take, where they lie on the wall, and all that they are drawn from.',
    params: layout, query: templateQuery,
    reply: z.object({ input: TemplateInput, plan: PlanTold, notes: z.array(z.string()) }),
  }),
  progress: endpoint({
    method: 'get', path: '/api/layouts/:layoutId/template/progress', permission: 'read jobs', summary: 'How far the making of a template has come that was asked for with this ticket.',
    params: layout, query: z.object({ ticket: ticket.optional() }),
    reply: z.object({ state: z.enum(['idle', 'waiting', 'drawing']), drawn: z.number(), pages: z.number() }),
  }),
  printers: endpoint({ method: 'get', path: '/api/printers', permission: 'read jobs', summary: 'The shop’s printers and their corrections.', reply: printers }),
  addPrinter: endpoint({
    method: 'post', path: '/api/printers', permission: 'record hanging', status: 201, summary: 'Notes a printer, uncorrected as yet.',
    body: z.object({ name: z.string().trim().min(1, 'Give the printer a name.').max(80) }), reply: Printer,
  }),
  measurePrinter: endpoint({
    method: 'post', path: '/api/printers/:printerId/measurements', permission: 'record hanging', summary: 'Corrects a printer by the two bars measured on its print; refused past 3 %.',
    params: z.object({ printerId: id }), body: MeasuredBars,
    reply: z.object({ printer: Printer, across: axisVerdict, up: axisVerdict }),
  }),
  removePrinter: endpoint({
    method: 'delete', path: '/api/printers/:printerId', permission: 'record hanging', summary: 'Forgets a printer.', params: z.object({ printerId: id }), reply: done,
  }),
};
