import { type ReactNode, useState } from 'react';
import { get, useController } from 'react-hook-form';
import { toast } from 'sonner';
import type { HardwareBook } from '../../../shared/hardware/hardware-book.ts';
import { defaultHangers } from '../../../shared/patterns/hangers.ts';
import { type Pattern, PatternDesign, speciesIds } from '../../../shared/patterns/pattern.ts';
import { patternsApi } from '../../../shared/patterns/patterns.api.ts';
import { outlineOf } from '../../../shared/patterns/outline.ts';
import { Button } from '../../components/button.tsx';
import { FormDialog } from '../../components/form-dialog.tsx';
import { LengthField } from '../../components/length-field.tsx';
import { MassField } from '../../components/mass-field.tsx';
import { NumberField } from '../../components/number-field.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { TextField } from '../../components/text-field.tsx';
import { useSheetForm } from '../../lib/sheet-form.ts';
import { useUnits } from '../../lib/units.ts';
import { GrooveFields } from './groove-fields.tsx';
import { HangerFields } from './hanger-fields.tsx';
import { hungLike } from './hanger-hardware.tsx';
import { PatternFacts } from './pattern-facts.tsx';
import { useAddPattern, useChangePattern } from './patterns.queries.ts';
import { ShapeFields } from './shape-fields.tsx';

interface Props {
  /** The pattern to change, or null for a new one. */
  pattern: Pattern | null;
  draw: (design: PatternDesign) => ReactNode;
  /** The hardware book; null while it is not known. */
  book: HardwareBook | null;
  onClose: () => void;
}

const bare: PatternDesign = {
  shape: { kind: 'regular', sides: 6, sideMm: 254 },
  thicknessMm: 12.7, depthMm: 101.6, species: 'white oak', moisturePercent: 8, groove: null, hangers: [], contentsKg: null,
};
const fresh: PatternDesign = { ...bare, hangers: defaultHangers(bare) };

const thicknesses = { in: [['1/2 in', 12.7], ['5/8 in', 15.875], ['3/4 in', 19.05]], mm: [['12 mm', 12], ['15 mm', 15], ['18 mm', 18]] } as const;

/** Makes a pattern or changes one, with its drawing and its figures beside the fields. */
export function PatternDialog({ pattern, draw, book, onClose }: Props) {
  const units = useUnits();
  const add = useAddPattern();
  const change = useChangePattern();
  const first = pattern?.design ?? fresh;
  const sheet = useSheetForm({
    schema: patternsApi.create.body,
    defaultValues: { name: pattern?.name ?? '', design: first },
    send: async (body) => {
      if (pattern) await change.mutateAsync({ ...body, patternId: pattern.id, version: pattern.version, archived: pattern.archived });
      else await add.mutateAsync(body);
      toast.success(`${body.name} is in the pattern book`);
      onClose();
    },
  });
  const { register, control, formState } = sheet.form;
  const { field } = useController({ control, name: 'design' });
  const design = field.value as PatternDesign;
  // The last design that can be made: what is drawn while a figure is half typed.
  const [made, setMade] = useState(first);
  // Until someone sets a hanger by hand, the hangers of a new pattern follow its shape.
  const [usual, setUsual] = useState(pattern === null);
  const errorAt = (path: string): string | undefined => {
    const message: unknown = get(formState.errors, `design.${path}.message`);
    return typeof message === 'string' ? message : undefined;
  };

  const set = (part: Partial<PatternDesign>) => {
    const next = { ...design, ...part };
    const bareNext = PatternDesign.safeParse({ ...next, hangers: [] });
    if (usual && !part.hangers && bareNext.success) next.hangers = hungLike(defaultHangers(bareNext.data), design.hangers);
    const whole = PatternDesign.safeParse(next);
    if (whole.success) setMade(whole.data);
    field.onChange(next);
    if (formState.submitCount > 0 || formState.touchedFields.design) void sheet.form.trigger('design');
  };
  const setHangers = (hangers: PatternDesign['hangers']) => {
    // Only where a hanger sits is set by hand: what it hangs by leaves it following the shape.
    const moved = JSON.stringify(hungLike(hangers, [])) !== JSON.stringify(hungLike(design.hangers, []));
    if (moved) setUsual(false);
    set({ hangers });
  };
  const bareNow = PatternDesign.safeParse({ ...design, hangers: [] });
  const drawn = PatternDesign.safeParse(design).success;

  return (
    <FormDialog wide title={pattern ? `Change ${pattern.name}` : 'New pattern'} about={pattern ? 'What was signed keeps the pattern as it was then.' : undefined} deed={pattern ? 'Save' : 'Add to the pattern book'} sheet={sheet} onClose={onClose}>
      <div className="grid items-start gap-6 md:grid-cols-[3fr_2fr]">
        <div className="grid min-w-0 gap-4 max-md:order-2" onBlur={() => field.onBlur()}>
          <TextField label="Name" error={formState.errors.name?.message} {...register('name')} />
          <ShapeFields value={design.shape} onChange={(shape) => set({ shape })} errorAt={(path) => errorAt(`shape.${path}`)} />
          <div className="grid grid-cols-2 gap-4">
            <div>
              <LengthField label="Thickness" value={design.thicknessMm} onChange={(mm) => set({ thicknessMm: mm as number })} error={errorAt('thicknessMm')} />
              <div role="group" aria-label="Usual thicknesses" className="mt-2 flex flex-wrap gap-1">
                {thicknesses[units].map(([words, mm]) => (
                  <Button key={words} small className="!px-2" onClick={() => set({ thicknessMm: mm })}>
                    {words}
                  </Button>
                ))}
              </div>
            </div>
            <LengthField label="Depth" hint="Off the wall" value={design.depthMm} onChange={(mm) => set({ depthMm: mm as number })} error={errorAt('depthMm')} />
            <SelectField label="Species" options={speciesIds.map((species) => ({ value: species, words: species }))} value={design.species} onChange={(event) => set({ species: event.target.value as PatternDesign['species'] })} error={errorAt('species')} />
            <NumberField label="Moisture, %" hint="As the shop keeps its boards" value={design.moisturePercent} onChange={(percent) => set({ moisturePercent: percent as number })} error={errorAt('moisturePercent')} />
          </div>
          <MassField label="What it is to carry" optional hint="Left empty: 15 lb/ft² (0.72 kPa) on its floor, and at least 2.5 kg." value={design.contentsKg} onChange={(contentsKg) => set({ contentsKg })} error={errorAt('contentsKg')} />
          <GrooveFields value={design.groove} onChange={(groove) => set({ groove })} errorAt={(path) => errorAt(`groove.${path}`)} />
          <HangerFields
            value={design.hangers}
            onChange={setHangers}
            onUsual={bareNow.success ? () => setHangers(hungLike(defaultHangers(bareNow.data), design.hangers)) : null}
            memberCount={outlineOf(made.shape).length}
            insetMm={made.thicknessMm / 2}
            book={book}
            errorAt={(path) => errorAt(`hangers.${path}`)}
          />
        </div>
        <div className="max-md:order-1 md:sticky md:top-0">
          <div className={drawn ? 'border border-plaster-200 bg-white p-3' : 'border border-plaster-200 bg-white p-3 opacity-50'}>{draw(made)}</div>
          {drawn ? null : (
            <p role="status" className="mt-2 text-sm font-semibold text-madder-600">
              The drawing waits for figures that can be made.
            </p>
          )}
          <div className="mt-3">
            <PatternFacts design={made} book={book} />
          </div>
        </div>
      </div>
    </FormDialog>
  );
}
