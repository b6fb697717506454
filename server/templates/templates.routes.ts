import { templatesApi } from '../../shared/templates/templates.api.ts';
import type { Mount } from '../http/mount.ts';
import type { TemplatesService } from './templates.service.ts';

export function templatesRoutes(mount: Mount, templates: TemplatesService): void {
  mount.on(templatesApi.pdf, async ({ who, params, query, res }) => {
    // A reader who goes away stops the drawing.
    const gone = new AbortController();
    res.on('close', () => gone.abort());
    const { bytes, fileName } = await templates.pdf(who, params.layoutId, query, gone.signal);
    res.set('Cache-Control', 'private, no-store').set('Content-Disposition', `attachment; filename="${fileName}"`).type('application/pdf').send(Buffer.from(bytes));
  });
}
