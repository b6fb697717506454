import type { Placement } from '../../../shared/geometry/point.ts';
import { placedHangers, placedMembers, placedOutline } from '../../../shared/patterns/hangers.ts';
import type { PatternDesign } from '../../../shared/patterns/pattern.ts';
import { ringPath } from './svg-path.ts';
import { speciesFill } from './species-tones.ts';

interface Props {
  design: PatternDesign;
  at: Placement;
  /** Draws screw positions and the stretch each may slide along. */
  hangers?: boolean;
}

/** How far the shadow falls, as a share of the depth. */
const shadowShare = 0.12;

/** One frame as seen from the front: ring in the species' tone, joints at the miters, what the opening shows, depth as a shadow. */
export function FrameDrawing({ design, at, hangers = false }: Props) {
  const outline = placedOutline(at, design);
  const members = placedMembers(at, design);
  const opening = members.map(({ innerFrom }) => innerFrom);
  const ring = ringPath(outline) + ringPath(opening);
  const fall = design.depthMm * shadowShare;
  return (
    <g strokeLinejoin="round">
      <path d={ring} fillRule="evenodd" transform={`translate(${fall} ${fall})`} className="fill-ink-900/20" />
      {design.groove && design.groove.mirrorMm > 0 ? <path d={ringPath(opening)} className="fill-white" /> : null}
      {design.groove && design.groove.mirrorMm === 0 && design.groove.backerMm > 0 ? <path d={ringPath(opening)} className="fill-plaster-200" /> : null}
      {members.map((member) => (
        <path
          key={member.index}
          d={ringPath([member.outerFrom, member.outerTo, member.innerTo, member.innerFrom])}
          className={`stroke-ink-900 ${speciesFill[design.species]}`}
          strokeWidth="1.2"
          vectorEffect="non-scaling-stroke"
        />
      ))}
      {hangers
        ? placedHangers(at, design).map(({ id, x, y, slide }) => (
            <g key={id} className="fill-brass-200 stroke-brass-600">
              <line x1={slide.from.x} y1={-slide.from.y} x2={slide.to.x} y2={-slide.to.y} strokeWidth="2" vectorEffect="non-scaling-stroke" />
              <circle cx={x} cy={-y} r={Math.max(5, design.thicknessMm * 0.35)} strokeWidth="1.5" vectorEffect="non-scaling-stroke" />
            </g>
          ))
        : null}
    </g>
  );
}
