import type { HardwareBook } from '../../../shared/hardware/hardware-book.ts';
import type { Hanger } from '../../../shared/patterns/pattern.ts';
import { Button } from '../../components/button.tsx';
import { LengthField } from '../../components/length-field.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { HangerHardwareFields, noHardware } from './hanger-hardware.tsx';

interface Props {
  value: readonly Hanger[];
  onChange: (hangers: Hanger[]) => void;
  /** Puts two on the upper members, or null while the shape cannot be made. */
  onUsual: (() => void) | null;
  memberCount: number;
  /** Half a member's thickness: where a new hanger begins. */
  insetMm: number;
  /** Null while it is not known. */
  book: HardwareBook | null;
  errorAt: (path: string) => string | undefined;
}

/** The hangers of a pattern, told along its members. */
export function HangerFields({ value, onChange, onUsual, memberCount, insetMm, book, errorAt }: Props) {
  const set = (index: number, part: Partial<Hanger>) => onChange(value.map((hanger, i) => (i === index ? { ...hanger, ...part } : hanger)));
  const members = Array.from({ length: memberCount }, (_, i) => ({ value: String(i), words: `Member ${i + 1}` }));
  return (
    <fieldset className="border border-plaster-200 px-3 pt-1 pb-3">
      <legend className="px-1 text-sm font-semibold">Hangers</legend>
      <p className="mb-3 text-sm text-ink-700">Members are numbered as on the drawing. Along is from the middle of the outer side; inset is from the outer face.</p>
      {book && value.length > 0 ? (
        <div role="group" aria-label="All hangers" className="mb-4 border-l-4 border-plaster-200 pl-3">
          <p className="mb-1 font-semibold">Hardware of all hangers</p>
          <div className="grid gap-3">
            <HangerHardwareFields book={book} hangers={value} of="All hangers" onChange={(part) => onChange(value.map((hanger) => ({ ...hanger, ...part })))} />
          </div>
          <p className="mt-1 text-sm text-ink-700">From the hardware book. In a stud the screw counts, elsewhere the anchor; what is not chosen counts for nothing.</p>
        </div>
      ) : null}
      <ol className="grid gap-4">
        {value.map((hanger, i) => (
          <li key={hanger.id} className="border-l-4 border-brass-600 pl-3">
            <div className="flex items-center justify-between gap-2">
              <p className="font-semibold">Hanger {i + 1}</p>
              <Button small weight="quiet" aria-label={`Take hanger ${i + 1} off`} onClick={() => onChange(value.filter((_, other) => other !== i))}>
                Take off
              </Button>
            </div>
            <div className="grid grid-cols-2 gap-3 lg:grid-cols-3">
              <SelectField label="On" options={members} value={String(hanger.member)} onChange={(event) => set(i, { member: Number(event.target.value) })} error={errorAt(`${i}.member`)} />
              <LengthField label="Along" value={hanger.alongMm} onChange={(mm) => set(i, { alongMm: mm as number })} error={errorAt(`${i}.alongMm`)} />
              <LengthField label="Inset" value={hanger.insetMm} onChange={(mm) => set(i, { insetMm: mm as number })} error={errorAt(`${i}.insetMm`)} />
              <LengthField label="May slide back" value={-hanger.allowanceMm[0]} onChange={(mm) => set(i, { allowanceMm: [mm === null ? (mm as unknown as number) : -mm, hanger.allowanceMm[1]] })} error={errorAt(`${i}.allowanceMm.0`)} />
              <LengthField label="May slide on" value={hanger.allowanceMm[1]} onChange={(mm) => set(i, { allowanceMm: [hanger.allowanceMm[0], mm as number] })} error={errorAt(`${i}.allowanceMm.1`)} />
            </div>
            {book && value.length > 1 ? (
              <details className="mt-2">
                <summary className="min-h-8 cursor-pointer py-1 text-sm font-semibold hover:text-chalk-700">Hardware of this hanger alone</summary>
                <div className="grid gap-3">
                  <HangerHardwareFields book={book} hangers={[hanger]} of={`Hanger ${i + 1}`} onChange={(part) => set(i, part)} />
                </div>
              </details>
            ) : null}
          </li>
        ))}
      </ol>
      {value.length === 0 ? <p className="text-sm font-semibold text-ochre-600">Without a hanger nothing holds this frame.</p> : null}
      <div className="mt-3 flex flex-wrap gap-2">
        <Button small disabled={onUsual === null} onClick={onUsual ?? undefined}>
          Two on the upper members
        </Button>
        <Button small disabled={value.length >= 12} onClick={() => onChange([...value, newHanger(value, memberCount, insetMm)])}>
          Add a hanger
        </Button>
      </div>
    </fieldset>
  );
}

function newHanger(others: readonly Hanger[], memberCount: number, insetMm: number): Hanger {
  const names = new Set(others.map(({ id }) => id));
  let number = others.length + 1;
  while (names.has(`hanger ${number}`)) number++;
  const { bracketId, wallScrewId, anchorId } = others[0] ?? noHardware;
  return { id: `hanger ${number}`, member: Math.floor(memberCount / 2), alongMm: 0, insetMm, allowanceMm: [0, 0], bracketId, wallScrewId, anchorId };
}
