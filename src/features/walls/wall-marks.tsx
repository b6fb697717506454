import { boundsOf } from '../../../shared/walls/studs.ts';
import type { Wall } from '../../../shared/walls/wall.ts';
import { zoneWords } from './wall-words.ts';

/** What only the measure shows on the wall: floor and ceiling, where people walk, sit or lie, and how far frames keep clear. mm, y turned down. */
export function WallMarks({ wall }: { wall: Pick<Wall, 'widthMm' | 'heightMm' | 'zones' | 'outlineMm' | 'obstructions'> }) {
  const size = Math.max(wall.widthMm, wall.heightMm) * 0.016;
  const words = { fontSize: size, strokeWidth: size / 4, className: 'fill-ink-900 stroke-white [paint-order:stroke] max-sm:hidden' };
  return (
    <g aria-hidden="true">
      <line x1={0} x2={wall.widthMm} y1={0} y2={0} className="stroke-ink-900" strokeWidth="3" vectorEffect="non-scaling-stroke" />
      <text x={wall.widthMm - size * 0.4} y={-size * 0.5} textAnchor="end" {...words}>
        Floor
      </text>
      {wall.outlineMm ? null : (
        <>
          <line x1={0} x2={wall.widthMm} y1={-wall.heightMm} y2={-wall.heightMm} className="stroke-ink-900" strokeWidth="3" vectorEffect="non-scaling-stroke" />
          <text x={wall.widthMm - size * 0.4} y={-wall.heightMm + size * 1.3} textAnchor="end" {...words}>
            Ceiling
          </text>
        </>
      )}
      {wall.obstructions.map((o) => {
        const { leftMm, bottomMm, widthMm, heightMm } = boundsOf(o.outlineMm);
        if (o.outlineMm.length !== 4 || o.clearanceMm <= 0) return null;
        const by = o.clearanceMm;
        return (
          <rect key={o.id} x={leftMm - by} y={-(bottomMm + heightMm + by)} width={widthMm + 2 * by} height={heightMm + 2 * by} rx={by} className="fill-none stroke-ink-500" strokeWidth="1" strokeDasharray="2 3" vectorEffect="non-scaling-stroke" />
        );
      })}
      {wall.zones.map((zone) => {
        const high = size * 2.2;
        return (
          <g key={zone.id}>
            <path d={`M${zone.fromMm} 0V${-high}H${zone.toMm}V0`} className="fill-ochre-600/15 stroke-ochre-600" strokeWidth="1.5" strokeDasharray="6 4" vectorEffect="non-scaling-stroke" />
            <text x={(zone.fromMm + zone.toMm) / 2} y={-high * 0.55} textAnchor="middle" fontSize={size} strokeWidth={size / 4} className="fill-ink-900 stroke-white font-bold [paint-order:stroke]">
              {zoneWords[zone.kind]}
            </text>
          </g>
        );
      })}
    </g>
  );
}
