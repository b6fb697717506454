import { placedOutline } from '../../../../shared/patterns/hangers.ts';
import type { FrameChange } from '../../../../shared/layouts/compare.ts';
import type { Frame, LayoutPattern } from '../../../../shared/layouts/layout.ts';
import type { Polygon } from '../../../../shared/geometry/polygon.ts';

const ring = (outline: Polygon) => `M${outline.map(({ x, y }) => `${x.toFixed(1)} ${(-y).toFixed(1)}`).join('L')}Z`;

/** Changes over a drawing of the wall after them: dashed where a frame was, a line to where it is, + for added and × for removed. In mm, y turned down. */
export function ChangeMarks({ changes, patterns }: { changes: readonly FrameChange[]; patterns: readonly LayoutPattern[] }) {
  const designs = new Map(patterns.map((p) => [p.id, p.design]));
  const outlineOf = (frame: Frame | null) => {
    const design = frame && designs.get(frame.patternId);
    return frame && design ? placedOutline(frame, design) : null;
  };
  return changes.map(({ frameId, kind, label, before, after }) => {
    if (kind === 'noted') return null;
    const was = outlineOf(before);
    const is = outlineOf(after);
    const [look, sign] = kind === 'added' ? ['stroke-sage-600', '+'] : kind === 'removed' ? ['stroke-madder-600', '×'] : ['stroke-chalk-600', ''];
    const at = after ?? before;
    return (
      <g key={frameId} className={`fill-none ${look}`} strokeWidth="2.5">
        {was ? <path d={ring(was)} strokeDasharray="6 4" vectorEffect="non-scaling-stroke" /> : null}
        {is ? <path d={ring(is)} vectorEffect="non-scaling-stroke" /> : null}
        {before && after ? <path d={`M${before.xMm} ${-before.yMm}L${after.xMm} ${-after.yMm}`} vectorEffect="non-scaling-stroke" /> : null}
        {at ? (
          <text x={at.xMm} y={-at.yMm} fontSize="90" textAnchor="middle" dominantBaseline="central" className="fill-ink-900 stroke-white font-bold [paint-order:stroke]" strokeWidth="3" vectorEffect="non-scaling-stroke">
            {`${label}${sign ? ` ${sign}` : ''}`}
          </text>
        ) : null}
      </g>
    );
  });
}
