import { layoutsApi } from '../../shared/layouts/layouts.api.ts';
import type { Mount } from '../http/mount.ts';
import type { LayoutsService } from './layouts.service.ts';

export function layoutsRoutes(mount: Mount, layouts: LayoutsService): void {
  mount.on(layoutsApi.list, ({ who, params }) => layouts.list(who, params.jobId));
  mount.on(layoutsApi.create, ({ who, params, body }) => layouts.create(who, params.wallId, body));
  mount.on(layoutsApi.read, ({ who, params }) => layouts.read(who, params.layoutId));
  mount.on(layoutsApi.version, ({ who, params }) => layouts.version(who, params.layoutId));
  mount.on(layoutsApi.edit, ({ who, params, body }) => layouts.edit(who, params.layoutId, body));
  mount.on(layoutsApi.remove, async ({ who, params }) => {
    await layouts.remove(who, params.layoutId);
    return { done: true as const };
  });
}
