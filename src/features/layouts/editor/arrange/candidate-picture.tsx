import { placedAll, type Box, type Polygon } from '../../../../../shared/geometry/polygon.ts';
import { hatchStrokes } from '../../../../../shared/layouts/drawing.ts';
import type { Frame } from '../../../../../shared/layouts/layout.ts';
import { placedHangers } from '../../../../../shared/patterns/hangers.ts';
import { wallFace } from '../../../../../shared/walls/wall-face.ts';
import type { Wall } from '../../../../../shared/walls/wall.ts';
import { inkLook } from '../../../../lib/drawing-inks.ts';
import type { Designs } from '../state/designs.ts';

const path = (ring: Polygon) => `M${ring.map(({ x, y }) => `${x.toFixed(1)} ${(-y).toFixed(1)}`).join('L')}Z`;

interface Props {
  wall: Wall;
  designs: Designs;
  /** What stays on the wall, drawn pale. */
  staying: readonly Frame[];
  frames: readonly Frame[];
  area: Box | null;
}

/** A wall with an arrangement on it, small: studs dashed, obstructions hatched, hangers as dots. */
export function CandidatePicture({ wall, designs, staying, frames, area }: Props) {
  const face = wallFace(wall);
  const line = { fill: 'none', vectorEffect: 'non-scaling-stroke' } as const;
  return (
    <svg aria-hidden="true" className="h-auto max-h-52 w-full bg-plaster-100" viewBox={`-20 ${-wall.heightMm - 20} ${wall.widthMm + 40} ${wall.heightMm + 40}`}>
      <path d={path(face)} className="fill-white stroke-ink-900" strokeWidth={1} vectorEffect="non-scaling-stroke" />
      {wall.studs.map((stud) => (
        <path key={stud.id} d={`M${stud.xMm} 0V${-wall.heightMm}`} {...line} className="stroke-chalk-600" strokeOpacity={0.5} strokeWidth={1} strokeDasharray="4 3" />
      ))}
      {wall.obstructions.map((o) => {
        const ring = o.outlineMm.map(([x, y]) => ({ x, y }));
        return (
          <g key={o.id} className="stroke-ink-500" strokeWidth={1}>
            <path d={path(ring)} {...line} />
            <path d={hatchStrokes(ring, 80).map(({ from, to }) => `M${from.x.toFixed(1)} ${(-from.y).toFixed(1)}L${to.x.toFixed(1)} ${(-to.y).toFixed(1)}`).join('')} {...line} strokeOpacity={0.6} />
          </g>
        );
      })}
      {area ? <rect x={area.left} y={-area.top} width={area.right - area.left} height={area.top - area.bottom} {...line} className="stroke-chalk-600" strokeWidth={1.5} strokeDasharray="6 3" /> : null}
      <g opacity={0.35}>
        {staying.map((frame) => (
          <FrameShape key={frame.id} frame={frame} designs={designs} />
        ))}
      </g>
      {frames.map((frame) => (
        <FrameShape key={frame.id} frame={frame} designs={designs} hangers />
      ))}
    </svg>
  );
}

function FrameShape({ frame, designs, hangers = false }: { frame: Frame; designs: Designs; hangers?: boolean }) {
  const pattern = designs.get(frame.patternId);
  if (!pattern) return null;
  const tone = pattern.drawing(frame.flipped).body.find((p) => p.kind === 'area')?.ink ?? 'wall';
  const rings = [pattern.outline, pattern.opening].filter((r) => r.length > 0).map((r) => path(placedAll(r, frame)));
  return (
    <>
      <path d={rings.join('')} fillRule="evenodd" fill={inkLook(tone).colour} stroke={inkLook('rim').colour} strokeWidth={0.75} vectorEffect="non-scaling-stroke" />
      {hangers ? placedHangers(frame, pattern.design).map((h) => <circle key={h.id} cx={h.x} cy={-h.y} r={16} fill={inkLook('hanger').colour} />) : null}
    </>
  );
}
