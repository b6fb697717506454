import { Trash2 } from 'lucide-react';
import type { ReactNode } from 'react';
import type { Point } from '../../../shared/walls/homography.ts';
import { Button } from '../../components/button.tsx';
import { LengthField } from '../../components/length-field.tsx';
import { Table, Td, Th } from '../../components/table.tsx';
import type { PhotoDraft } from './photo-draft.ts';
import { lineName, withEdgePoint, withHandle, type HandleOf } from './photo-handles.ts';
import { PxField } from './px-field.tsx';

interface Props {
  draft: PhotoDraft;
  photo: { widthPx: number; heightPx: number };
  onChange: (draft: PhotoDraft, words: string, run?: string) => void;
}

/** Plumb and level lines, known lengths and straight edges in a table: each end by its pixels, each length as measured. */
export function PhotoLineFields({ draft, photo, onChange }: Props) {
  if (draft.lines.length + draft.lengths.length + draft.straightEdges.length === 0) return null;
  const point = (of: HandleOf, px: Point, name: string) => (
    <div className="flex gap-2">
      <PxField label={`${name} across the photo`} value={px.x} most={photo.widthPx} onChange={(x) => onChange(withHandle(draft, of, { ...px, x }), `${name} typed`, `${name} x`)} />
      <PxField label={`${name} down the photo`} value={px.y} most={photo.heightPx} onChange={(y) => onChange(withHandle(draft, of, { ...px, y }), `${name} typed`, `${name} y`)} />
    </div>
  );
  const setLength = (index: number, mm: number | null) => onChange({ ...draft, lengths: draft.lengths.map((l, i) => (i === index ? { ...l, mm } : l)) }, `Length ${index + 1} typed`, `length ${index}`);
  const without = <T,>(list: readonly T[], index: number) => list.filter((_, i) => i !== index);

  return (
    <Table caption="Lines, lengths and straight edges on the photo">
      <thead>
        <tr>
          <Th>What</Th>
          <Th>Length</Th>
          <Th>Ends on the photo, px across and down</Th>
          <Th>
            <span className="sr-only">Take out</span>
          </Th>
        </tr>
      </thead>
      <tbody>
        {draft.lengths.map((length, i) => (
          <Row key={`length ${i}`} name={`Length ${i + 1}`} onRemove={() => onChange({ ...draft, lengths: without(draft.lengths, i) }, `Length ${i + 1} taken out`)}
            length={<LengthField className="min-w-28 [&>label]:sr-only" label={`Length ${i + 1} as measured`} value={length.mm} onChange={(mm) => setLength(i, mm)} />}>
            {length.px.map((px, end) => <div key={end}>{point({ kind: 'length', index: i, end }, px, `Length ${i + 1} end ${end + 1}`)}</div>)}
          </Row>
        ))}
        {draft.lines.map((line, i) => (
          <Row key={`line ${i}`} name={lineName(draft, i)} onRemove={() => onChange({ ...draft, lines: without(draft.lines, i) }, `${lineName(draft, i)} taken out`)}>
            {line.px.map((px, end) => <div key={end}>{point({ kind: 'line', index: i, end }, px, `${lineName(draft, i)} end ${end + 1}`)}</div>)}
          </Row>
        ))}
        {draft.straightEdges.map((edge, i) => {
          const name = `Straight edge ${i + 1}`;
          return (
            <Row key={name} name={name} onRemove={() => onChange({ ...draft, straightEdges: without(draft.straightEdges, i) }, `${name} taken out`)}>
              {edge.map((px, end) => <div key={end}>{point({ kind: 'edge', index: i, end }, px, `${name} point ${end + 1}`)}</div>)}
              <Button small className="justify-self-start" aria-label={`Add a point to straight edge ${i + 1}`} onClick={() => onChange(withEdgePoint(draft, i), `Point added to straight edge ${i + 1}`)}>
                Add a point
              </Button>
            </Row>
          );
        })}
      </tbody>
    </Table>
  );
}

function Row({ name, length, children, onRemove }: { name: string; length?: ReactNode; children: ReactNode; onRemove: () => void }) {
  return (
    <tr>
      <Th scope="row">{name}</Th>
      <Td>{length ?? null}</Td>
      <Td>
        <div className="grid gap-2">{children}</div>
      </Td>
      <Td>
        <Button weight="quiet" aria-label={`Take out ${name.toLowerCase()}`} onClick={onRemove}>
          <Trash2 aria-hidden="true" className="size-4" />
        </Button>
      </Td>
    </tr>
  );
}
