import { useQuery } from '@tanstack/react-query';
import { type ReactNode, useMemo, useState } from 'react';
import { changesBetween, type FrameChange } from '../../../../shared/layouts/compare.ts';
import type { Bench } from '../../../../shared/layouts/edits.ts';
import type { Frame, LayoutPattern, Revision } from '../../../../shared/layouts/layout.ts';
import { formatAngle } from '../../../../shared/units/angle.ts';
import { formatLength } from '../../../../shared/units/length.ts';
import { Dialog } from '../../../components/dialog.tsx';
import { ErrorState } from '../../../components/error-state.tsx';
import { Loading } from '../../../components/loading.tsx';
import { SelectField } from '../../../components/select-field.tsx';
import { Table, Td, Th } from '../../../components/table.tsx';
import { momentOf } from '../../../lib/dates.ts';
import { useUnits } from '../../../lib/units.ts';
import { sentRevisionQuery } from '../layouts.queries.ts';
import { ChangeMarks } from './change-marks.tsx';

/** A state of the layout with the patterns its frames are made by. */
interface Standing extends Bench {
  patterns: readonly LayoutPattern[];
}

/** Draws frames on the wall, with more over them in mm, y turned down; the page knows how. */
export type DrawOnWall = (drawn: { frames: readonly Frame[]; patterns: readonly LayoutPattern[]; label: string; over: ReactNode }) => ReactNode;

interface Props {
  revisions: readonly Revision[];
  bench: Standing;
  draw: DrawOnWall;
  onClose: () => void;
}

const now = 'now';

/** What moved, came and went between two revisions, or from one to what is on the bench: drawn on the wall, and as a list with figures. */
export function CompareDialog({ revisions, bench, draw, onClose }: Props) {
  const [fromId, setFrom] = useState(revisions.at(-1)?.id ?? now);
  const [toId, setTo] = useState(now);
  const from = useStanding(fromId, bench);
  const to = useStanding(toId, bench);
  const options = [...revisions.map((r) => ({ value: r.id, words: `Revision ${r.letter}, sent ${momentOf(r.sentAt)}` })), { value: now, words: 'What is on the bench now' }];
  const failed = from.error ? from : to.error ? to : null;
  return (
    <Dialog open onOpenChange={(open) => (open ? undefined : onClose())} wide title="What changed" about="Compares a revision as it was sent with another, or with the bench.">
      <div className="grid gap-4 sm:grid-cols-2">
        <SelectField label="From" value={fromId} onChange={(event) => setFrom(event.target.value)} options={options} />
        <SelectField label="To" value={toId} onChange={(event) => setTo(event.target.value)} options={options} />
      </div>
      <div className="mt-4">
        {failed ? <ErrorState error={failed.error!} onRetry={failed.retry} /> : from.standing && to.standing ? <Difference from={from.standing} to={to.standing} draw={draw} /> : <Loading what="the revisions" />}
      </div>
    </Dialog>
  );
}

function useStanding(id: string, bench: Standing): { standing: Standing | null; error: Error | null; retry: () => void } {
  const sent = useQuery({ ...sentRevisionQuery(id), enabled: id !== now });
  if (id === now) return { standing: bench, error: null, retry: () => undefined };
  return { standing: sent.data ?? null, error: sent.error, retry: () => void sent.refetch() };
}

function Difference({ from, to, draw }: { from: Standing; to: Standing; draw: DrawOnWall }) {
  const units = useUnits();
  const { frames, sheet, same } = useMemo(() => changesBetween(from, to), [from, to]);
  const patterns = useMemo(() => [...new Map([...from.patterns, ...to.patterns].map((p) => [p.id, p])).values()], [from, to]);
  const lines = [
    ...(sheet && sheet.before.name !== sheet.after.name ? [`Renamed from “${sheet.before.name}” to “${sheet.after.name}”.`] : []),
    ...(sheet && sheet.before.revealMm !== sheet.after.revealMm ? [`Reveal ${formatLength(sheet.before.revealMm, units)} before, ${formatLength(sheet.after.revealMm, units)} after.`] : []),
    frames.length === 0 ? `No frame differs: all ${same} are the same.` : `${frames.length} ${frames.length === 1 ? 'frame differs' : 'frames differ'}; ${same} ${same === 1 ? 'is' : 'are'} the same.`,
  ];
  return (
    <>
      {draw({
        frames: to.frames, patterns, over: <ChangeMarks changes={frames} patterns={patterns} />,
        label: `The wall after the changes; where frames were before is drawn dashed. ${lines.join(' ')}`,
      })}
      <div role="status" className="mt-3 text-ink-900">
        {lines.map((line) => (
          <p key={line}>{line}</p>
        ))}
      </div>
      {frames.length > 0 ? (
        <Table caption="Frames that differ" className="mt-3 max-h-72 overflow-y-auto text-sm">
          <thead>
            <tr>
              <Th>Frame</Th>
              <Th>What</Th>
              <Th figure>Across</Th>
              <Th figure>Upwards</Th>
              <Th figure>Turned</Th>
            </tr>
          </thead>
          <tbody>
            {frames.map((change) => (
              <tr key={change.frameId}>
                <Th scope="row">{change.label}</Th>
                <Td>{wordsOf(change, patterns)}</Td>
                <Td figure>{signed(change.acrossMm, (mm) => formatLength(mm, units), ['to the right', 'to the left'])}</Td>
                <Td figure>{signed(change.upMm, (mm) => formatLength(mm, units), ['up', 'down'])}</Td>
                <Td figure>{signed(change.turnedRad, formatAngle, ['to the left', 'to the right'])}</Td>
              </tr>
            ))}
          </tbody>
        </Table>
      ) : null}
    </>
  );
}

function signed(value: number, format: (size: number) => string, [more, less]: readonly [string, string]): string {
  return Math.abs(value) < 1e-5 ? '' : `${format(Math.abs(value))} ${value > 0 ? more : less}`;
}

function wordsOf({ kind, before, after }: FrameChange, patterns: readonly LayoutPattern[]): string {
  const name = (frame: Frame | null) => patterns.find((p) => p.id === frame?.patternId)?.name ?? 'another pattern';
  switch (kind) {
    case 'added':
      return `Added (${name(after)})`;
    case 'removed':
      return `Removed (${name(before)})`;
    case 'swapped':
      return `${name(before)} before, ${name(after)} after`;
    case 'moved':
      return 'Moved';
    case 'turned':
      return before?.flipped === after?.flipped ? 'Turned' : 'Flipped';
    case 'noted':
      return 'Label, load, lock, hangers or group';
  }
}
