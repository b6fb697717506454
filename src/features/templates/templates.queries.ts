import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import type { BodyInputOf } from '../../../shared/api/endpoint.ts';
import { templatesApi, type Printer } from '../../../shared/templates/templates.api.ts';
import { call } from '../../lib/call.ts';
import { keys } from '../../lib/keys.ts';

export type TemplateWish = z.input<typeof templatesApi.plan.query>;

/** Which sheets a template takes and what they are drawn from, once `ready` has saved what is unsaved. */
export const templatePlanQuery = (layoutId: string, wish: TemplateWish, ready: () => Promise<unknown>) =>
  queryOptions({
    queryKey: [...keys.templatePlan(layoutId), wish],
    queryFn: async ({ signal }) => {
      await ready();
      return call(templatesApi.plan, { params: { layoutId }, query: wish, signal });
    },
    staleTime: 0,
    gcTime: 0,
    retry: false,
    placeholderData: (before) => before,
  });

export const printersQuery = queryOptions({ queryKey: keys.printers, queryFn: ({ signal }) => call(templatesApi.printers, { signal }) });

/** How far the drawing under this ticket has come. */
export const templateProgressQuery = (layoutId: string, ticket: string | null) =>
  queryOptions({
    queryKey: [...keys.templatePlan(layoutId), 'progress', ticket],
    queryFn: ({ signal }) => call(templatesApi.progress, { params: { layoutId }, query: { ticket: ticket! }, signal }),
    enabled: ticket !== null,
    refetchInterval: 400,
    gcTime: 0,
  });

export function useAddPrinter() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (name: string) => call(templatesApi.addPrinter, { body: { name } }),
    onSuccess: (printer) => client.setQueryData<Printer[]>(keys.printers, (list = []) => [...list, printer]),
  });
}

export function useMeasurePrinter() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ printerId, ...body }: { printerId: string } & BodyInputOf<typeof templatesApi.measurePrinter>) => call(templatesApi.measurePrinter, { params: { printerId }, body }),
    onSuccess: ({ printer }) => client.setQueryData<Printer[]>(keys.printers, (list = []) => list.map((p) => (p.id === printer.id ? printer : p))),
  });
}
