import { EigenvalueDecomposition, Matrix, solve } from 'ml-matrix';
import type { Point } from './homography.ts';
import type { Knowledge, TrueLine } from './knowledge.ts';
import { usualFocal } from './observations.ts';
import { straight, type CameraFrame } from './wall-camera.ts';

type Vector = [number, number, number];

/**
 * A first camera where no four marks are known: the vanishing points of the level and the plumb lines give the map's
 * first two columns, the frame's middle (the first mark) seen at `anchor` the third, lengths the two scales; where the
 * lengths cannot part the scales, a pinhole of focal length `focal` (half diagonals), or that of the two vanishing points.
 * Returns null where the lines tell no such camera.
 */
export function cameraFromLines(k: Pick<Knowledge, 'lines' | 'lengths' | 'marks'>, f: CameraFrame, focal: number | null): number[] | null {
  const anchor = k.marks[0];
  if (!anchor) return null;
  const level = vanishing(k.lines.filter((l) => l.direction === 'level'), f);
  const plumb = vanishing(k.lines.filter((l) => l.direction === 'plumb'), f);
  const at = straight(f, 0, anchor.px);
  const o: Vector = [at.x, at.y, 1];
  const towards = (v: Vector) => ({ x: v[0] - at.x * v[2], y: v[1] - at.y * v[2] });
  const h1 = towards(level).x < 0 ? negated(level) : level;
  const h2 = towards(plumb).y > 0 ? negated(plumb) : plumb;
  const basis = new Matrix([0, 1, 2].map((i) => [h1[i]!, h2[i]!, o[i]!]));
  if (Math.abs(determinant(h1, h2, o)) < 1e-6) return null;
  const plain = (p: Point): Point => {
    const u = straight(f, 0, p);
    const s = solve(basis, Matrix.columnVector([u.x, u.y, 1]));
    return { x: s.get(0, 0) / s.get(2, 0), y: s.get(1, 0) / s.get(2, 0) };
  };
  const spans = [
    ...k.lengths.map((l) => ({ from: plain(l.px[0]), to: plain(l.px[1]), length: l.mm / f.scaleMm })),
    ...k.marks.slice(1).map((m) => ({ from: { x: 0, y: 0 }, to: plain(m.px), length: Math.hypot(m.mm.x - anchor.mm.x, m.mm.y - anchor.mm.y) / f.scaleMm })),
  ].map((s) => ({ xx: (s.to.x - s.from.x) ** 2, yy: (s.to.y - s.from.y) ** 2, ll: s.length ** 2 }));
  const scales = scalesOf(spans) ?? pinholeScales(spans, h1, h2, focal);
  if (!scales) return null;
  const [a, b] = scales;
  return [h1[0] / a, h2[0] / b, o[0], h1[1] / a, h2[1] / b, o[1], h1[2] / a, h2[2] / b, 0];
}

interface Span { xx: number; yy: number; ll: number }

/** Scales of both axes from lengths alone: a²·dx² + b²·dy² = l² for each, where they lie differently enough. */
function scalesOf(spans: readonly Span[]): [number, number] | null {
  if (spans.length < 2) return null;
  const rows = spans.map((s) => [s.xx / s.ll, s.yy / s.ll]);
  const m = new Matrix(rows);
  const normal = m.transpose().mmul(m);
  const det = normal.get(0, 0) * normal.get(1, 1) - normal.get(0, 1) ** 2;
  if (!(det > 1e-4 * normal.get(0, 0) * normal.get(1, 1))) return null;
  const s = solve(normal, m.transpose().mmul(Matrix.columnVector(rows.map(() => 1))));
  const [aa, bb] = [s.get(0, 0), s.get(1, 0)];
  return aa > 0 && bb > 0 ? [Math.sqrt(aa), Math.sqrt(bb)] : null;
}

/** Scales from a pinhole's rule that |h₁/a| = |h₂/b|, and the lengths' sum. */
function pinholeScales(spans: readonly Span[], h1: Vector, h2: Vector, told: number | null): [number, number] | null {
  const crossed = -(h1[0] * h2[0] + h1[1] * h2[1]) / (h1[2] * h2[2]);
  const focal = told ?? (crossed > 0.1 && crossed < 100 ? Math.sqrt(crossed) : usualFocal);
  const size = (h: Vector) => Math.sqrt((h[0] ** 2 + h[1] ** 2) / focal ** 2 + h[2] ** 2);
  const ratio = size(h2) / size(h1);
  const weight = spans.reduce((t, s) => t + s.xx + ratio ** 2 * s.yy, 0);
  const total = spans.reduce((t, s) => t + s.ll, 0);
  if (!(weight > 0 && total > 0)) return null;
  const a = Math.sqrt(total / weight);
  return [a, a * ratio];
}

/** Where lines meet, as a unit vector in the frame's units: least squares over their own unit vectors. */
function vanishing(lines: readonly TrueLine[], f: CameraFrame): Vector {
  const sum = Matrix.zeros(3, 3);
  for (const { px } of lines) {
    const [p, q] = px.map((e) => straight(f, 0, e)) as [Point, Point];
    const line: Vector = [p.y - q.y, q.x - p.x, p.x * q.y - q.x * p.y];
    const by = 1 / (Math.hypot(line[0], line[1]) || 1);
    const long = Math.hypot(p.x - q.x, p.y - q.y);
    const v = Matrix.columnVector(line.map((x) => x * by * long));
    sum.add(v.mmul(v.transpose()));
  }
  const eigen = new EigenvalueDecomposition(sum, { assumeSymmetric: true });
  const least = eigen.realEigenvalues.indexOf(Math.min(...eigen.realEigenvalues));
  const [x = 0, y = 0, z = 0] = eigen.eigenvectorMatrix.getColumn(least);
  return [x, y, z];
}

const negated = (v: Vector): Vector => [-v[0], -v[1], -v[2]];

function determinant(a: Vector, b: Vector, c: Vector): number {
  return a[0] * (b[1] * c[2] - c[1] * b[2]) - b[0] * (a[1] * c[2] - c[1] * a[2]) + c[0] * (a[1] * b[2] - b[1] * a[2]);
}
