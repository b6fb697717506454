import type { Shape } from '../../../shared/patterns/pattern.ts';
import { AngleField } from '../../components/angle-field.tsx';
import { Button } from '../../components/button.tsx';
import { LengthField } from '../../components/length-field.tsx';
import { NumberField } from '../../components/number-field.tsx';
import { SelectField } from '../../components/select-field.tsx';

type Kind = Shape['kind'];

/** Each kind with a shape to begin from, and its lengths in the order they are asked for. */
const kinds: Record<Kind, { words: string; start: Shape; lengths: readonly (readonly [string, string])[] }> = {
  regular: { words: 'Regular', start: { kind: 'regular', sides: 6, sideMm: 254 }, lengths: [['sideMm', 'Side']] },
  'stretched hexagon': { words: 'Stretched hexagon', start: { kind: 'stretched hexagon', sideMm: 254, stretchMm: 508 }, lengths: [['stretchMm', 'Top and bottom'], ['sideMm', 'Other sides']] },
  'half hexagon': { words: 'Half hexagon', start: { kind: 'half hexagon', sideMm: 254 }, lengths: [['sideMm', 'Short side']] },
  rhombus: { words: 'Rhombus', start: { kind: 'rhombus', sideMm: 254, angleRad: Math.PI / 3 }, lengths: [['sideMm', 'Side']] },
  kite: { words: 'Kite', start: { kind: 'kite', upperMm: 254, lowerMm: 406.4, widthMm: 355.6 }, lengths: [['upperMm', 'Upper sides'], ['lowerMm', 'Lower sides'], ['widthMm', 'Width']] },
  trapezoid: { words: 'Trapezoid', start: { kind: 'trapezoid', baseMm: 508, topMm: 304.8, heightMm: 254 }, lengths: [['baseMm', 'Base'], ['topMm', 'Top'], ['heightMm', 'Height']] },
  rectangle: { words: 'Rectangle', start: { kind: 'rectangle', widthMm: 406.4, heightMm: 254 }, lengths: [['widthMm', 'Width'], ['heightMm', 'Height']] },
  triangle: { words: 'Triangle', start: { kind: 'triangle', aMm: 406.4, bMm: 355.6, cMm: 304.8 }, lengths: [['aMm', 'Lower side'], ['bMm', 'Right side'], ['cMm', 'Left side']] },
  free: { words: 'Free, by its corners', start: { kind: 'free', verticesMm: [[0, 0], [400, 0], [480, 240], [200, 400], [-60, 220]] }, lengths: [] },
};

interface Props {
  value: Shape;
  onChange: (shape: Shape) => void;
  /** Words on what is wrong, by dotted path inside the shape. */
  errorAt: (path: string) => string | undefined;
}

/** The outline of a frame, over its outer faces. */
export function ShapeFields({ value, onChange, errorAt }: Props) {
  const { lengths } = kinds[value.kind];
  const fields = value as unknown as Record<string, number>;
  // Half-typed figures are kept as they are: the schema says what is wrong with them.
  const set = (field: string, figure: number | null) => onChange({ ...value, [field]: figure } as unknown as Shape);
  return (
    <>
      <SelectField
        label="Shape"
        options={Object.entries(kinds).map(([kind, { words }]) => ({ value: kind, words }))}
        value={value.kind}
        onChange={(event) => onChange(kinds[event.target.value as Kind].start)}
      />
      <div className="grid grid-cols-2 gap-4">
        {value.kind === 'regular' ? <NumberField label="Sides" hint="3 to 12" value={value.sides} onChange={(sides) => set('sides', sides)} error={errorAt('sides')} /> : null}
        {lengths.map(([field, label]) => (
          <LengthField key={field} label={label} hint="Long point to long point" value={fields[field] ?? null} onChange={(mm) => set(field, mm)} error={errorAt(field)} />
        ))}
        {value.kind === 'rhombus' ? <AngleField label="Angle" hint="Inside, lower left" value={value.angleRad} onChange={(rad) => set('angleRad', rad)} error={errorAt('angleRad')} /> : null}
      </div>
      {value.kind === 'free' ? <CornerFields value={value.verticesMm} onChange={(verticesMm) => onChange({ kind: 'free', verticesMm })} errorAt={errorAt} /> : null}
    </>
  );
}

type Corners = Extract<Shape, { kind: 'free' }>['verticesMm'];

function CornerFields({ value, onChange, errorAt }: { value: Corners; onChange: (corners: Corners) => void; errorAt: Props['errorAt'] }) {
  const set = (index: number, axis: 0 | 1, mm: number | null) => onChange(value.map((corner, i) => (i === index ? (corner.map((old, a) => (a === axis ? mm : old)) as [number, number]) : corner)));
  const whole = errorAt('verticesMm');
  return (
    <fieldset className="border border-plaster-200 px-3 pt-1 pb-3">
      <legend className="px-1 text-sm font-semibold">Corners, in order round the frame</legend>
      <ol className="grid gap-2">
        {value.map((corner, i) => (
          <li key={i} className="grid grid-cols-[1fr_1fr_auto] items-end gap-2">
            <LengthField label={`Corner ${i + 1}, across`} value={corner[0]} onChange={(mm) => set(i, 0, mm)} error={errorAt(`verticesMm.${i}`) ?? errorAt(`verticesMm.${i}.0`)} />
            <LengthField label="Up" value={corner[1]} onChange={(mm) => set(i, 1, mm)} error={errorAt(`verticesMm.${i}.1`)} />
            <Button small weight="quiet" className="mb-1" disabled={value.length <= 3} aria-label={`Take corner ${i + 1} out`} onClick={() => onChange(value.filter((_, other) => other !== i))}>
              Take out
            </Button>
          </li>
        ))}
      </ol>
      {whole ? <p className="mt-1 text-sm font-semibold text-madder-600">{whole}</p> : null}
      <Button small className="mt-3" disabled={value.length >= 12} onClick={() => onChange([...value, between(value)])}>
        Add a corner
      </Button>
    </fieldset>
  );
}

/** A new corner outside the middle of the last side, so that the outline stays convex. */
function between(corners: Corners): [number, number] {
  const [ax, ay] = corners.at(-1) ?? [0, 0];
  const [bx, by] = corners[0] ?? [0, 0];
  const cx = corners.reduce((sum, [x]) => sum + x, 0) / corners.length;
  const cy = corners.reduce((sum, [, y]) => sum + y, 0) / corners.length;
  const [mx, my] = [(ax + bx) / 2, (ay + by) / 2];
  return [Math.round(mx + (mx - cx) * 0.1), Math.round(my + (my - cy) * 0.1)];
}
