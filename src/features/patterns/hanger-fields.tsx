import type { Hanger } from '../../../shared/patterns/pattern.ts';
import { Button } from '../../components/button.tsx';
import { LengthField } from '../../components/length-field.tsx';
import { SelectField } from '../../components/select-field.tsx';

interface Props {
  value: readonly Hanger[];
  onChange: (hangers: Hanger[]) => void;
  /** Puts two on the upper members, or null while the shape cannot be made. */
  onUsual: (() => void) | null;
  memberCount: number;
  /** Half a member's thickness: where a new hanger begins. */
  insetMm: number;
  errorAt: (path: string) => string | undefined;
}

/** The hangers of a pattern, told along its members. */
export function HangerFields({ value, onChange, onUsual, memberCount, insetMm, errorAt }: Props) {
  const set = (index: number, part: Partial<Hanger>) => onChange(value.map((hanger, i) => (i === index ? { ...hanger, ...part } : hanger)));
  const members = Array.from({ length: memberCount }, (_, i) => ({ value: String(i), words: `Member ${i + 1}` }));
  return (
    <fieldset className="border border-plaster-200 px-3 pt-1 pb-3">
      <legend className="px-1 text-sm font-semibold">Hangers</legend>
      <p className="mb-3 text-sm text-ink-700">Members are numbered as on the drawing. Along is from the middle of the outer side; inset is from the outer face.</p>
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
  return { id: `hanger ${number}`, member: Math.floor(memberCount / 2), alongMm: 0, insetMm, allowanceMm: [0, 0], bracketId: null, wallScrewId: null, anchorId: null };
}
