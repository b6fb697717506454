import { queryOptions } from '@tanstack/react-query';
import { hardwareApi } from '../../../shared/hardware/hardware.api.ts';
import { layoutsApi } from '../../../shared/layouts/layouts.api.ts';
import { signoffsApi } from '../../../shared/signoffs/signoffs.api.ts';
import { Snapshot } from '../../../shared/signoffs/snapshot.ts';
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

/** What the server's version of a layout is, asked every few seconds while the page is in sight: another's save shows by it. */
export const layoutVersionQuery = (layoutId: string) =>
  queryOptions({
    queryKey: keys.layoutVersion(layoutId),
    queryFn: ({ signal }) => call(layoutsApi.version, { params: { layoutId }, signal }),
    refetchInterval: 3000,
    staleTime: 0,
    retry: false,
  });

/** A revision as it was sent: frames, sheet and patterns of its time. What was sent never changes. */
export const sentRevisionQuery = (revisionId: string) =>
  queryOptions({
    queryKey: keys.revision(revisionId),
    queryFn: async ({ signal }) => {
      const { canonical } = await call(signoffsApi.record, { params: { revisionId }, signal });
      const { frames, sheet, patterns } = Snapshot.parse(JSON.parse(canonical));
      return { frames, sheet, patterns };
    },
    staleTime: Infinity,
  });
