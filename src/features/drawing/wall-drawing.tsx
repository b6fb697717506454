import { useId } from 'react';
import { boxOf } from '../../../shared/geometry/polygon.ts';
import type { Frame } from '../../../shared/layouts/layout.ts';
import { placedOutline } from '../../../shared/patterns/hangers.ts';
import type { PatternDesign } from '../../../shared/patterns/pattern.ts';
import { isConfirmed, type Wall } from '../../../shared/walls/wall.ts';
import { usePicture } from '../../lib/picture.ts';
import { FrameDrawing } from './frame-drawing.tsx';
import { ringPath, viewBoxOf } from './svg-path.ts';

/** A straightened photo and the wall rectangle it shows, mm. */
export interface Elevation {
  url: string;
  leftMm: number;
  bottomMm: number;
  widthMm: number;
  heightMm: number;
}

interface Props {
  wall: Pick<Wall, 'widthMm' | 'heightMm' | 'studs' | 'obstructions'>;
  elevation: Elevation | null;
  frames?: readonly Frame[];
  /** Design of a frame's pattern; frames without one are left out. */
  designOf?: (patternId: string) => PatternDesign | undefined;
  /** Studs and obstructions: what the shop needs and the client does not. */
  siteMarks?: boolean;
  labels?: boolean;
  label: string;
  className?: string;
}

/** A wall to scale: its photo or a plain field, what stands in the way, and the frames on it. */
export function WallDrawing({ wall, elevation, frames = [], designOf = () => undefined, siteMarks = false, labels = false, label, className }: Props) {
  const hatch = useId();
  const drawn = frames.flatMap((frame) => {
    const design = designOf(frame.patternId);
    return design ? [{ frame, design, box: boxOf(placedOutline(frame, design)) }] : [];
  });
  const box = drawn.reduce(
    (all, { box: b }) => ({ left: Math.min(all.left, b.left), bottom: Math.min(all.bottom, b.bottom), right: Math.max(all.right, b.right), top: Math.max(all.top, b.top) }),
    { left: 0, bottom: 0, right: wall.widthMm, top: wall.heightMm },
  );
  const corners = [{ x: 0, y: 0 }, { x: wall.widthMm, y: 0 }, { x: wall.widthMm, y: wall.heightMm }, { x: 0, y: wall.heightMm }];
  return (
    <svg role="img" aria-label={label} viewBox={viewBoxOf(box, Math.max(wall.widthMm, wall.heightMm) * 0.01)} className={className}>
      <defs>
        <pattern id={hatch} width="60" height="60" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <line x1="0" y1="0" x2="0" y2="60" className="stroke-ink-500" strokeWidth="10" />
        </pattern>
      </defs>
      <path d={ringPath(corners)} className="fill-white" />
      {elevation ? <ElevationPicture elevation={elevation} /> : null}
      <path d={ringPath(corners)} className="fill-none stroke-ink-900" strokeWidth="1.5" vectorEffect="non-scaling-stroke" />
      {siteMarks ? <SiteMarks wall={wall} hatch={`url(#${hatch})`} /> : null}
      {drawn.map(({ frame, design }) => (
        <FrameDrawing key={frame.id} design={design} at={frame} />
      ))}
      {labels
        ? drawn.map(({ frame, box: b }) => (
            <text
              key={frame.id}
              x={frame.xMm}
              y={-frame.yMm}
              fontSize={Math.min(b.right - b.left, b.top - b.bottom) * 0.22}
              textAnchor="middle"
              dominantBaseline="central"
              className="fill-ink-900 stroke-white font-bold tabular-nums [paint-order:stroke]"
              strokeWidth="3"
              vectorEffect="non-scaling-stroke"
            >
              {frame.label}
            </text>
          ))
        : null}
    </svg>
  );
}

function ElevationPicture({ elevation }: { elevation: Elevation }) {
  const { src, failed, onError } = usePicture(elevation.url);
  if (failed) return null;
  const { leftMm, bottomMm, widthMm, heightMm } = elevation;
  return <image href={src} onError={onError} x={leftMm} y={-bottomMm - heightMm} width={widthMm} height={heightMm} preserveAspectRatio="none" />;
}

function SiteMarks({ wall, hatch }: { wall: Props['wall']; hatch: string }) {
  return (
    <>
      {wall.obstructions.map((o) => (
        <path key={o.id} d={ringPath(o.outlineMm.map(([x, y]) => ({ x, y })))} fill={hatch} className="stroke-ink-700" strokeWidth="1.5" vectorEffect="non-scaling-stroke" />
      ))}
      {wall.studs.map((stud) => (
        <g key={stud.id} className="stroke-chalk-600">
          {[-1, 1].map((side) => {
            const x = stud.xMm + (side * stud.widthMm) / 2;
            return <line key={side} x1={x} y1={0} x2={x} y2={-wall.heightMm} strokeWidth="1" strokeDasharray="6 4" vectorEffect="non-scaling-stroke" />;
          })}
          {isConfirmed(stud) ? null : (
            <text x={stud.xMm} y={-wall.heightMm * 0.94} fontSize={wall.heightMm * 0.06} textAnchor="middle" className="fill-chalk-700 stroke-none font-bold">
              ?
            </text>
          )}
        </g>
      ))}
    </>
  );
}
