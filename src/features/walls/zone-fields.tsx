import { Trash2 } from 'lucide-react';
import type { Zone } from '../../../shared/walls/wall.ts';
import { Button } from '../../components/button.tsx';
import { LengthField } from '../../components/length-field.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { Table, Td, Th } from '../../components/table.tsx';
import { newId } from '../../lib/new-id.ts';
import type { Deed } from './use-wall-draft.ts';
import type { DraftErrors, ZoneDraft } from './wall-draft.ts';
import { optionsOf, zoneWords } from './wall-words.ts';

interface Props {
  zones: readonly ZoneDraft[];
  errors: DraftErrors;
  onChange: (zones: ZoneDraft[], deed?: Deed) => void;
}

/** Stretches of the wall's foot where people walk, sit or lie: what hangs above them is looked at more strictly. */
export function ZoneFields({ zones, errors, onChange }: Props) {
  const set = (id: string, change: Partial<ZoneDraft>) => onChange(zones.map((z) => (z.id === id ? { ...z, ...change } : z)));
  return (
    <div className="grid gap-4">
      {zones.length > 0 ? (
        <Table caption="Where people are">
          <thead>
            <tr>
              <Th>What</Th>
              <Th>From</Th>
              <Th>To</Th>
              <Th>
                <span className="sr-only">Take out</span>
              </Th>
            </tr>
          </thead>
          <tbody>
            {zones.map((zone, i) => (
              <tr key={zone.id}>
                <Td>
                  <SelectField className="min-w-40 [&>label]:sr-only" label={`Stretch ${i + 1}: what`} value={zone.kind} options={optionsOf(zoneWords)} onChange={(e) => set(zone.id, { kind: e.target.value as Zone['kind'] })} />
                </Td>
                <Td>
                  <LengthField className="min-w-28 [&>label]:sr-only" label={`Stretch ${i + 1}: from`} value={zone.fromMm} error={errors[`zones.${i}.fromMm`]} onChange={(fromMm) => set(zone.id, { fromMm })} />
                </Td>
                <Td>
                  <LengthField className="min-w-28 [&>label]:sr-only" label={`Stretch ${i + 1}: to`} value={zone.toMm} error={errors[`zones.${i}.toMm`]} onChange={(toMm) => set(zone.id, { toMm })} />
                </Td>
                <Td>
                  <Button weight="quiet" aria-label={`Take out stretch ${i + 1}`} onClick={() => onChange(zones.filter((z) => z.id !== zone.id), { words: `Stretch ${i + 1} taken out` })}>
                    <Trash2 aria-hidden="true" className="size-4" />
                  </Button>
                </Td>
              </tr>
            ))}
          </tbody>
        </Table>
      ) : (
        <p className="text-ink-700">Nobody walks, sits or lies at this wall, as far as is told. Where they do, what sticks out and what hangs overhead is judged more strictly.</p>
      )}
      <div>
        <Button onClick={() => onChange([...zones, { id: newId(), kind: 'passage', fromMm: null, toMm: null }], { words: 'Stretch added' })}>Add a stretch</Button>
      </div>
    </div>
  );
}
