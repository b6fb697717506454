import { Controller, useWatch } from 'react-hook-form';
import { usualStudSpecies } from '../../../shared/hardware/stud-species.ts';
import { constructionWords, holdsInWood, studSpeciesOptions } from '../../../shared/walls/construction.ts';
import { constructions, type Wall, WallShape } from '../../../shared/walls/wall.ts';
import { Button } from '../../components/button.tsx';
import { FormDialog } from '../../components/form-dialog.tsx';
import { LengthField } from '../../components/length-field.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { TextField } from '../../components/text-field.tsx';
import { useSheetForm } from '../../lib/sheet-form.ts';
import { useUnits } from '../../lib/units.ts';
import { useAddWall } from './job-parts.queries.ts';

/** Usual board thicknesses (common practice), in the units they are sold in. */
const coverings = {
  in: [
    { words: 'None', mm: 0 },
    { words: '1/2 in board', mm: 12.7 },
    { words: '5/8 in board', mm: 15.875 },
    { words: 'Two of 1/2 in', mm: 25.4 },
  ],
  mm: [
    { words: 'None', mm: 0 },
    { words: '12.5 mm board', mm: 12.5 },
    { words: '15 mm board', mm: 15 },
    { words: 'Two of 12.5 mm', mm: 25 },
  ],
};

/** Adds a wall to a job: its size, what it is made of, and what lies over the studs. */
export function NewWallDialog({ jobId, onClose, onAdded }: { jobId: string; onClose: () => void; onAdded: (wall: Wall) => void }) {
  const units = useUnits();
  const add = useAddWall(jobId);
  const sheet = useSheetForm({
    schema: WallShape,
    defaultValues: { name: '', construction: 'wood studs', studSpecies: usualStudSpecies, coveringMm: units === 'in' ? 12.7 : 12.5 },
    send: async (body) => onAdded(await add.mutateAsync(body)),
  });
  const { register, control, formState, setValue } = sheet.form;
  const { errors } = formState;
  const construction = useWatch({ control, name: 'construction' });
  const length = (name: 'widthMm' | 'heightMm' | 'coveringMm', label: string, hint?: string) => (
    <Controller
      control={control}
      name={name}
      render={({ field }) => <LengthField label={label} hint={hint} error={errors[name]?.message} value={field.value ?? null} onChange={field.onChange} onBlur={field.onBlur} />}
    />
  );
  return (
    <FormDialog title="New wall" about="Measure twice. A photo, studs and obstructions come next." deed="Add the wall" sheet={sheet} onClose={onClose}>
      <TextField label="Name" hint="Such as “North wall” or “Over the settee”." error={errors.name?.message} {...register('name')} />
      <div className="grid gap-4 sm:grid-cols-2">
        {length('widthMm', 'Width', units === 'in' ? 'Such as 12\' 6" or 150 1/4' : 'Such as 3820 or 3.82 m')}
        {length('heightMm', 'Height', 'Finished floor to ceiling.')}
      </div>
      <SelectField label="Construction" options={constructions.map((c) => ({ value: c, words: constructionWords[c] }))} error={errors.construction?.message} {...register('construction')} />
      {holdsInWood(construction) ? (
        <SelectField label="Wood of the studs" hint="Species group and its specific gravity by NDS-2018. In doubt take a lower one." options={studSpeciesOptions} error={errors.studSpecies?.message} {...register('studSpecies')} />
      ) : null}
      <div>
        {length('coveringMm', 'Covering', 'What lies between the bracket and the stud.')}
        <div role="group" aria-label="Usual coverings" className="mt-2 flex flex-wrap gap-2">
          {coverings[units].map(({ words, mm }) => (
            <Button key={words} small onClick={() => setValue('coveringMm', mm, { shouldDirty: true, shouldValidate: true })}>
              {words}
            </Button>
          ))}
        </div>
      </div>
    </FormDialog>
  );
}
