import { patternsApi } from '../../shared/patterns/patterns.api.ts';
import type { Mount } from '../http/mount.ts';
import type { PatternsService } from './patterns.service.ts';

export function patternsRoutes(mount: Mount, patterns: PatternsService): void {
  mount.on(patternsApi.list, ({ who }) => patterns.list(who));
  mount.on(patternsApi.create, ({ who, body }) => patterns.create(who, body));
  mount.on(patternsApi.change, ({ who, params, body }) => patterns.change(who, params.patternId, body));
}
