import { hardwareApi } from '../../shared/hardware/hardware.api.ts';
import type { Mount } from '../http/mount.ts';
import type { HardwareService } from './hardware.service.ts';

export function hardwareRoutes(mount: Mount, hardware: HardwareService): void {
  mount.on(hardwareApi.book, ({ who }) => hardware.book(who));
  mount.on(hardwareApi.add, ({ who, body }) => hardware.add(who, body));
  mount.on(hardwareApi.change, ({ who, params, body }) => hardware.change(who, params.hardwareId, body));
  mount.on(hardwareApi.remove, async ({ who, params }) => {
    await hardware.remove(who, params.hardwareId);
    return { done: true as const };
  });
}
