import { formatLength } from '../../../shared/units/length.ts';
import { useUnits } from '../../lib/units.ts';

/** Lines a foot, or 250 mm, apart. */
const stepMm = { in: 304.8, mm: 250 };
/** Every so many lines carry their measure. */
const told = { in: 2, mm: 4 };

/** A measuring grid in wall coordinates (mm, y up turned to SVG's down), for a drawing of the wall to carry. */
export function WallGrid({ widthMm, heightMm }: { widthMm: number; heightMm: number }) {
  const units = useUnits();
  const step = stepMm[units];
  const lines = (span: number) => Array.from({ length: Math.floor(span / step) }, (_, i) => (i + 1) * step).filter((at) => at < span - 1);
  const size = Math.max(widthMm, heightMm) * 0.016;
  const words = { fontSize: size, strokeWidth: size / 4, className: 'fill-ink-900 stroke-white [paint-order:stroke] tabular-nums max-sm:hidden' };
  return (
    <g aria-hidden="true">
      <g className="stroke-ink-900/25" strokeWidth="1">
        {lines(widthMm).map((x) => (
          <line key={x} x1={x} x2={x} y1={0} y2={-heightMm} vectorEffect="non-scaling-stroke" />
        ))}
        {lines(heightMm).map((y) => (
          <line key={y} x1={0} x2={widthMm} y1={-y} y2={-y} vectorEffect="non-scaling-stroke" />
        ))}
      </g>
      {lines(widthMm).map((x, i) =>
        (i + 1) % told[units] === 0 ? (
          <text key={x} x={x} y={-size * 0.5} textAnchor="middle" {...words}>
            {formatLength(x, units)}
          </text>
        ) : null,
      )}
      {lines(heightMm).map((y, i) =>
        (i + 1) % told[units] === 0 ? (
          <text key={y} x={size * 0.4} y={-y + size * 0.35} {...words}>
            {formatLength(y, units)}
          </text>
        ) : null,
      )}
    </g>
  );
}

/** What the lines of the drawing are, below it. */
export function WallLegend({ unconfirmed }: { unconfirmed: boolean }) {
  const units = useUnits();
  return (
    <figcaption className="mt-2 text-sm text-ink-700">
      Grid lines every {formatLength(stepMm[units], units)} from the left end and the floor. Dashed pairs are studs
      {unconfirmed ? <>; <span className="font-bold text-chalk-700">?</span> marks one that nobody has confirmed yet</> : null}. Hatching is what stands in the way; the dotted line about it is what frames keep clear of.
    </figcaption>
  );
}
