import { EigenvalueDecomposition, Matrix, solve } from 'ml-matrix';

export interface LeastSquares {
  parameters: number[];
  residuals: number[];
  /** Rows are residuals, columns are parameters. */
  jacobian: number[][];
  /** Sum of the squared residuals. */
  sum: number;
}

/**
 * Levenberg–Marquardt (Marquardt 1963: the diagonal of the normal matrix is what damps) on residuals of unit variance,
 * with slopes by central differences. Parameters should be of the order of one. Parameters listed in `held` stay put;
 * their slopes are worked out all the same.
 */
export function leastSquares(residualsOf: (parameters: readonly number[]) => number[], start: readonly number[], held: readonly number[] = [], rounds = 60): LeastSquares {
  const free = start.map((_, i) => i).filter((i) => !held.includes(i));
  let parameters = [...start];
  let residuals = residualsOf(parameters);
  let sum = sumOfSquares(residuals);
  let damping = 1e-4;
  for (let round = 0; round < rounds && damping < 1e12; round++) {
    const slopes = slopesOf(residualsOf, parameters);
    const normal = Matrix.zeros(free.length, free.length);
    const gradient = Matrix.zeros(free.length, 1);
    for (let k = 0; k < residuals.length; k++) {
      const row = slopes[k] ?? [];
      free.forEach((i, a) => {
        gradient.set(a, 0, gradient.get(a, 0) - (row[i] ?? 0) * (residuals[k] ?? 0));
        free.forEach((j, b) => normal.set(a, b, normal.get(a, b) + (row[i] ?? 0) * (row[j] ?? 0)));
      });
    }
    let better = false;
    let settled = false;
    while (!better && damping < 1e12) {
      const damped = normal.clone();
      free.forEach((_, a) => damped.set(a, a, normal.get(a, a) * (1 + damping) + 1e-12));
      const step = solve(damped, gradient);
      const tried = [...parameters];
      free.forEach((i, a) => (tried[i] = (tried[i] ?? 0) + step.get(a, 0)));
      const now = residualsOf(tried);
      const nowSum = sumOfSquares(now);
      if (nowSum < sum) {
        better = true;
        settled = sum - nowSum < 1e-10 * (sum + 1e-12);
        [parameters, residuals, sum] = [tried, now, nowSum];
        damping = Math.max(damping / 10, 1e-12);
      } else damping *= 10;
    }
    if (!better || settled || sum < 1e-18) break;
  }
  return { parameters, residuals, sum, jacobian: slopesOf(residualsOf, parameters) };
}

/** Below this part of the largest, what a set of measures says in some direction is nothing but rounding. */
const nothing = 1e-11;

/**
 * The covariance of the parameters in `free` (others get nought) for residuals of unit variance; null where the residuals
 * leave some direction free. Each parameter is first scaled by what is known of it, so that units do not matter.
 */
export function covarianceOf(jacobian: readonly (readonly number[])[], free: readonly number[], count: number): number[][] | null {
  const sizes = free.map((i) => Math.sqrt(jacobian.reduce((s, row) => s + row[i]! * row[i]!, 0)));
  if (!sizes.every((v) => Number.isFinite(v) && v > 0)) return null;
  const j = new Matrix(jacobian.map((row) => free.map((i, a) => row[i]! / sizes[a]!)));
  const { realEigenvalues: known, eigenvectorMatrix: ways } = new EigenvalueDecomposition(j.transpose().mmul(j), { assumeSymmetric: true });
  if (Math.min(...known) < nothing * Math.max(...known)) return null;
  const all = Array.from({ length: count }, () => new Array<number>(count).fill(0));
  free.forEach((i, a) => free.forEach((k, b) => {
    all[i]![k] = known.reduce((s, v, w) => s + (ways.get(a, w) * ways.get(b, w)) / v, 0) / (sizes[a]! * sizes[b]!);
  }));
  return all;
}

function slopesOf(residualsOf: (p: readonly number[]) => number[], at: readonly number[]): number[][] {
  const columns = at.map((v, i) => {
    const step = 1e-6 * Math.max(1, Math.abs(v));
    const above = residualsOf(at.map((w, k) => (k === i ? w + step : w)));
    const below = residualsOf(at.map((w, k) => (k === i ? w - step : w)));
    return above.map((r, k) => (r - (below[k] ?? 0)) / (2 * step));
  });
  return (columns[0] ?? []).map((_, k) => columns.map((c) => c[k] ?? 0));
}

/** Not finite counts as infinitely bad, so that no step ever ends there. */
function sumOfSquares(values: readonly number[]): number {
  const sum = values.reduce((s, v) => s + v * v, 0);
  return Number.isFinite(sum) ? sum : Infinity;
}
