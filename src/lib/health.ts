import { useQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import { type Health, healthApi } from '../../shared/api/health.api.ts';
import { call } from './call.ts';
import { keys } from './keys.ts';

/** What the server says of itself, asked once; undefined until it has answered. */
export function useHealth(): z.infer<typeof Health> | undefined {
  return useQuery({ queryKey: keys.health, queryFn: ({ signal }) => call(healthApi.health, { signal }), staleTime: Infinity }).data;
}
