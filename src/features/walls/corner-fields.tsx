import { Trash2 } from 'lucide-react';
import { Button } from '../../components/button.tsx';
import { LengthField } from '../../components/length-field.tsx';
import { Table, Td, Th } from '../../components/table.tsx';
import type { Corner, DraftErrors } from './wall-draft.ts';

interface Props {
  /** What the corners belong to, as its table is named. */
  of: string;
  corners: readonly Corner[];
  errors: DraftErrors;
  /** Where the corners stand in the draft, for their errors. */
  path: string;
  onChange: (corners: Corner[]) => void;
}

/** The corners of an outline, going round. */
export function CornerFields({ of, corners, errors, path, onChange }: Props) {
  const set = (index: number, change: Partial<Corner>) => onChange(corners.map((c, i) => (i === index ? { ...c, ...change } : c)));
  const after = (index: number) => {
    const [a, b] = [corners[index]!, corners[(index + 1) % corners.length]!];
    const half = (p: number | null, q: number | null) => (p === null || q === null ? null : Math.round((p + q) / 2));
    onChange([...corners.slice(0, index + 1), { xMm: half(a.xMm, b.xMm), yMm: half(a.yMm, b.yMm) }, ...corners.slice(index + 1)]);
  };
  return (
    <div className="grid gap-2">
      <p aria-hidden="true" className="text-sm font-semibold text-ink-700">Corners of {of}, going round</p>
      <Table caption={`Corners of ${of}, going round`}>
        <thead>
          <tr>
            <Th>Corner</Th>
            <Th>From the left</Th>
            <Th>Above the floor</Th>
            <Th>
              <span className="sr-only">Add or take out</span>
            </Th>
          </tr>
        </thead>
        <tbody>
          {corners.map((corner, i) => {
            const name = `Corner ${i + 1} of ${of}`;
            return (
              <tr key={i}>
                <Th scope="row">{i + 1}</Th>
                <Td>
                  <LengthField className="min-w-28 [&>label]:sr-only" label={`${name}: from the left`} value={corner.xMm} error={errors[`${path}.${i}.xMm`]} onChange={(xMm) => set(i, { xMm })} />
                </Td>
                <Td>
                  <LengthField className="min-w-28 [&>label]:sr-only" label={`${name}: above the floor`} value={corner.yMm} error={errors[`${path}.${i}.yMm`]} onChange={(yMm) => set(i, { yMm })} />
                </Td>
                <Td className="whitespace-nowrap">
                  <Button weight="quiet" aria-label={`Add a corner after corner ${i + 1} of ${of}`} onClick={() => after(i)}>
                    + corner
                  </Button>
                  {corners.length > 3 ? (
                    <Button weight="quiet" aria-label={`Take out corner ${i + 1} of ${of}`} onClick={() => onChange(corners.filter((_, k) => k !== i))}>
                      <Trash2 aria-hidden="true" className="size-4" />
                    </Button>
                  ) : null}
                </Td>
              </tr>
            );
          })}
        </tbody>
      </Table>
      {errors[path] ? <p className="text-sm font-semibold text-madder-600">{errors[path]}</p> : null}
    </div>
  );
}
