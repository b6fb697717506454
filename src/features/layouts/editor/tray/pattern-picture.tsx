import { boxOf, type Polygon } from '../../../../../shared/geometry/polygon.ts';
import { inkLook } from '../../../../lib/drawing-inks.ts';
import type { ReadyPattern } from '../state/designs.ts';

const path = (ring: Polygon) => `M${ring.map(({ x, y }) => `${x.toFixed(1)} ${(-y).toFixed(1)}`).join('L')}Z`;

/** A pattern, small. */
export function PatternPicture({ pattern, className }: { pattern: ReadyPattern; className?: string }) {
  const { left, right, bottom, top } = boxOf(pattern.outline);
  const margin = Math.max(right - left, top - bottom) * 0.04;
  return (
    <svg aria-hidden="true" className={className} viewBox={`${left - margin} ${-top - margin} ${right - left + 2 * margin} ${top - bottom + 2 * margin}`}>
      {pattern.drawing(false).body.map((p, i) =>
        p.kind === 'area' ? (
          <path key={i} d={[p.points, ...p.holes].map(path).join('')} fillRule="evenodd" fill={inkLook(p.ink).colour} />
        ) : p.kind === 'line' && p.ink !== 'grain' ? (
          <path key={i} d={p.closed ? path(p.points) : path(p.points).slice(0, -1)} fill="none" stroke={inkLook(p.ink).colour} strokeWidth={1} vectorEffect="non-scaling-stroke" />
        ) : null,
      )}
    </svg>
  );
}
