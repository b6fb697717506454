import { boxOf } from '../../../shared/geometry/polygon.ts';
import { outlineOf, ShapeError } from '../../../shared/patterns/outline.ts';
import type { PatternDesign } from '../../../shared/patterns/pattern.ts';
import { FrameDrawing } from './frame-drawing.tsx';
import { viewBoxOf } from './svg-path.ts';

const own = { xMm: 0, yMm: 0, turnRad: 0, flipped: false };

/** One frame design, as large as its place allows; nothing where the shape cannot be made. */
export function PatternDrawing({ design, label, className }: { design: PatternDesign; label: string; className?: string }) {
  const box = outlineBox(design);
  if (!box) return null;
  const margin = Math.max(box.right - box.left, box.top - box.bottom) * 0.08;
  return (
    <svg role="img" aria-label={label} viewBox={viewBoxOf(box, margin)} className={className}>
      <FrameDrawing design={design} at={own} hangers />
    </svg>
  );
}

function outlineBox(design: PatternDesign) {
  try {
    return boxOf(outlineOf(design.shape));
  } catch (error) {
    if (error instanceof ShapeError) return null;
    throw error;
  }
}
