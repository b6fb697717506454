import { Controller } from 'react-hook-form';
import type { z } from 'zod';
import { id } from '../../../shared/api/endpoint.ts';
import { type Layout, LayoutSheet } from '../../../shared/layouts/layout.ts';
import type { Wall } from '../../../shared/walls/wall.ts';
import { FormDialog } from '../../components/form-dialog.tsx';
import { LengthField } from '../../components/length-field.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { TextField } from '../../components/text-field.tsx';
import { useSheetForm } from '../../lib/sheet-form.ts';
import { useUnits } from '../../lib/units.ts';
import { useStartLayout } from './job-parts.queries.ts';

const NewLayout = LayoutSheet.extend({ wallId: id });

interface Props {
  jobId: string;
  walls: readonly Wall[];
  /** Name to begin with, such as "Option 2". */
  name: string;
  onClose: () => void;
  onStarted: (layout: Layout) => void;
}

/** Starts a layout on one of the job's walls. */
export function NewLayoutDialog({ jobId, walls, name, onClose, onStarted }: Props) {
  const units = useUnits();
  const start = useStartLayout(jobId);
  const sheet = useSheetForm({
    schema: NewLayout as z.ZodType<z.output<typeof NewLayout>, z.input<typeof NewLayout>>,
    // A quarter inch, or 6 mm, forgives a board that is not quite straight (common practice).
    defaultValues: { name, wallId: walls[0]?.id, revealMm: units === 'in' ? 6.35 : 6 },
    send: async (body) => onStarted(await start.mutateAsync(body)),
  });
  const { register, control, formState } = sheet.form;
  const { errors } = formState;
  return (
    <FormDialog title="New layout" deed="Start the layout" sheet={sheet} onClose={onClose}>
      <TextField label="Name" hint="The client sees it among the options." error={errors.name?.message} {...register('name')} />
      <SelectField label="Wall" options={walls.map((wall) => ({ value: wall.id, words: wall.name }))} error={errors.wallId?.message} {...register('wallId')} />
      <Controller
        control={control}
        name="revealMm"
        render={({ field }) => (
          <LengthField label="Reveal" hint="The gap between neighbouring frames." error={errors.revealMm?.message} value={field.value ?? null} onChange={field.onChange} onBlur={field.onBlur} />
        )}
      />
    </FormDialog>
  );
}
