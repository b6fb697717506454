import { type ReactNode, useMemo } from 'react';
import { boxOf } from '../../../shared/geometry/polygon.ts';
import { type ElevationPicture, layoutDrawing } from '../../../shared/layouts/drawing.ts';
import type { Frame, LayoutPattern } from '../../../shared/layouts/layout.ts';
import { placedOutline } from '../../../shared/patterns/hangers.ts';
import type { Wall } from '../../../shared/walls/wall.ts';
import { SvgPen } from './svg-pen.tsx';
import { viewBoxOf } from './svg-path.ts';

interface Props {
  wall: Pick<Wall, 'widthMm' | 'heightMm' | 'outlineMm' | 'studs' | 'obstructions'>;
  elevation: ElevationPicture | null;
  frames?: readonly Frame[];
  /** Patterns of the frames; frames without theirs are left out. */
  patterns?: readonly LayoutPattern[];
  /** Studs and obstructions: what the shop needs and the client does not. */
  siteMarks?: boolean;
  labels?: boolean;
  /** Lighter lines, for a drawing of a few hundred pixels. */
  small?: boolean;
  label: string;
  className?: string;
  /** More to draw on the wall, such as a grid: mm, y turned down. */
  children?: ReactNode;
}

const none: never[] = [];

/** A wall to scale: its photo or a plain field, what stands in the way, and the frames on it. */
export function WallDrawing({ wall, elevation, frames = none, patterns = none, siteMarks = false, labels = false, small = false, label, className, children }: Props) {
  const { drawing, box, tags } = useMemo(() => {
    const designs = new Map(patterns.map(({ id, design }) => [id, design]));
    const tagged = frames.flatMap((frame) => {
      const design = designs.get(frame.patternId);
      return design ? [{ frame, box: boxOf(placedOutline(frame, design)) }] : [];
    });
    return {
      drawing: layoutDrawing({
        wall: siteMarks ? wall : { ...wall, studs: none, obstructions: none },
        picture: elevation,
        frames,
        patterns,
        show: { studs: siteMarks, hangers: false, labels: false },
      }),
      box: tagged.reduce(
        (all, { box: b }) => ({ left: Math.min(all.left, b.left), bottom: Math.min(all.bottom, b.bottom), right: Math.max(all.right, b.right), top: Math.max(all.top, b.top) }),
        { left: 0, bottom: 0, right: wall.widthMm, top: wall.heightMm },
      ),
      tags: labels ? tagged : none,
    };
  }, [wall, elevation, frames, patterns, siteMarks, labels]);

  return (
    <svg role="img" aria-label={label} viewBox={viewBoxOf(box, Math.max(wall.widthMm, wall.heightMm) * 0.01)} className={className}>
      <SvgPen drawing={drawing} lineShare={small ? 0.6 : 1} />
      {children}
      {tags.map(({ frame, box: b }) => (
        <text
          key={frame.id}
          x={frame.xMm}
          y={-frame.yMm}
          fontSize={Math.min(b.right - b.left, b.top - b.bottom) * 0.34}
          textAnchor="middle"
          dominantBaseline="central"
          className="fill-ink-900 stroke-white font-bold tabular-nums [paint-order:stroke]"
          strokeWidth="3"
          vectorEffect="non-scaling-stroke"
        >
          {frame.label}
        </text>
      ))}
    </svg>
  );
}
