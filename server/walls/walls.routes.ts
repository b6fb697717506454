import { wallsApi } from '../../shared/walls/walls.api.ts';
import type { Mount } from '../http/mount.ts';
import type { WallsService } from './walls.service.ts';

export function wallsRoutes(mount: Mount, walls: WallsService): void {
  mount.on(wallsApi.list, ({ who, params }) => walls.list(who, params.jobId));
  mount.on(wallsApi.create, ({ who, params, body }) => walls.create(who, params.jobId, body));
  mount.on(wallsApi.read, ({ who, params }) => walls.read(who, params.wallId));
  mount.on(wallsApi.change, ({ who, params, body }) => walls.change(who, params.wallId, body));
  mount.on(wallsApi.upload, ({ who, params, req }) => walls.upload(who, params.wallId, req.file!.path));
  mount.on(wallsApi.straighten, ({ who, params, body, res }) => {
    // Whoever cancels, or leaves, stops the work.
    const gone = new AbortController();
    res.on('close', () => gone.abort());
    return walls.straighten(who, params.wallId, params.photoId, body, gone.signal);
  });
  mount.on(wallsApi.progress, ({ who, params }) => walls.progress(who, params.wallId, params.photoId));
  mount.on(wallsApi.photos, ({ who, params }) => walls.photos(who, params.wallId));
  mount.on(wallsApi.choosePhoto, ({ who, params }) => walls.choosePhoto(who, params.wallId, params.photoId));
  mount.on(wallsApi.removePhoto, ({ who, params }) => walls.removePhoto(who, params.wallId, params.photoId));
  mount.on(wallsApi.preview, async ({ who, params, res }) => {
    await walls.files.sendTo(res, await walls.previewKey(who, params.wallId, params.photoId), 'image/jpeg');
  });
  mount.on(wallsApi.elevation, async ({ who, params, res }) => {
    await walls.files.sendTo(res, await walls.elevationKey(who, params.wallId, params.photoId), 'image/jpeg');
  });
}
