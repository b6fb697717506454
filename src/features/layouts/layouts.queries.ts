import { queryOptions } from '@tanstack/react-query';
import { hardwareApi } from '../../../shared/hardware/hardware.api.ts';
import { layoutsApi } from '../../../shared/layouts/layouts.api.ts';
import { wallsApi } from '../../../shared/walls/walls.api.ts';
import { call } from '../../lib/call.ts';
import { keys } from '../../lib/keys.ts';

/** One layout with its frames and revisions. */
export const layoutQuery = (layoutId: string) =>
  queryOptions({ queryKey: keys.layout(layoutId), queryFn: ({ signal }) => call(layoutsApi.read, { params: { layoutId }, signal }) });

/** The wall a layout hangs on. */
export const wallOfLayoutQuery = (wallId: string) =>
  queryOptions({ queryKey: keys.wall(wallId), queryFn: ({ signal }) => call(wallsApi.read, { params: { wallId }, signal }) });

/** The hardware book: what the checks of a layout reckon with. */
export const hardwareOfLayoutQuery = queryOptions({ queryKey: ['hardware'] as const, queryFn: ({ signal }) => call(hardwareApi.book, { signal }), staleTime: 60_000 });
