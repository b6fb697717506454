import { Trash2 } from 'lucide-react';
import type { Obstruction } from '../../../shared/walls/wall.ts';
import { startingClearanceMm } from '../../../shared/walls/studs.ts';
import { Button } from '../../components/button.tsx';
import { LengthField } from '../../components/length-field.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { Table, Td, Th } from '../../components/table.tsx';
import { TextField } from '../../components/text-field.tsx';
import { newId } from '../../lib/new-id.ts';
import { useUnits } from '../../lib/units.ts';
import { CornerFields } from './corner-fields.tsx';
import type { Deed } from './use-wall-draft.ts';
import type { DraftErrors, ObstructionDraft } from './wall-draft.ts';
import { obstructionWords, optionsOf } from './wall-words.ts';

interface Props {
  obstructions: readonly ObstructionDraft[];
  errors: DraftErrors;
  onChange: (obstructions: ObstructionDraft[], deed?: Deed) => void;
}

/** What stands on or against the wall, as rectangles or outlines, and how far frames keep clear of it. */
export function ObstructionFields({ obstructions, errors, onChange }: Props) {
  const units = useUnits();
  const set = (id: string, change: Partial<ObstructionDraft>) => onChange(obstructions.map((o) => (o.id === id ? { ...o, ...change } : o)));
  const setKind = (o: ObstructionDraft, kind: Obstruction['kind']) =>
    set(o.id, { kind, clearanceMm: o.clearanceMm === startingClearanceMm(o.kind, units) ? startingClearanceMm(kind, units) : o.clearanceMm });
  const add = () =>
    onChange([...obstructions, { id: newId(), kind: 'outlet', name: '', leftMm: null, bottomMm: null, widthMm: null, heightMm: null, clearanceMm: startingClearanceMm('outlet', units), corners: null }], { words: 'Obstruction added' });

  return (
    <div className="grid gap-4">
      {obstructions.length > 0 ? (
        <Table caption="What stands in the way">
          <thead>
            <tr>
              <Th>Kind</Th>
              <Th>Name</Th>
              <Th>From the left</Th>
              <Th>Above the floor</Th>
              <Th>Width</Th>
              <Th>Height</Th>
              <Th>Keep clear by</Th>
              <Th>
                <span className="sr-only">Take out</span>
              </Th>
            </tr>
          </thead>
          <tbody>
            {obstructions.map((o, i) => {
              const name = `Obstruction ${i + 1}`;
              const fixed = o.corners !== null;
              const field = (key: 'leftMm' | 'bottomMm' | 'widthMm' | 'heightMm' | 'clearanceMm', label: string) => (
                <LengthField
                  className="min-w-28 [&>label]:sr-only"
                  label={`${name}: ${label}`}
                  disabled={fixed && key !== 'clearanceMm'}
                  value={fixed && key !== 'clearanceMm' ? null : o[key]}
                  error={errors[`obstructions.${i}.${key}`]}
                  onChange={(mm) => set(o.id, { [key]: mm })}
                />
              );
              return (
                <tr key={o.id}>
                  <Td>
                    <SelectField
                      className="min-w-40 [&>label]:sr-only"
                      label={`${name}: kind`}
                      value={o.kind}
                      options={optionsOf(obstructionWords)}
                      onChange={(e) => setKind(o, e.target.value as Obstruction['kind'])}
                    />
                  </Td>
                  <Td>
                    <TextField
                      className="min-w-36 [&>label]:sr-only"
                      label={`${name}: name`}
                      maxLength={80}
                      value={o.name}
                      error={errors[`obstructions.${i}.name`]}
                      onChange={(e) => set(o.id, { name: e.target.value })}
                    />
                    {fixed ? <span className="text-sm text-ink-500">Outline of {o.corners?.length} corners, below</span> : null}
                  </Td>
                  <Td>{field('leftMm', 'from the left')}</Td>
                  <Td>{field('bottomMm', 'above the floor')}</Td>
                  <Td>{field('widthMm', 'width')}</Td>
                  <Td>{field('heightMm', 'height')}</Td>
                  <Td>{field('clearanceMm', 'keep clear by')}</Td>
                  <Td>
                    <Button weight="quiet" aria-label={`Take out obstruction ${i + 1}`} onClick={() => onChange(obstructions.filter((other) => other.id !== o.id), { words: `Obstruction ${i + 1} taken out` })}>
                      <Trash2 aria-hidden="true" className="size-4" />
                    </Button>
                  </Td>
                </tr>
              );
            })}
          </tbody>
        </Table>
      ) : (
        <p className="text-ink-700">Nothing in the way yet: openings, switches, outlets, vents, trim, furniture. Wires commonly run straight up or down from a switch or an outlet.</p>
      )}
      {obstructions.map((o, i) =>
        o.corners ? (
          <CornerFields key={o.id} of={`obstruction ${i + 1}`} corners={o.corners} errors={errors} path={`obstructions.${i}.corners`} onChange={(corners) => set(o.id, { corners })} />
        ) : null,
      )}
      <div>
        <Button onClick={add}>Add an obstruction</Button>
      </div>
    </div>
  );
}
