import { Trash2 } from 'lucide-react';
import { useState } from 'react';
import { isConfirmed, Stud } from '../../../shared/walls/wall.ts';
import { missingOpeningCentres } from '../../../shared/walls/opening-studs.ts';
import { inOrder, laidBySpacing, studFaceMm, studsBySpacing, usualSpacings, usualUncertaintyMm } from '../../../shared/walls/studs.ts';
import { Button } from '../../components/button.tsx';
import { LengthField } from '../../components/length-field.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { Table, Td, Th } from '../../components/table.tsx';
import { newId } from '../../lib/new-id.ts';
import { useUnits } from '../../lib/units.ts';
import type { Deed } from './use-wall-draft.ts';
import { readOutline, type DraftErrors, type StudDraft, type Typed, type WallDraft } from './wall-draft.ts';
import { foundByWords, optionsOf } from './wall-words.ts';

interface Props {
  draft: WallDraft;
  errors: DraftErrors;
  onChange: (studs: StudDraft[], deed?: Deed) => void;
}

const ownSpacing = 'own';

/** Studs laid out by their spacing, or set one by one, and how each was found. */
export function StudFields({ draft, errors, onChange }: Props) {
  const { studs } = draft;
  const set = (id: string, change: Partial<StudDraft>) => onChange(studs.map((s) => (s.id === id ? { ...s, ...change } : s)));
  const foundBy = (stud: StudDraft, by: Stud['foundBy']) =>
    // An uncertainty that was only the usual one for the way it was found follows the new way.
    set(stud.id, { foundBy: by, uncertaintyMm: stud.uncertaintyMm === usualUncertaintyMm[stud.foundBy] ? usualUncertaintyMm[by] : stud.uncertaintyMm });
  const faceMm = draft.construction === 'steel studs' ? studFaceMm.steel : studFaceMm.wood;
  const addOne = () => onChange([...studs, { id: newId(), xMm: null, widthMm: faceMm, foundBy: 'probe', uncertaintyMm: usualUncertaintyMm.probe }], { words: 'Stud added' });
  const open = studs.filter((s) => !isConfirmed(s)).length;
  const read = studs.flatMap((s) => { const one = Stud.safeParse(s); return one.success ? [one.data] : []; });
  const openings = draft.obstructions.flatMap((o) => { const outlineMm = o.kind === 'opening' ? readOutline(o) : null; return outlineMm ? [{ outlineMm }] : []; });
  const addBesideOpenings = () => {
    const all = openings.reduce<Stud[]>(
      (known, opening) => [...known, ...missingOpeningCentres(opening, known, faceMm, draft.widthMm ?? 0).map((xMm): Stud => ({ id: newId(), xMm, widthMm: faceMm, foundBy: 'spacing', uncertaintyMm: usualUncertaintyMm.spacing }))],
      read,
    );
    onChange([...inOrder(all), ...studs.filter((s) => !read.some((r) => r.id === s.id))], { words: `${all.length - read.length} studs set beside openings` });
  };

  return (
    <div className="grid gap-4">
      <BySpacing draft={draft} faceMm={faceMm} onLaid={onChange} />
      {studs.length > 0 ? (
        <Table caption="Studs from left to right">
          <thead>
            <tr>
              <Th>Centre from the left</Th>
              <Th>Found by</Th>
              <Th>Off by at most</Th>
              <Th>Face width</Th>
              <Th>
                <span className="sr-only">Take out</span>
              </Th>
            </tr>
          </thead>
          <tbody>
            {studs.map((stud, i) => {
              const name = `Stud ${i + 1}`;
              const field = (key: 'xMm' | 'widthMm' | 'uncertaintyMm', label: string) => (
                <LengthField className="min-w-28 [&>label]:sr-only" label={`${name}: ${label}`} value={stud[key]} error={errors[`studs.${i}.${key}`]} onChange={(mm) => set(stud.id, { [key]: mm })} />
              );
              return (
                <tr key={stud.id}>
                  <Td>{field('xMm', 'centre from the left')}</Td>
                  <Td>
                    <SelectField
                      className="min-w-40 [&>label]:sr-only"
                      label={`${name}: found by`}
                      value={stud.foundBy}
                      options={optionsOf(foundByWords)}
                      onChange={(e) => foundBy(stud, e.target.value as Stud['foundBy'])}
                    />
                  </Td>
                  <Td>{field('uncertaintyMm', 'off by at most')}</Td>
                  <Td>{field('widthMm', 'face width')}</Td>
                  <Td>
                    <Button weight="quiet" aria-label={`Take out stud ${i + 1}`} onClick={() => onChange(studs.filter((s) => s.id !== stud.id), { words: `Stud ${i + 1} taken out` })}>
                      <Trash2 aria-hidden="true" className="size-4" />
                    </Button>
                  </Td>
                </tr>
              );
            })}
          </tbody>
        </Table>
      ) : (
        <p className="text-ink-700">No studs yet. Lay them out from the first one and their spacing, or add them one by one as you find them.</p>
      )}
      <div className="flex flex-wrap items-center gap-3">
        <Button onClick={addOne}>Add a stud</Button>
        {openings.length > 0 ? (
          <Button onClick={addBesideOpenings}>Add jack and king studs beside openings</Button>
        ) : null}
        {open > 0 ? (
          <p className="text-sm text-ink-700">
            <span aria-hidden="true" className="font-bold text-chalk-700">?</span> {open === 1 ? 'One stud is' : `${open} studs are`} unconfirmed. Probe before you load one: a pilot hole behind where the frame hides it, or a magnet on the board’s screws.
          </p>
        ) : null}
      </div>
    </div>
  );
}

function BySpacing({ draft, faceMm, onLaid }: { draft: WallDraft; faceMm: number; onLaid: Props['onChange'] }) {
  const units = useUnits();
  const [firstMm, setFirst] = useState<Typed>(null);
  const [chosen, setChosen] = useState(String(units === 'in' ? usualSpacings[0].mm : usualSpacings[2].mm));
  const [ownMm, setOwn] = useState<Typed>(null);
  const spacingMm = chosen === ownSpacing ? ownMm : Number(chosen);
  const [said, setSaid] = useState('');
  const tooClose = ownMm !== null && ownMm < 100 ? 'Studs are at least 100 mm (4 in) on centre.' : undefined;
  const ready = firstMm !== null && Number.isFinite(firstMm) && spacingMm !== null && spacingMm >= 100 && draft.widthMm !== null && Number.isFinite(draft.widthMm);
  const lay = () => {
    if (!ready) return;
    const whole = draft.studs.flatMap((s) => { const read = Stud.safeParse(s); return read.success ? [read.data] : []; });
    const laid = laidBySpacing(whole, studsBySpacing(firstMm, spacingMm, draft.widthMm!), faceMm, newId);
    onLaid(laid, { words: `${laid.length} studs laid out` });
    setSaid(`${laid.length} studs on the wall.`);
  };
  return (
    <div className="grid items-start gap-3 sm:grid-cols-3">
      <LengthField label="First stud’s centre" hint="From the wall’s left end." value={firstMm} onChange={setFirst} />
      <SelectField
        label="Spacing"
        value={chosen}
        options={[...usualSpacings.map(({ name, mm }) => ({ value: String(mm), words: name })), { value: ownSpacing, words: 'Another spacing' }]}
        onChange={(e) => setChosen(e.target.value)}
      />
      {chosen === ownSpacing ? <LengthField label="On centre" value={ownMm} error={tooClose} onChange={setOwn} /> : null}
      <div className="sm:pt-6">
        <Button disabled={!ready} onClick={lay}>
          Lay out the studs
        </Button>
        <span role="status" className="sr-only">
          {said}
        </span>
      </div>
    </div>
  );
}
