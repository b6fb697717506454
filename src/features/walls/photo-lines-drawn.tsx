import type { Point } from '../../../shared/walls/homography.ts';
import type { PhotoDraft } from './photo-draft.ts';
import { lineName } from './photo-handles.ts';

interface Stroke {
  points: readonly Point[];
  look: string;
  dashes?: string;
  words: string;
}

/** The lines between the handles, each named at its middle: the taped rectangle, plumb and level lines, lengths, straight edges. */
export function PhotoLinesDrawn({ photo, draft }: { photo: { widthPx: number; heightPx: number }; draft: PhotoDraft }) {
  const corners = draft.marks.slice(0, 4).map(({ px }) => `${px.x},${px.y}`).join(' ');
  const strokes: Stroke[] = [
    ...draft.lines.map((l, i): Stroke => ({ points: l.px, look: 'stroke-chalk-700', dashes: '10 5', words: lineName(draft, i) })),
    ...draft.lengths.map((l, i): Stroke => ({ points: l.px, look: 'stroke-madder-600', words: `Length ${i + 1}` })),
    ...draft.straightEdges.map((e, i): Stroke => ({ points: e, look: 'stroke-ink-900', dashes: '2 4', words: `Edge ${i + 1}` })),
  ];
  const size = photo.widthPx / 55;
  return (
    <svg aria-hidden="true" viewBox={`0 0 ${photo.widthPx} ${photo.heightPx}`} className="pointer-events-none absolute inset-0 size-full">
      {draft.marks.length >= 4 ? (
        <>
          <polygon points={corners} className="fill-chalk-600/10 stroke-white" strokeWidth="4" vectorEffect="non-scaling-stroke" />
          <polygon points={corners} className="fill-none stroke-chalk-600" strokeWidth="2" vectorEffect="non-scaling-stroke" />
        </>
      ) : null}
      {strokes.map(({ points, look, dashes, words }) => {
        const d = points.map((p) => `${p.x},${p.y}`).join(' ');
        const middle = points.length === 2 ? { x: (points[0]!.x + points[1]!.x) / 2, y: (points[0]!.y + points[1]!.y) / 2 } : points[Math.floor(points.length / 2)]!;
        return (
          <g key={words}>
            <polyline points={d} className="fill-none stroke-white" strokeWidth="4" vectorEffect="non-scaling-stroke" />
            <polyline points={d} className={`fill-none ${look}`} strokeWidth="2" strokeDasharray={dashes} vectorEffect="non-scaling-stroke" />
            <text x={middle.x} y={middle.y - size * 0.8} fontSize={size} textAnchor="middle" strokeWidth={size / 4} className="fill-ink-900 stroke-white font-bold [paint-order:stroke] max-sm:hidden">
              {words}
            </text>
          </g>
        );
      })}
    </svg>
  );
}
