import type { FitReport } from '../../../shared/walls/fit-report.ts';

type Grid = FitReport['expectedErrorMm']['grid'];

/** Bounds of the tints, mm, and the look of each, from true to poor. */
const bands = [
  { upTo: 1, look: 'fill-sage-600/20', swatch: 'bg-sage-600/20' },
  { upTo: 2, look: 'fill-sage-600/35', swatch: 'bg-sage-600/35' },
  { upTo: 3, look: 'fill-ochre-600/25', swatch: 'bg-ochre-600/25' },
  { upTo: 5, look: 'fill-ochre-600/40', swatch: 'bg-ochre-600/40' },
  { upTo: 10, look: 'fill-madder-600/35', swatch: 'bg-madder-600/35' },
  { upTo: Infinity, look: 'fill-madder-600/60', swatch: 'bg-madder-600/60' },
] as const;

const bandOf = (mm: number) => bands.find((b) => mm <= b.upTo) ?? bands[bands.length - 1]!;

/** How far the picture may be out, over the wall: tinted fields, each with its figure in mm where there is room. mm, y turned down. */
export function AccuracyMap({ grid }: { grid: Grid }) {
  const { columns, rows, stepXMm, stepYMm, leftMm, bottomMm, values } = grid;
  const right = leftMm + (columns - 1) * stepXMm;
  const top = bottomMm + (rows - 1) * stepYMm;
  const everyX = Math.max(1, Math.ceil(columns / 7));
  const everyY = Math.max(1, Math.ceil(rows / 6));
  const size = Math.min(stepXMm * everyX * 0.28, Math.max(columns * stepXMm, rows * stepYMm) * 0.026);
  // A figure at the rim stands within it.
  const within = (v: number, low: number, high: number, room: number) => Math.min(Math.max(v, low + room), high - room);
  const points = values.flatMap((v, i) => (v === null ? [] : [{ v, column: i % columns, row: Math.floor(i / columns) }]));
  return (
    <g aria-hidden="true" data-accuracy-map>
      {points.map(({ v, column, row }) => {
        // A field reaches half a step about its point, no farther than the picture.
        const x0 = Math.max(leftMm, leftMm + (column - 0.5) * stepXMm);
        const x1 = Math.min(right, leftMm + (column + 0.5) * stepXMm);
        const y0 = Math.max(bottomMm, bottomMm + (row - 0.5) * stepYMm);
        const y1 = Math.min(top, bottomMm + (row + 0.5) * stepYMm);
        return <rect key={`${column} ${row}`} x={x0} y={-y1} width={x1 - x0} height={y1 - y0} className={bandOf(v).look} />;
      })}
      {points.map(({ v, column, row }) =>
        column % everyX === Math.floor(everyX / 2) && row % everyY === Math.floor(everyY / 2) ? (
          <text key={`${column} ${row}`} x={within(leftMm + column * stepXMm, leftMm, right, size * 1.4)} y={-within(bottomMm + row * stepYMm, bottomMm, top, size)} fontSize={size} strokeWidth={size / 4} textAnchor="middle" dominantBaseline="central" className="fill-ink-900 stroke-white font-bold tabular-nums [paint-order:stroke]">
            {v.toFixed(1)}
          </text>
        ) : null,
      )}
    </g>
  );
}

/** What the tints mean. */
export function AccuracyLegend() {
  return (
    <div className="mt-2 text-sm text-ink-700">
      <p>Figures are how far the picture may be out there, mm, nineteen times in twenty. Tints:</p>
      <ul className="mt-1 flex flex-wrap gap-x-4 gap-y-1">
        {bands.map(({ upTo, swatch }, i) => (
          <li key={upTo} className="flex items-center gap-2 tabular-nums">
            <span aria-hidden="true" className={`inline-block h-4 w-6 border border-ink-500 ${swatch}`} />
            {Number.isFinite(upTo) ? `up to ${upTo} mm` : `over ${bands[i - 1]!.upTo} mm`}
          </li>
        ))}
      </ul>
    </div>
  );
}
