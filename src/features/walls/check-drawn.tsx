import { endsOf, type Check } from './check.ts';

/** A check's line over the wall: mm, y turned down. */
export function CheckDrawn({ wall, check }: { wall: { widthMm: number; heightMm: number }; check: Check }) {
  const ends = endsOf(check);
  if (!ends) return null;
  const tick = Math.max(wall.widthMm, wall.heightMm) * 0.01;
  const [a, b] = ends;
  const long = Math.hypot(b.x - a.x, b.y - a.y) || 1;
  const [nx, ny] = [(-(b.y - a.y) / long) * tick, ((b.x - a.x) / long) * tick];
  const d = `M${a.x} ${-a.y}L${b.x} ${-b.y}${[a, b].map((p) => `M${p.x - nx} ${-(p.y - ny)}L${p.x + nx} ${-(p.y + ny)}`).join('')}`;
  return (
    <g aria-hidden="true">
      <path d={d} className="fill-none stroke-white" strokeWidth="5" vectorEffect="non-scaling-stroke" />
      <path d={d} className="fill-none stroke-madder-600" strokeWidth="2" vectorEffect="non-scaling-stroke" />
    </g>
  );
}
