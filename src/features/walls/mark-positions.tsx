import { Trash2 } from 'lucide-react';
import { useState } from 'react';
import { Button } from '../../components/button.tsx';
import { LengthField } from '../../components/length-field.tsx';
import { Table, Td, Th } from '../../components/table.tsx';
import { cornerNames, rectangleOf, withRectangle, type MarkDraft, type TapeRectangle } from './marks-draft.ts';
import { PxField } from './px-field.tsx';

interface Props {
  marks: readonly MarkDraft[];
  photo: { widthPx: number; heightPx: number };
  /** What each mark is off by, in words; empty where that cannot be told. */
  offBy: readonly string[];
  onChange: (marks: MarkDraft[], words: string, run?: string) => void;
}

/** Where the marks are on the wall: the corners of a taped rectangle, or each typed by itself. */
export function MarkPositions({ marks, photo, offBy, onChange }: Props) {
  const [typed, setTyped] = useState<TapeRectangle | null>(null);
  // What was typed holds while the marks still stand where it put them; half typed, the marks could not tell it back.
  const rectangle = typed && samePlaces(withRectangle(marks, typed), marks) ? typed : rectangleOf(marks);
  const setSide = (change: Partial<TapeRectangle>) => {
    const next = { ...rectangle, ...change };
    setTyped(next);
    onChange(withRectangle(marks, next), 'Rectangle typed', `rectangle ${Object.keys(change).join()}`);
  };
  const setMark = (index: number, change: Partial<MarkDraft>, run: string) => onChange(marks.map((m, i) => (i === index ? { ...m, ...change } : m)), `Mark ${index + 1} typed`, `mark ${index} ${run}`);
  const points = marks.length >= 4;

  return (
    <div className="grid gap-4">
      {points ? (
        <fieldset>
          <legend className="mb-2 font-semibold text-ink-900">Marks on the corners of a rectangle</legend>
          <p className="mb-3 text-sm text-ink-700">Tape a level, square rectangle on the wall: equal diagonals prove it square.</p>
          <div className="grid grid-cols-2 items-end gap-3">
            <LengthField label="Rectangle’s width" value={rectangle.widthMm} onChange={(widthMm) => setSide({ widthMm })} />
            <LengthField label="Rectangle’s height" value={rectangle.heightMm} onChange={(heightMm) => setSide({ heightMm })} />
            <LengthField label="Its left side from the wall’s left end" value={rectangle.leftMm} onChange={(leftMm) => setSide({ leftMm })} />
            <LengthField label="Its foot above the floor" value={rectangle.bottomMm} onChange={(bottomMm) => setSide({ bottomMm })} />
          </div>
        </fieldset>
      ) : null}
      <Table caption="Positions of the marks on the wall">
        <thead>
          <tr>
            <Th>Mark</Th>
            <Th>From the left</Th>
            <Th>Above the floor</Th>
            <Th figure>Off by</Th>
            <Th>
              <span className="sr-only">Take out</span>
            </Th>
          </tr>
        </thead>
        <tbody>
          {marks.map((mark, i) => (
            <tr key={i}>
              <Th scope="row">
                {i + 1} <span className="block text-sm font-normal text-ink-700">{points ? cornerNames[i] : null}</span>
              </Th>
              <Td className="min-w-28">
                <LengthField className="[&>label]:sr-only" label={`Mark ${i + 1} from the left`} value={mark.xMm} onChange={(xMm) => setMark(i, { xMm }, 'x')} />
              </Td>
              <Td className="min-w-28">
                <LengthField className="[&>label]:sr-only" label={`Mark ${i + 1} above the floor`} value={mark.yMm} onChange={(yMm) => setMark(i, { yMm }, 'y')} />
              </Td>
              <Td figure className="whitespace-nowrap">
                {offBy[i] ?? '–'}
              </Td>
              <Td>
                {marks.length > 4 ? (
                  <Button weight="quiet" aria-label={`Take out mark ${i + 1}`} onClick={() => onChange(marks.filter((_, k) => k !== i), `Mark ${i + 1} taken out`)}>
                    <Trash2 aria-hidden="true" className="size-4" />
                  </Button>
                ) : null}
              </Td>
            </tr>
          ))}
        </tbody>
      </Table>
      <details>
        <summary className="min-h-8 cursor-pointer py-1 text-chalk-600 underline underline-offset-4">Type where the marks are on the photo</summary>
        <Table caption="Places of the marks on the photo, px" className="mt-2">
          <thead>
            <tr>
              <Th>Mark</Th>
              <Th>Across, px</Th>
              <Th>Down, px</Th>
            </tr>
          </thead>
          <tbody>
            {marks.map((mark, i) => (
              <tr key={i}>
                <Th scope="row">{i + 1}</Th>
                <Td>
                  <PxField label={`Mark ${i + 1} across the photo`} value={mark.px.x} most={photo.widthPx} onChange={(x) => setMark(i, { px: { ...mark.px, x } }, 'px x')} />
                </Td>
                <Td>
                  <PxField label={`Mark ${i + 1} down the photo`} value={mark.px.y} most={photo.heightPx} onChange={(y) => setMark(i, { px: { ...mark.px, y } }, 'px y')} />
                </Td>
              </tr>
            ))}
          </tbody>
        </Table>
      </details>
    </div>
  );
}

function samePlaces(a: readonly MarkDraft[], b: readonly MarkDraft[]): boolean {
  return a.every((m, i) => Object.is(m.xMm, b[i]?.xMm) && Object.is(m.yMm, b[i]?.yMm));
}
