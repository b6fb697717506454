import type { Wall } from '../../../shared/walls/wall.ts';
import type { Drawing } from './wall-tools.ts';

/** The drawing under way and the crosshair: mm, y turned down. Told apart from the wall by a light rim. */
export function DrawingMark({ wall, drawing: { tool, points, at } }: { wall: Pick<Wall, 'widthMm' | 'heightMm'>; drawing: Drawing }) {
  const first = points[0];
  const size = Math.max(wall.widthMm, wall.heightMm) * 0.012;
  const line = { fill: 'none', vectorEffect: 'non-scaling-stroke' } as const;
  const shape =
    tool === 'stud' ? `M${at.x} 0V${-wall.heightMm}`
    : !first ? ''
    : tool === 'box' ? `M${first.x} ${-first.y}H${at.x}V${-at.y}H${first.x}Z`
    : tool === 'zone' ? `M${first.x} 0V${-size * 2}H${at.x}V0Z`
    : `M${[...points, at].map((p) => `${p.x} ${-p.y}`).join('L')}`;
  const cross = `M${at.x - size * 2} ${-at.y}H${at.x - size / 2}M${at.x + size / 2} ${-at.y}H${at.x + size * 2}M${at.x} ${-at.y - size * 2}V${-at.y - size / 2}M${at.x} ${-at.y + size / 2}V${-at.y + size * 2}`;
  return (
    <g aria-hidden="true" className="pointer-events-none">
      {[shape, cross].map((d) => (
        <g key={d}>
          <path d={d} {...line} className="stroke-white" strokeWidth="4" />
          <path d={d} {...line} className="stroke-madder-600" strokeWidth="1.5" />
        </g>
      ))}
      {points.map((p, i) => (
        <circle key={i} cx={p.x} cy={-p.y} r={size / 2} {...line} className="stroke-madder-600" strokeWidth="2" />
      ))}
    </g>
  );
}
