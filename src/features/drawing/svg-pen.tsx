import type { Polygon } from '../../../shared/geometry/polygon.ts';
import { hatchStrokes, type Primitive } from '../../../shared/layouts/drawing.ts';
import { inkLook } from '../../lib/drawing-inks.ts';
import { usePicture } from '../../lib/picture.ts';
import { linePath, ringPath } from './svg-path.ts';

interface Props {
  drawing: readonly Primitive[];
  /** Line weights against those of a large drawing: a thumbnail's are lighter, or lines would hide what they rule. */
  lineShare?: number;
}

/** Draws primitives as SVG, in an element whose units are mm with y turned down. Lines keep their weight at every scale. */
export function SvgPen({ drawing, lineShare = 1 }: Props) {
  return drawing.map((primitive, i) => <Mark key={i} primitive={primitive} lineShare={lineShare} />);
}

function Mark({ primitive: p, lineShare }: { primitive: Primitive; lineShare: number }) {
  if (p.kind === 'picture') return <Picture url={p.url} corners={p.corners} />;
  const { colour, linePx } = inkLook(p.ink);
  const stroke = { fill: 'none', stroke: colour, strokeWidth: linePx * lineShare, vectorEffect: 'non-scaling-stroke', strokeLinejoin: 'round' } as const;
  switch (p.kind) {
    case 'area':
      return <path d={[p.points, ...p.holes].map(ringPath).join('')} fillRule="evenodd" fill={colour} fillOpacity={p.opacity} />;
    case 'line':
      return <path d={p.closed ? ringPath(p.points) : linePath(p.points)} strokeDasharray={p.dashed ? '7 5' : undefined} {...stroke} />;
    case 'hatch':
      return <path d={ringPath(p.points) + hatchStrokes(p.points, p.pitchMm).map(({ from, to }) => linePath([from, to])).join('')} {...stroke} />;
    case 'dot':
      return <circle cx={p.at.x} cy={-p.at.y} r={p.radiusMm} fill={colour} />;
    case 'text':
      return (
        <text x={p.at.x} y={-p.at.y} fontSize={p.sizeMm} fill={colour} textAnchor="middle" dominantBaseline="central" className="font-bold">
          {p.words}
        </text>
      );
  }
}

function Picture({ url, corners }: { url: string; corners: Polygon }) {
  const { src, failed, onError } = usePicture(url);
  if (failed) return null;
  const xs = corners.map(({ x }) => x);
  const ys = corners.map(({ y }) => y);
  const [left, top] = [Math.min(...xs), Math.max(...ys)];
  return <image href={src} onError={onError} x={left} y={-top} width={Math.max(...xs) - left} height={top - Math.min(...ys)} preserveAspectRatio="none" />;
}
