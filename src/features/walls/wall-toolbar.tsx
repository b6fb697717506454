import { Redo2, Undo2 } from 'lucide-react';
import type { Obstruction, Stud, Zone } from '../../../shared/walls/wall.ts';
import { Button } from '../../components/button.tsx';
import { SelectField } from '../../components/select-field.tsx';
import type { WallTools } from './use-wall-tools.ts';
import type { Tool } from './wall-tools.ts';
import { foundByWords, obstructionWords, optionsOf, zoneWords } from './wall-words.ts';

const toolWords: Record<Tool, string> = { stud: 'Draw studs', box: 'Draw rectangles', polygon: 'Draw outlines', zone: 'Draw where people are', check: 'Check a length' };

/** What to do with each tool; also what those hear who cannot see the wall. */
export const toolHow: Record<Tool, string> = {
  stud: 'Press on the wall where a stud’s centre is.',
  box: 'Pull from one corner to the opposite one, or press on both.',
  polygon: 'Press on each corner, going round, and on the first again to close it.',
  zone: 'Pull along the wall from where people begin to where they end.',
  check: 'Pull from one end of a thing to the other, then type its length.',
};

export const keysHow = 'By keyboard: arrow keys move the crosshair, with Shift farther; Enter presses, Backspace takes the last point back, Escape begins anew.';

interface Props {
  tools: WallTools;
  straightened: boolean;
}

/** The tools for drawing on the wall. */
export function WallToolbar({ tools, straightened }: Props) {
  const inHand = tools.drawing?.tool ?? null;
  const offered = (Object.keys(toolWords) as Tool[]).filter((tool) => tool !== 'check' || straightened);
  return (
    <div className="mb-3 grid gap-2">
      <div role="group" aria-label="Tools for drawing on the wall" className="flex flex-wrap gap-2">
        {offered.map((tool) => (
          <Button key={tool} small aria-pressed={inHand === tool} className="aria-pressed:border-chalk-700 aria-pressed:bg-chalk-100 aria-pressed:text-chalk-700" onClick={() => tools.take(tool)}>
            {toolWords[tool]}
          </Button>
        ))}
      </div>
      {inHand ? (
        <div className="flex flex-wrap items-end gap-3">
          {inHand === 'stud' ? (
            <SelectField className="min-w-40" label="New studs found by" value={tools.foundBy} options={optionsOf(foundByWords)} onChange={(e) => tools.setFoundBy(e.target.value as Stud['foundBy'])} />
          ) : null}
          {inHand === 'box' || inHand === 'polygon' ? (
            <SelectField className="min-w-40" label="What is drawn" value={tools.kind} options={optionsOf(obstructionWords)} onChange={(e) => tools.setKind(e.target.value as Obstruction['kind'])} />
          ) : null}
          {inHand === 'zone' ? (
            <SelectField className="min-w-40" label="What is there" value={tools.zoneKind} options={optionsOf(zoneWords)} onChange={(e) => tools.setZoneKind(e.target.value as Zone['kind'])} />
          ) : null}
          <p className="min-w-0 flex-1 basis-60 text-sm text-ink-700">
            {toolHow[inHand]} {keysHow}
          </p>
          {inHand === 'polygon' && (tools.drawing?.points.length ?? 0) >= 3 ? (
            <Button small onClick={tools.closePolygon}>
              Close the outline
            </Button>
          ) : null}
          <Button small onClick={tools.layDown}>
            Stop drawing
          </Button>
        </div>
      ) : null}
    </div>
  );
}

/** Undo and redo of whichever draft is on show; `said` is read out. */
export function UndoButtons({ of }: { of: { undo: () => void; redo: () => void; mayUndo: boolean; mayRedo: boolean; said: string } }) {
  return (
    <>
      <Button small disabled={!of.mayUndo} onClick={of.undo}>
        <Undo2 aria-hidden="true" className="size-4" />
        Undo
      </Button>
      <Button small disabled={!of.mayRedo} onClick={of.redo}>
        <Redo2 aria-hidden="true" className="size-4" />
        Redo
      </Button>
      <span role="status" className="sr-only">
        {of.said}
      </span>
    </>
  );
}
