import { boxOf } from '../../../shared/geometry/polygon.ts';
import { frameDrawing, shadowDrawing } from '../../../shared/layouts/drawing.ts';
import { placedMembers } from '../../../shared/patterns/hangers.ts';
import { frameGeometry } from '../../../shared/patterns/frame.ts';
import { ShapeError } from '../../../shared/patterns/outline.ts';
import type { PatternDesign } from '../../../shared/patterns/pattern.ts';
import { viewBoxOf } from './svg-path.ts';
import { SvgPen } from './svg-pen.tsx';

const own = { xMm: 0, yMm: 0, turnRad: 0, flipped: false };

interface Props {
  design: PatternDesign;
  label: string;
  /** Writes each member's number, from 1 at the lowest side, inside the opening. */
  memberNumbers?: boolean;
  className?: string;
}

/** One frame design, as large as its place allows; nothing where the shape cannot be made. */
export function PatternDrawing({ design, label, memberNumbers = false, className }: Props) {
  const geometry = geometryOrNull(design);
  if (!geometry) return null;
  const { outline, opening } = geometry;
  const box = boxOf(outline);
  const { body, hangers } = frameDrawing(design);
  const margin = Math.max(box.right - box.left, box.top - box.bottom) * 0.08;
  return (
    <svg role="img" aria-label={label} viewBox={viewBoxOf(box, margin)} className={className}>
      <SvgPen drawing={[...shadowDrawing(design, outline, opening), ...body, ...hangers]} />
      {memberNumbers ? <MemberNumbers design={design} sizeMm={margin * 0.7} /> : null}
    </svg>
  );
}

function MemberNumbers({ design, sizeMm }: { design: PatternDesign; sizeMm: number }) {
  return (
    <g className="fill-ink-700 font-semibold">
      {placedMembers(own, design).map(({ index, innerFrom, innerTo, inclinationRad }) => (
        <text
          key={index}
          x={(innerFrom.x + innerTo.x) / 2 - Math.sin(inclinationRad) * sizeMm}
          y={-(innerFrom.y + innerTo.y) / 2 - Math.cos(inclinationRad) * sizeMm}
          fontSize={sizeMm}
          textAnchor="middle"
          dominantBaseline="central"
        >
          {index + 1}
        </text>
      ))}
    </g>
  );
}

function geometryOrNull(design: PatternDesign) {
  try {
    return frameGeometry(design);
  } catch (error) {
    if (error instanceof ShapeError) return null;
    throw error;
  }
}
