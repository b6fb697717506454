import type Konva from 'konva';
import { useCallback } from 'react';
import { Layer, Shape } from 'react-konva';
import { placedAll, type Placement, type Polygon } from '../../../../../shared/geometry/polygon.ts';
import { colours } from '../../../../../tailwind.config.ts';
import { turnHandle } from '../gestures/carry.ts';
import type { Designs } from '../state/designs.ts';
import { useEditor } from '../state/editor-store.ts';
import { write } from './canvas-pen.ts';
import { layerPlace } from './view.ts';

const chalk = colours.chalk[600];

/** What is chosen, the turn handle, and the chalk line of a snap with the reveal it keeps. */
export function GuidesLayer({ designs, readOnly, lengthText }: { designs: Designs; readOnly: boolean; lengthText: (mm: number) => string }) {
  const view = useEditor((e) => e.view);
  const hand = useEditor((e) => e.hand);
  const selected = useEditor((e) => e.selected);
  const frames = useEditor((e) => e.bench.frames);
  const reveal = useEditor((e) => e.bench.sheet.revealMm);
  const scene = useCallback(
    ({ _context: context }: Konva.Context, shape: Konva.Shape) => {
      const px = 1 / shape.getAbsoluteScale().x;
      for (const id of selected) {
        const frame = frames.find((f) => f.id === id);
        const pattern = frame && designs.get(frame.patternId);
        if (!frame || !pattern) continue;
        const at: Placement = hand?.placements.get(id) ?? frame;
        strokeRing(context, placedAll(pattern.outline, at), px);
        if (selected.length === 1 && !readOnly && !frame.locked) paintHandle(context, at, pattern.radiusMm, px);
      }
      if (!hand?.snap) return;
      const { from, to } = hand.snap.guide;
      const dx = to.x - from.x;
      const dy = to.y - from.y;
      const length = Math.hypot(dx, dy) || 1;
      const over = (22 * px) / length;
      context.strokeStyle = chalk;
      context.lineWidth = 2 * px;
      context.setLineDash([6 * px, 3 * px]);
      context.beginPath();
      context.moveTo(from.x - dx * over, from.y - dy * over);
      context.lineTo(to.x + dx * over, to.y + dy * over);
      context.stroke();
      context.setLineDash([]);
      const beside = (24 * px) / length;
      write(context, lengthText(reveal), to.x + dx * (over + beside), to.y + dy * (over + beside), 13 * px, chalk, colours.plaster[50]);
    },
    [selected, frames, hand, designs, readOnly, reveal, lengthText],
  );
  return (
    <Layer listening={false} {...layerPlace(view)}>
      <Shape sceneFunc={scene} perfectDrawEnabled={false} />
    </Layer>
  );
}

function strokeRing(context: CanvasRenderingContext2D, ring: Polygon, px: number): void {
  const trace = () => {
    context.beginPath();
    ring.forEach(({ x, y }, i) => (i === 0 ? context.moveTo(x, y) : context.lineTo(x, y)));
    context.closePath();
    context.stroke();
  };
  context.lineJoin = 'round';
  context.strokeStyle = colours.white;
  context.lineWidth = 5 * px;
  trace();
  context.strokeStyle = chalk;
  context.lineWidth = 2.5 * px;
  trace();
}

function paintHandle(context: CanvasRenderingContext2D, at: Placement, radiusMm: number, px: number): void {
  const end = turnHandle(at, radiusMm, 1 / px);
  context.strokeStyle = chalk;
  context.lineWidth = 1.5 * px;
  context.beginPath();
  context.moveTo(at.xMm + (end.x - at.xMm) * 0.7, at.yMm + (end.y - at.yMm) * 0.7);
  context.lineTo(end.x, end.y);
  context.stroke();
  context.beginPath();
  context.arc(end.x, end.y, 8 * px, 0, 2 * Math.PI);
  context.fillStyle = colours.white;
  context.fill();
  context.stroke();
  context.beginPath();
  context.arc(end.x, end.y, 3.5 * px, 0.3, 5.2);
  context.stroke();
}
