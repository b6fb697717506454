import type { HardwareBook } from '../../../shared/hardware/hardware-book.ts';
import type { Hanger } from '../../../shared/patterns/pattern.ts';
import { SelectField } from '../../components/select-field.tsx';

export type HangerHardware = Pick<Hanger, 'bracketId' | 'wallScrewId' | 'anchorId'>;
export const noHardware: HangerHardware = { bracketId: null, wallScrewId: null, anchorId: null };

const unlike = 'unlike';
const fields = [
  ['bracketId', 'Bracket', 'brackets'],
  ['wallScrewId', 'Screw into studs', 'screws'],
  ['anchorId', 'Anchor where no stud is', 'anchors'],
] as const;

/** Hangers made anew, hung by what the ones before were hung by. */
export function hungLike(hangers: readonly Hanger[], before: readonly Hanger[]): Hanger[] {
  return hangers.map((hanger, i) => {
    const { bracketId, wallScrewId, anchorId } = before[i] ?? before[0] ?? noHardware;
    return { ...hanger, bracketId, wallScrewId, anchorId };
  });
}

interface Props {
  book: HardwareBook;
  /** One hanger, or all of them at once. */
  hangers: readonly Hanger[];
  /** Put before each label for those who hear it, such as `All hangers: `. */
  of: string;
  onChange: (hardware: Partial<HangerHardware>) => void;
}

/** What holds hangers, chosen from the hardware book. What is not chosen counts for nothing. */
export function HangerHardwareFields({ book, hangers, of, onChange }: Props) {
  return fields.map(([field, label, kind]) => {
    const chosen = [...new Set(hangers.map((hanger) => hanger[field]))];
    const one = chosen.length === 1 ? chosen[0]! : null;
    const entries: readonly { id: string; name: string }[] = book[kind];
    const gone = one !== null && !entries.some(({ id }) => id === one);
    return (
      <SelectField
        key={field}
        label={label}
        aria-label={`${of}: ${label}`}
        value={chosen.length > 1 ? unlike : (one ?? '')}
        options={[
          ...(chosen.length > 1 ? [{ value: unlike, words: 'Unlike' }] : []),
          { value: '', words: 'Not chosen' },
          ...(gone ? [{ value: one, words: 'No longer in the book' }] : []),
          ...entries.map(({ id, name }) => ({ value: id, words: name })),
        ]}
        onChange={(event) => {
          if (event.target.value !== unlike) onChange({ [field]: event.target.value || null });
        }}
      />
    );
  });
}
