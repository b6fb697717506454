import { get, useController } from 'react-hook-form';
import { toast } from 'sonner';
import { type Anchor, anchorAllowable, type AnchorBody, ultimateDivisor } from '../../../shared/hardware/anchors.ts';
import { HardwareItem } from '../../../shared/hardware/hardware.api.ts';
import { formatLoad } from '../../../shared/units/mass.ts';
import { FormDialog } from '../../components/form-dialog.tsx';
import { LoadField } from '../../components/load-field.tsx';
import { Notice } from '../../components/notice.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { TextField } from '../../components/text-field.tsx';
import { useSheetForm } from '../../lib/sheet-form.ts';
import { useUnits } from '../../lib/units.ts';
import { useSaveHardware } from './hardware.queries.ts';

type Body = Omit<AnchorBody, 'name'>;
const schema = HardwareItem.options[2];
const fresh: Body = { kind: 'hollow wall', ratedAs: 'ultimate', shearN: null, tensionN: null };

/** Puts an anchor in the book or changes one: what it carries is what its packet says. */
export function AnchorDialog({ anchor, onClose }: { anchor: Anchor | null; onClose: () => void }) {
  const units = useUnits();
  const save = useSaveHardware();
  const { kind, ratedAs, shearN, tensionN } = anchor ?? fresh;
  const sheet = useSheetForm({
    schema,
    defaultValues: { kind: 'anchor' as const, name: anchor?.name ?? '', body: { kind, ratedAs, shearN, tensionN } },
    send: async (item) => {
      await save.mutateAsync({ hardwareId: anchor?.id ?? null, item });
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
  const allowed = anchorAllowable({ ratedAs: body.ratedAs, shearN: finite(body.shearN), tensionN: finite(body.tensionN) });

  return (
    <FormDialog
      title={anchor ? `Change ${anchor.name}` : 'New anchor'}
      about="The program ships no ratings for anchors. Copy them from the packet, for a wall like the one it goes into; the maker's instructions come first."
      deed={anchor ? 'Save' : 'Add to the book'}
      sheet={sheet}
      onClose={onClose}
    >
      <TextField label="Name" hint="As it is sold, with its size and the board it was rated in." error={formState.errors.name?.message} {...register('name')} />
      <div className="grid grid-cols-2 gap-4">
        <SelectField label="For" value={body.kind} options={[{ value: 'hollow wall', words: 'Hollow wall' }, { value: 'masonry', words: 'Masonry' }]} onChange={(event) => set({ kind: event.target.value as Body['kind'] })} />
        <SelectField
          label="The packet tells"
          value={body.ratedAs}
          options={[{ value: 'ultimate', words: 'Ultimate load, at failure' }, { value: 'allowable', words: 'Allowable load' }]}
          onChange={(event) => set({ ratedAs: event.target.value as Body['ratedAs'] })}
        />
        <LoadField label="Along the wall" optional hint="Shear, one anchor" value={body.shearN} onChange={(newton) => set({ shearN: newton })} error={errorAt('shearN')} />
        <LoadField label="Out of the wall" optional hint="Tension, one anchor" value={body.tensionN} onChange={(newton) => set({ tensionN: newton })} error={errorAt('tensionN')} />
      </div>
      <Notice>
        <p>
          {body.ratedAs === 'ultimate' ? `An ultimate load is what broke it: it is divided by ${ultimateDivisor} (common practice). ` : 'An allowable load is taken as it is. Where the packet does not say which it tells, choose ultimate. '}
          Counts as <strong className="tabular-nums">{formatLoad(allowed.shearN, units)}</strong> along the wall and <strong className="tabular-nums">{formatLoad(allowed.tensionN, units)}</strong> out of it.
        </p>
        {finite(body.shearN) === null || finite(body.tensionN) === null ? <p className="mt-1">Left empty, it counts for nothing in that direction, and the ledger says so.</p> : null}
      </Notice>
    </FormDialog>
  );
}

const finite = (newton: number | null): number | null => (newton !== null && Number.isFinite(newton) ? newton : null);
