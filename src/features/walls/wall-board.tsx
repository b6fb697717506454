import { type KeyboardEvent, type PointerEvent, type ReactNode, useRef, useState } from 'react';
import { formatLength } from '../../../shared/units/length.ts';
import type { Point } from '../../../shared/walls/homography.ts';
import type { Wall } from '../../../shared/walls/wall.ts';
import { useUnits } from '../../lib/units.ts';
import { closed, pressed, unpressed, type Drawing, type Drawn } from './wall-tools.ts';

interface Props {
  wall: Pick<Wall, 'widthMm' | 'heightMm'>;
  drawing: Drawing;
  onDrawing: (drawing: Drawing) => void;
  onDrawn: (drawn: Drawn) => void;
  /** What to do, told to those who cannot see it. */
  how: string;
  /** The drawing of the wall: its `svg` in mm with y turned down, into which `children` go. */
  children: ReactNode;
}

const ways: Record<string, readonly [number, number]> = { ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, 1], ArrowDown: [0, -1] };
/** A press within so many CSS px of a polygon's first corner closes it; a pull longer than this is a drag. */
const nearPx = 14;

/** Takes presses, pulls and keys on the wall for the tool in hand: pointer, or a crosshair moved by arrow keys and pressed by Enter. */
export function WallBoard({ wall, drawing, onDrawing, onDrawn, how, children }: Props) {
  const units = useUnits();
  const board = useRef<HTMLDivElement>(null);
  const down = useRef<{ x: number; y: number; at: Point; began: boolean } | null>(null);
  const [said, setSaid] = useState('');

  const matrix = () => board.current?.querySelector('svg')?.getScreenCTM() ?? null;
  const onWall = (event: { clientX: number; clientY: number }): Point | null => {
    const m = matrix();
    if (!m) return null;
    const p = new DOMPoint(event.clientX, event.clientY).matrixTransform(m.inverse());
    return { x: hold(p.x, wall.widthMm), y: hold(-p.y, wall.heightMm) };
  };
  const take = (result: ReturnType<typeof pressed>) => {
    onDrawing(result.drawing);
    if (result.drawn) onDrawn(result.drawn);
  };
  const press = (at: Point) => take(pressed(drawing, at, nearPx / (matrix()?.a || 1)));

  const pointerDown = (event: PointerEvent) => {
    const at = onWall(event);
    if (event.button !== 0 || !at) return;
    event.currentTarget.setPointerCapture(event.pointerId);
    const began = drawing.points.length === 0 && drawing.tool !== 'stud';
    down.current = { x: event.clientX, y: event.clientY, at, began };
    if (began) press(at);
    else onDrawing({ ...drawing, at });
  };
  const pointerMove = (event: PointerEvent) => {
    const at = onWall(event);
    if (at) onDrawing({ ...drawing, at });
  };
  const pointerUp = (event: PointerEvent) => {
    const from = down.current;
    const at = onWall(event);
    down.current = null;
    if (!from || !at) return;
    const pulled = Math.hypot(event.clientX - from.x, event.clientY - from.y) > nearPx;
    // The press that began a shape has set its point; it sets another only where it was pulled along.
    if (!from.began || (pulled && drawing.tool !== 'polygon')) press(at);
  };
  const key = (event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const way = ways[event.key];
    if (way) {
      const by = event.shiftKey ? 100 : units === 'mm' ? 10 : 12.7;
      const at = { x: hold(drawing.at.x + way[0] * by, wall.widthMm), y: hold(drawing.at.y + way[1] * by, wall.heightMm) };
      onDrawing({ ...drawing, at });
      setSaid(`${formatLength(at.x, units)} from the left, ${formatLength(at.y, units)} above the floor`);
    } else if (event.key === 'Enter' || event.key === ' ') press(drawing.at);
    else if (event.key === 'Backspace' && drawing.points.length > 0) onDrawing(unpressed(drawing));
    else if (event.key === 'Escape' && drawing.points.length > 0) onDrawing({ ...drawing, points: [] });
    else if (event.key.toLowerCase() === 'c' && drawing.tool === 'polygon') take(closed(drawing));
    else return;
    event.preventDefault();
  };

  return (
    <div
      ref={board}
      role="application"
      aria-label={how}
      tabIndex={0}
      data-wall-board
      className="cursor-crosshair touch-pinch-zoom"
      onPointerDown={pointerDown}
      onPointerMove={pointerMove}
      onPointerUp={pointerUp}
      onPointerCancel={() => (down.current = null)}
      onKeyDown={key}
    >
      {children}
      <p role="status" className="sr-only">
        {said}
      </p>
    </div>
  );
}

const hold = (v: number, most: number) => Math.min(Math.max(v, 0), most);
