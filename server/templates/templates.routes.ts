import type { Response } from 'express';
import { templatesApi } from '../../shared/templates/templates.api.ts';
import type { Mount } from '../http/mount.ts';
import type { PrintersService } from './printers.service.ts';
import type { TemplatesService } from './templates.service.ts';

const types = { pdf: 'application/pdf', dxf: 'image/vnd.dxf', svg: 'image/svg+xml' };

export function templatesRoutes(mount: Mount, templates: TemplatesService, printers: PrintersService): void {
  const send = async (res: Response, output: keyof typeof types, { file, fileName }: { file: string; fileName: string }) => {
    res.set({ 'Cache-Control': 'private, no-store', 'Content-Disposition': `attachment; filename="${fileName}"`, 'X-Content-Type-Options': 'nosniff' }).type(types[output]);
    await new Promise<void>((resolve, reject) => {
      res.sendFile(file, { root: templates.root, cacheControl: false }, (error?: Error & { code?: string }) => {
        // A reader who turns away in the middle is no failure.
        if (error && error.code !== 'ECONNABORTED' && error.code !== 'EPIPE' && !res.destroyed) reject(error);
        else resolve();
      });
    });
  };
  mount.on(templatesApi.pdf, async ({ who, params, query: { ticket, ...query }, res }) => send(res, 'pdf', await templates.file(who, params.layoutId, query, 'pdf', gone(res), ticket)));
  mount.on(templatesApi.dxf, async ({ who, params, query, res }) => send(res, 'dxf', await templates.file(who, params.layoutId, query, 'dxf', gone(res))));
  mount.on(templatesApi.svg, async ({ who, params, query, res }) => send(res, 'svg', await templates.file(who, params.layoutId, query, 'svg', gone(res))));
  mount.on(templatesApi.plan, ({ who, params, query, res }) => templates.plan(who, params.layoutId, query, gone(res)));
  mount.on(templatesApi.progress, ({ who, params, query }) => templates.progress(who, params.layoutId, query.ticket));
  mount.on(templatesApi.printers, ({ who }) => printers.list(who));
  mount.on(templatesApi.addPrinter, ({ who, body }) => printers.add(who, body.name));
  mount.on(templatesApi.measurePrinter, ({ who, params, body }) => printers.measure(who, params.printerId, body));
  mount.on(templatesApi.removePrinter, async ({ who, params }) => {
    await printers.remove(who, params.printerId);
    return { done: true as const };
  });
}

/** A reader who goes away stops the drawing. */
function gone(res: Response): AbortSignal {
  const gone = new AbortController();
  res.on('close', () => gone.abort());
  return gone.signal;
}
