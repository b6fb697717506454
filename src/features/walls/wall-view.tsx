import { type ReactNode, useState } from 'react';
import type { Photo, Wall } from '../../../shared/walls/wall.ts';
import { CheckField } from '../../components/check-field.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { AccuracyLegend, AccuracyMap } from './accuracy-map.tsx';
import { CheckDrawn } from './check-drawn.tsx';
import { CheckLength } from './check-length.tsx';
import { DrawingMark } from './drawing-mark.tsx';
import { FitFacts } from './fit-facts.tsx';
import type { WallTools } from './use-wall-tools.ts';
import { WallBoard } from './wall-board.tsx';
import { WallGrid, WallLegend } from './wall-grid.tsx';
import { WallMarks } from './wall-marks.tsx';
import { keysHow, toolHow, WallToolbar } from './wall-toolbar.tsx';

interface Props {
  wall: Wall;
  photo: Photo | null;
  /** Null for those who only read. */
  tools: WallTools | null;
  unconfirmed: boolean;
  /** Draws the wall itself, with the given things over it, as large as `className` says. */
  children: (over: ReactNode, className: string) => ReactNode;
}

const sizes = [{ value: '1', words: 'Whole' }, { value: '2', words: 'Twice as large' }, { value: '4', words: 'Four times as large' }];
const widths: Record<string, string> = { '1': 'max-h-[75dvh] w-full', '2': 'w-[200%] max-w-none', '4': 'w-[400%] max-w-none' };

/** The wall from the front: drawn on, looked at closely, and told how far it may be out. */
export function WallView({ wall, photo, tools, unconfirmed, children }: Props) {
  const [size, setSize] = useState('1');
  const [mapped, setMapped] = useState(false);
  const fit = photo?.elevation ? (photo.fit ?? null) : null;
  const drawing = tools?.drawing ?? null;
  const drawn = children(
    <>
      {mapped && fit ? <AccuracyMap grid={fit.expectedErrorMm.grid} /> : <WallGrid widthMm={wall.widthMm} heightMm={wall.heightMm} />}
      <WallMarks wall={wall} />
      {tools?.check ? <CheckDrawn wall={wall} check={tools.check} /> : null}
      {drawing ? <DrawingMark wall={wall} drawing={drawing} /> : null}
    </>,
    widths[size] ?? '',
  );
  return (
    <div className="grid gap-4">
      <figure>
        {tools ? <WallToolbar tools={tools} straightened={fit !== null} /> : null}
        <div className="mb-2 flex flex-wrap items-end gap-x-6 gap-y-2">
          <SelectField className="min-w-44" label="Size on the page" value={size} options={sizes} onChange={(e) => setSize(e.target.value)} />
          {fit ? <CheckField className="pb-2" label="Show how far the picture may be out" checked={mapped} onChange={(e) => setMapped(e.target.checked)} /> : null}
        </div>
        <div className={size === '1' ? undefined : 'max-h-[75dvh] overflow-auto border border-plaster-200'} tabIndex={size === '1' ? undefined : 0} role={size === '1' ? undefined : 'group'} aria-label={size === '1' ? undefined : 'The wall, enlarged: scrolls'}>
          {tools && drawing ? (
            <WallBoard wall={wall} drawing={drawing} onDrawing={tools.setDrawing} onDrawn={tools.made} how={`${toolHow[drawing.tool]} ${keysHow}`}>
              {drawn}
            </WallBoard>
          ) : (
            drawn
          )}
        </div>
        {mapped && fit ? <AccuracyLegend /> : <WallLegend unconfirmed={unconfirmed} />}
      </figure>
      {tools?.check && photo ? <CheckLength photo={photo} check={tools.check} onChange={tools.setCheck} onClose={() => { tools.setCheck(null); if (drawing?.tool === 'check') tools.layDown(); }} /> : null}
      {fit ? <FitFacts report={fit} sharpness={photo?.sharpness ?? null} /> : null}
    </div>
  );
}
