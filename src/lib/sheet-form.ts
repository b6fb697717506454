import { zodResolver } from '@hookform/resolvers/zod';
import { type BaseSyntheticEvent, useState } from 'react';
import { type DefaultValues, type FieldValues, type Path, useForm, type UseFormReturn } from 'react-hook-form';
import type { z } from 'zod';
import { isCallError } from './call-error.ts';

interface Sheet<In extends FieldValues, Out extends FieldValues> {
  schema: z.ZodType<Out, In>;
  defaultValues: DefaultValues<In>;
  /** Sends the checked values; what it throws is shown at the fields it names, or as `failure`. */
  send: (values: Out) => Promise<unknown>;
}

export interface SheetForm<In extends FieldValues, Out extends FieldValues> {
  form: UseFormReturn<In, unknown, Out>;
  submit: (event?: BaseSyntheticEvent) => Promise<void>;
  /** An error that belongs to no field in sight. */
  failure: unknown;
  sending: boolean;
  /** Something was typed that is neither sent nor being sent. */
  unsaved: boolean;
}

/** A form over one schema: checked here by it before it is sent, and the server's word on fields put beside them. */
export function useSheetForm<In extends FieldValues, Out extends FieldValues>({ schema, defaultValues, send }: Sheet<In, Out>): SheetForm<In, Out> {
  const form = useForm<In, unknown, Out>({ resolver: zodResolver(schema), defaultValues, mode: 'onTouched', shouldFocusError: false });
  const [failure, setFailure] = useState<unknown>(null);
  const { isSubmitting, isDirty, isSubmitSuccessful } = form.formState;
  const check = form.handleSubmit(async (values) => {
    setFailure(null);
    try {
      await send(values);
    } catch (error) {
      const known = fieldsOf(error).filter(({ path }) => knownField(path, form.getValues()));
      for (const { path, words } of known) form.setError(path as Path<In>, { type: 'server', message: words });
      if (known.length === 0) {
        form.setError('root' as Path<In>, { type: 'server' });
        setFailure(error);
      }
    }
  });
  const submit = async (event?: BaseSyntheticEvent) => {
    const place: unknown = event?.currentTarget;
    await check(event);
    if (place instanceof HTMLElement) focusFirstFault(place);
  };
  return { form, submit, failure, sending: isSubmitting, unsaved: isDirty && !isSubmitting && !isSubmitSuccessful };
}

/** Brings the reader to the first field that is refused, once the page shows which: also those that no `register` knows. */
function focusFirstFault(place: HTMLElement): void {
  requestAnimationFrame(() => place.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus());
}

function fieldsOf(error: unknown): { path: string; words: string }[] {
  return isCallError(error) ? (error.problem.fields ?? []) : [];
}

function knownField(path: string, values: FieldValues): boolean {
  return (path.split('.')[0] ?? '') in values;
}
