import { queryOptions } from '@tanstack/react-query';
import { layoutsApi } from '../../../shared/layouts/layouts.api.ts';
import { call } from '../../lib/call.ts';
import { keys } from '../../lib/keys.ts';

/** One layout with its frames and revisions. */
export const layoutQuery = (layoutId: string) =>
  queryOptions({ queryKey: keys.layout(layoutId), queryFn: ({ signal }) => call(layoutsApi.read, { params: { layoutId }, signal }) });
