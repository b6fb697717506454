import { get, useController } from 'react-hook-form';
import { toast } from 'sonner';
import { HardwareItem } from '../../../shared/hardware/hardware.api.ts';
import { lagScrewSizes, type Screw, type ScrewBody, standardLagScrew, standardWoodScrew, woodScrewSizes } from '../../../shared/hardware/screws.ts';
import { FineLengthField } from '../../components/fine-length-field.tsx';
import { FormDialog } from '../../components/form-dialog.tsx';
import { LengthField } from '../../components/length-field.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { StressField } from '../../components/stress-field.tsx';
import { TextField } from '../../components/text-field.tsx';
import { useSheetForm } from '../../lib/sheet-form.ts';
import { useUnits } from '../../lib/units.ts';
import { useSaveHardware } from './hardware.queries.ts';
import { screwName } from './hardware-words.ts';

const schema = HardwareItem.options[0];
const other = 'other';

const first = (units: 'in' | 'mm'): ScrewBody => standardWoodScrew('#10', units === 'in' ? 63.5 : 60);

/** A screw of a standard size by the published dimensions, or any other; null where the size is none of the standard ones. */
function standard(kind: ScrewBody['kind'], size: string, lengthMm: number): ScrewBody | null {
  const wood = woodScrewSizes.find((s) => s === size);
  const lag = lagScrewSizes.find((s) => s === size);
  if (kind === 'wood screw') return wood ? standardWoodScrew(wood, lengthMm) : null;
  return lag ? standardLagScrew(lag, lengthMm) : null;
}

/** Puts a screw in the book or changes one. A standard size fills in all dimensions; each may be set otherwise. */
export function ScrewDialog({ screw, onClose }: { screw: Screw | null; onClose: () => void }) {
  const units = useUnits();
  const save = useSaveHardware();
  const start = screw ?? { name: screwName(first(units), units), ...first(units) };
  const { kind, size, diameterMm, rootDiameterMm, lengthMm, threadLengthMm, headDiameterMm, bendingYieldMPa } = start;
  const sheet = useSheetForm({
    schema,
    defaultValues: { kind: 'screw' as const, name: start.name, body: { kind, size, diameterMm, rootDiameterMm, lengthMm, threadLengthMm, headDiameterMm, bendingYieldMPa } },
    send: async (item) => {
      await save.mutateAsync({ hardwareId: screw?.id ?? null, item });
      toast.success(`${item.name} is in the hardware book`);
      onClose();
    },
  });
  const { register, control, formState, getValues, setValue } = sheet.form;
  const { field } = useController({ control, name: 'body' });
  const body = field.value as ScrewBody;
  const sizes: readonly string[] = body.kind === 'wood screw' ? woodScrewSizes : lagScrewSizes;
  const isStandard = sizes.includes(body.size);
  const errorAt = (path: string): string | undefined => {
    const message: unknown = get(formState.errors, `body.${path}.message`);
    return typeof message === 'string' ? message : undefined;
  };

  const put = (next: ScrewBody) => {
    // The name goes along until someone writes their own.
    const named = getValues('name');
    if (named === '' || named === screwName(body, units)) setValue('name', screwName(next, units), { shouldDirty: true });
    field.onChange(next);
    if (formState.submitCount > 0) void sheet.form.trigger('body');
  };
  const set = (part: Partial<ScrewBody>) => put({ ...body, ...part });
  const refit = (part: Partial<Pick<ScrewBody, 'kind' | 'size' | 'lengthMm'>>) => {
    const next = { ...body, ...part };
    put((Number.isFinite(next.lengthMm) && next.lengthMm > 0 && standard(next.kind, next.size, next.lengthMm)) || next);
  };
  const fine = (name: 'diameterMm' | 'rootDiameterMm' | 'headDiameterMm', label: string, hint?: string) => (
    <FineLengthField label={label} hint={hint} value={body[name]} onChange={(mm) => set({ [name]: mm })} error={errorAt(name)} />
  );

  return (
    <FormDialog
      title={screw ? `Change ${screw.name}` : 'New screw'}
      about="A standard size fills in the dimensions of NDS-2018 appendix L. Hardened and structural screws differ: take theirs from the maker's evaluation report."
      deed={screw ? 'Save' : 'Add to the book'}
      sheet={sheet}
      onClose={onClose}
    >
      <div className="grid grid-cols-2 gap-4">
        <SelectField
          label="Kind"
          value={body.kind}
          options={[{ value: 'wood screw', words: 'Wood screw' }, { value: 'lag screw', words: 'Lag screw' }]}
          onChange={(event) => (event.target.value === 'wood screw' ? refit({ kind: 'wood screw', size: '#10' }) : refit({ kind: 'lag screw', size: '1/4' }))}
        />
        <SelectField
          label="Size"
          value={isStandard ? body.size : other}
          options={[...sizes.map((s) => ({ value: s, words: s })), { value: other, words: 'Another' }]}
          onChange={(event) => refit({ size: event.target.value === other ? '' : event.target.value })}
        />
        {isStandard ? null : <TextField className="col-span-2" label="Called" hint="As the trade calls it, such as 6 mm." value={body.size} onChange={(event) => set({ size: event.target.value })} error={errorAt('size')} />}
        <LengthField label="Length" value={body.lengthMm} onChange={(mm) => refit({ lengthMm: mm as number })} error={errorAt('lengthMm')} />
        <LengthField label="Thread" hint="From the point up" value={body.threadLengthMm} onChange={(mm) => set({ threadLengthMm: mm as number })} error={errorAt('threadLengthMm')} />
        {fine('diameterMm', 'Diameter', 'Over the thread')}
        {fine('rootDiameterMm', 'Root', 'Under the thread')}
        {fine('headDiameterMm', 'Head', body.kind === 'lag screw' ? 'Across flats' : undefined)}
        <StressField label="Bending yield" hint="Of the steel, F_yb" value={body.bendingYieldMPa} onChange={(mpa) => set({ bendingYieldMPa: mpa as number })} error={errorAt('bendingYieldMPa')} />
      </div>
      <TextField label="Name in the book" error={formState.errors.name?.message} {...register('name')} />
    </FormDialog>
  );
}
