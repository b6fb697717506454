import { useCallback } from 'react';
import type { Placement } from '../../../../../shared/geometry/polygon.ts';
import { colours } from '../../../../../tailwind.config.ts';
import { type FindingWeight, weightShapes } from '../../../../components/weight-mark.tsx';
import type { Designs } from '../state/designs.ts';
import { useEditor } from '../state/editor-store.ts';
import { WallShape } from './layers.tsx';

const inks = { stop: colours.madder[600], caution: colours.ochre[600], note: colours.ink[500] };
/** Size of a mark on screen, px, and how far over the middle of its frame it stands, clear of the label. */
const markPx = 17;
const overPx = 19;
const roomyPx = 22;
/** The shapes are drawn in a square of this side. */
const shapeSide = 20;

let paths: Record<FindingWeight, Path2D> | null = null;
const pathOf = (weight: FindingWeight): Path2D => {
  paths ??= { stop: new Path2D(weightShapes.stop), caution: new Path2D(weightShapes.caution), note: new Path2D(weightShapes.note) };
  return paths[weight];
};

/** Marks the frames that bear a stop or a caution, each by its shape: changes when the checks have run. */
export function MarksShape({ designs, marked }: { designs: Designs; marked: ReadonlyMap<string, FindingWeight> }) {
  const frames = useEditor((e) => e.bench.frames);
  const heldKey = useEditor((e) => (e.hand ? [...e.hand.placements.keys()].join(' ') : ''));
  const paint = useCallback(
    (context: CanvasRenderingContext2D, pxPerMm: number) => {
      const held = new Set(heldKey.split(' '));
      for (const frame of frames) {
        const weight = marked.get(frame.id);
        const radiusMm = designs.get(frame.patternId)?.radiusMm;
        if (!weight || weight === 'note' || radiusMm === undefined || held.has(frame.id)) continue;
        paintMark(context, weight, frame, pxPerMm, radiusMm * pxPerMm);
      }
    },
    [frames, designs, marked, heldKey],
  );
  return <WallShape paint={paint} />;
}

function paintMark(context: CanvasRenderingContext2D, weight: FindingWeight, at: Pick<Placement, 'xMm' | 'yMm'>, pxPerMm: number, radiusPx: number): void {
  // A small frame has room for one thing: the mark stands where its label would.
  const roomy = radiusPx > roomyPx;
  const over = roomy ? Math.min(overPx, radiusPx * 0.5) : 0;
  const size = Math.min(markPx, Math.max(7, radiusPx * (roomy ? 0.45 : 0.8)));
  context.save();
  context.translate(at.xMm, at.yMm + over / pxPerMm);
  context.scale(size / shapeSide / pxPerMm, -size / shapeSide / pxPerMm);
  context.translate(-shapeSide / 2, -shapeSide / 2);
  context.lineJoin = 'round';
  context.strokeStyle = colours.white;
  context.lineWidth = 4;
  context.stroke(pathOf(weight));
  context.fillStyle = inks[weight];
  context.fill(pathOf(weight));
  context.strokeStyle = colours.white;
  context.lineWidth = 2;
  context.beginPath();
  context.moveTo(10, 6.5);
  context.lineTo(10, 12);
  context.moveTo(10, 13.8);
  context.lineTo(10, 15.5);
  context.stroke();
  context.restore();
}
