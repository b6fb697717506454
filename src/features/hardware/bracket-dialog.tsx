import { get, useController } from 'react-hook-form';
import { toast } from 'sonner';
import type { Bracket, BracketBody } from '../../../shared/hardware/brackets.ts';
import { HardwareItem } from '../../../shared/hardware/hardware.api.ts';
import type { Screw } from '../../../shared/hardware/screws.ts';
import { FineLengthField } from '../../components/fine-length-field.tsx';
import { FormDialog } from '../../components/form-dialog.tsx';
import { LengthField } from '../../components/length-field.tsx';
import { LoadField } from '../../components/load-field.tsx';
import { NumberField } from '../../components/number-field.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { TextField } from '../../components/text-field.tsx';
import { useSheetForm } from '../../lib/sheet-form.ts';
import { useSaveHardware } from './hardware.queries.ts';

type Body = Omit<BracketBody, 'name'>;
const schema = HardwareItem.options[1];
const fresh: Body = { steelMm: 1.9, holeMm: 5.5, wallScrews: 1, frameScrews: 2, frameScrewId: null, ratingN: null, offsetMm: 19 };

/** Puts a bracket in the book or changes one. */
export function BracketDialog({ bracket, screws, onClose }: { bracket: Bracket | null; screws: readonly Screw[]; onClose: () => void }) {
  const save = useSaveHardware();
  const { steelMm, holeMm, wallScrews, frameScrews, frameScrewId, ratingN, offsetMm } = bracket ?? fresh;
  const sheet = useSheetForm({
    schema,
    defaultValues: { kind: 'bracket' as const, name: bracket?.name ?? '', body: { steelMm, holeMm, wallScrews, frameScrews, frameScrewId, ratingN, offsetMm } },
    send: async (item) => {
      await save.mutateAsync({ hardwareId: bracket?.id ?? null, item });
      toast.success(`${item.name} is in the hardware book`);
      onClose();
    },
  });
  const { register, control, formState } = sheet.form;
  const { field } = useController({ control, name: 'body' });
  const body = field.value as Body;
  const set = (part: Partial<Body>) => {
    field.onChange({ ...body, ...part });
    if (formState.submitCount > 0) void sheet.form.trigger('body');
  };
  const errorAt = (path: string): string | undefined => {
    const message: unknown = get(formState.errors, `body.${path}.message`);
    return typeof message === 'string' ? message : undefined;
  };

  return (
    <FormDialog title={bracket ? `Change ${bracket.name}` : 'New bracket'} about="The steel between frame and wall." deed={bracket ? 'Save' : 'Add to the book'} sheet={sheet} onClose={onClose}>
      <TextField label="Name" hint="As it is sold, with its size." error={formState.errors.name?.message} {...register('name')} />
      <LoadField
        label="Working load of one bracket"
        optional
        hint="From its maker. The program ships no ratings for brackets: left empty, the bracket counts for nothing and the ledger says so."
        value={body.ratingN}
        onChange={(newton) => set({ ratingN: newton })}
        error={errorAt('ratingN')}
      />
      <div className="grid grid-cols-2 gap-4">
        <FineLengthField label="Steel" hint="Thickness" value={body.steelMm} onChange={(mm) => set({ steelMm: mm as number })} error={errorAt('steelMm')} />
        <FineLengthField label="Hole" hint="For the wall screw" value={body.holeMm} onChange={(mm) => set({ holeMm: mm as number })} error={errorAt('holeMm')} />
        <NumberField label="Screws into the wall" value={body.wallScrews} onChange={(n) => set({ wallScrews: n as number })} error={errorAt('wallScrews')} />
        <NumberField label="Screws into the frame" value={body.frameScrews} onChange={(n) => set({ frameScrews: n as number })} error={errorAt('frameScrews')} />
      </div>
      <SelectField
        label="Screw into the frame"
        hint="None chosen: the joint to the frame counts for nothing."
        value={body.frameScrewId ?? ''}
        options={[{ value: '', words: 'Not chosen' }, ...screws.map((s) => ({ value: s.id, words: s.name }))]}
        onChange={(event) => set({ frameScrewId: event.target.value || null })}
        error={errorAt('frameScrewId')}
      />
      <LengthField label="From the wall screw to the frame screws" hint="Along the plate, to the middle of the frame screws." value={body.offsetMm} onChange={(mm) => set({ offsetMm: mm as number })} error={errorAt('offsetMm')} />
    </FormDialog>
  );
}
