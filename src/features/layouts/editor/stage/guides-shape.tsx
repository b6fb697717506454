import type Konva from 'konva';
import { useCallback, useMemo } from 'react';
import { Shape } from 'react-konva';
import { placedAll, type Placement, type Polygon } from '../../../../../shared/geometry/polygon.ts';
import { colours } from '../../../../../tailwind.config.ts';
import { turnHandle } from '../gestures/carry.ts';
import type { Designs } from '../state/designs.ts';
import { useEditor } from '../state/editor-store.ts';
import { paintGhost, paintMarquee, paintMeasure, paintSnap } from './paint-guides.ts';

const chalk = colours.chalk[600];

/** What is chosen, the turn handle, the chalk lines of a snap, the box of a choice and the measure being taken. */
export function GuidesShape({ designs, wall, readOnly, lengthText }: { designs: Designs; wall: { widthMm: number; heightMm: number }; readOnly: boolean; lengthText: (mm: number) => string }) {
  const hand = useEditor((e) => e.hand);
  const selected = useEditor((e) => e.selected);
  const frames = useEditor((e) => e.bench.frames);
  const marquee = useEditor((e) => e.marquee);
  const measuring = useEditor((e) => e.measuring);
  const ghosts = useEditor((e) => e.ghosts);
  const reveal = useEditor((e) => e.bench.sheet.revealMm);
  const chosen = useMemo(() => {
    const ids = new Set(selected);
    return frames.filter((f) => ids.has(f.id));
  }, [selected, frames]);
  const scene = useCallback(
    ({ _context: context }: Konva.Context, shape: Konva.Shape) => {
      const px = 1 / shape.getAbsoluteScale().x;
      for (const frame of chosen) {
        const { id } = frame;
        const pattern = designs.get(frame.patternId);
        if (!pattern) continue;
        const at: Placement = hand?.placements.get(id) ?? frame;
        strokeRing(context, placedAll(pattern.outline, at), px);
        if (chosen.length === 1 && !readOnly && !frame.locked) paintHandle(context, at, pattern.radiusMm, px);
      }
      for (const ghost of ghosts) paintGhost(context, ghost, px);
      if (hand) paintSnap(context, hand, { wall, px, reveal, lengthText });
      if (marquee) paintMarquee(context, marquee, px);
      if (measuring) paintMeasure(context, measuring, px, lengthText);
    },
    [chosen, hand, ghosts, marquee, measuring, designs, readOnly, reveal, wall, lengthText],
  );
  return <Shape sceneFunc={scene} perfectDrawEnabled={false} />;
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
