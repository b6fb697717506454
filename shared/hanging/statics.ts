import { STANDARD_GRAVITY } from '../units/constants.ts';

/** A frame with its contents, or several screwed into one, as it hangs. Wall coordinates in mm: x right, y up, z out of the wall. */
export interface HungBody {
  massKg: number;
  /** Centre of mass; z from the wall's face. */
  centre: { x: number; y: number; z: number };
  /** Lowest point of the outline that leans on the wall. */
  bearingYMm: number;
  hangers: readonly { id: string; x: number; y: number }[];
}

/** What one hanger takes, N. */
export interface HangerLoad {
  id: string;
  /** Force on the hanger in the wall plane, and its size. */
  shear: { x: number; y: number };
  shearN: number;
  /** Pull straight out of the wall. */
  tensionN: number;
  resultantN: number;
  /** Between wall and resultant, rad: 0 along the wall, π/2 straight out. */
  angleRad: number;
}

/**
 * held: balanced as drawn. turns: one hanger, so it turns until its centre is below. unstable: one hanger, not above the centre.
 * tips: no hanger above the line it leans on. not held: no hanger.
 */
export type HangingState = 'held' | 'turns' | 'unstable' | 'tips' | 'not held';

export interface Hanging {
  state: HangingState;
  weightN: number;
  /** Turn (rad, counter-clockwise) that a body on one hanger makes by itself; 0 when several hold it. */
  outOfLevelRad: number;
  hangers: HangerLoad[];
  /** Where the body leans on the wall, and how hard. */
  bearing: { forceN: number; xMm: number; yMm: number };
  /** What balance leaves over, as a share of the forces and moments at work; 0 but for rounding. */
  residual: number;
}

/** Out of plumb that a body on one hanger may be drawn with and still counts as level, mm (shop practice). */
export const plumbToleranceMm = 3;

/**
 * Loads on the hangers of one rigid body.
 * In the wall plane: the elastic (vector) method, equal stiffness, W/n and a share of the moment about the hangers' centroid in
 * proportion to distance. Out of it: T_i = W z h_i / Σh², h above the lowest bearing point. Source: the elastic method for fastener
 * groups as in machine-design textbooks (Bhandari, Design of Machine Elements, ch. 7).
 * Hangers at one and the same place hold no moment and count as one.
 */
export function hang(body: HungBody): Hanging {
  const { hangers, centre } = body;
  const n = hangers.length;
  const weightN = body.massKg * STANDARD_GRAVITY;
  const nowhere = { forceN: 0, xMm: centre.x, yMm: body.bearingYMm };
  if (n === 0) return { state: 'not held', weightN, outOfLevelRad: 0, hangers: [], bearing: nowhere, residual: 1 };

  const mean = { x: sum(hangers.map((h) => h.x)) / n, y: sum(hangers.map((h) => h.y)) / n };
  const arms = hangers.map((h) => ({ x: h.x - mean.x, y: h.y - mean.y }));
  const polar = sum(arms.map((a) => a.x ** 2 + a.y ** 2));
  const single = polar < 1e-6;
  const aside = centre.x - mean.x;
  // One hanger holds no moment: it turns until there is none.
  const moment = single ? 0 : -weightN * aside;
  const shears = arms.map((a) => ({
    x: single ? 0 : (-moment * a.y) / polar,
    y: -weightN / n + (single ? 0 : (moment * a.x) / polar),
  }));

  const prying = weightN * centre.z;
  const levers = hangers.map((h) => Math.max(0, h.y - body.bearingYMm));
  const square = sum(levers.map((h) => h ** 2));
  const tips = square < 1e-6 && prying > 0;
  const tensions = levers.map((h) => (square < 1e-6 ? 0 : (prying * h) / square));

  const loads = hangers.map((h, i) => load(h.id, shears[i] ?? { x: 0, y: 0 }, tensions[i] ?? 0));
  const forceN = sum(tensions);
  const outOfLevelRad = single ? turnUntilPlumb(mean, centre) : 0;
  return {
    state: stateOf(single, tips, aside, mean.y - centre.y),
    weightN,
    outOfLevelRad,
    hangers: loads,
    bearing: forceN > 0 ? { forceN, xMm: sum(hangers.map((h, i) => h.x * (tensions[i] ?? 0))) / forceN, yMm: body.bearingYMm } : nowhere,
    residual: residual(),
  };

  function residual(): number {
    const down = sum(shears.map((v) => v.y)) + weightN;
    const across = sum(shears.map((v) => v.x));
    const turned = arms.map((a, i) => a.x * (shears[i]?.y ?? 0) - a.y * (shears[i]?.x ?? 0));
    const leaning = levers.map((h, i) => h * (tensions[i] ?? 0));
    const forces = sum(shears.map((v) => Math.hypot(v.x, v.y))) + weightN;
    const moments = sum(arms.map((a, i) => Math.hypot(a.x, a.y) * Math.hypot(shears[i]?.x ?? 0, shears[i]?.y ?? 0))) + Math.abs(moment);
    return Math.max(
      share(Math.hypot(down, across), forces),
      share(Math.abs(sum(turned) - moment), moments),
      share(Math.abs(sum(leaning) - prying), prying),
    );
  }
}

/** Several frames screwed to one another, as one rigid body. Throws when there are none. */
export function joinBodies(bodies: readonly HungBody[]): HungBody {
  if (bodies.length === 0) throw new RangeError('A hung group has at least one frame.');
  const massKg = sum(bodies.map((b) => b.massKg));
  // A group without mass still has a middle.
  const weight = (b: HungBody) => (massKg > 0 ? b.massKg / massKg : 1 / bodies.length);
  const mean = (of: (b: HungBody) => number) => sum(bodies.map((b) => weight(b) * of(b)));
  return {
    massKg,
    centre: { x: mean((b) => b.centre.x), y: mean((b) => b.centre.y), z: mean((b) => b.centre.z) },
    bearingYMm: Math.min(...bodies.map((b) => b.bearingYMm)),
    hangers: bodies.flatMap((b) => b.hangers),
  };
}

function load(id: string, shear: { x: number; y: number }, tensionN: number): HangerLoad {
  const shearN = Math.hypot(shear.x, shear.y);
  return { id, shear, shearN, tensionN, resultantN: Math.hypot(shearN, tensionN), angleRad: Math.atan2(tensionN, shearN) };
}

/** Counter-clockwise turn about the hanger that brings the centre straight below it. */
function turnUntilPlumb(hanger: { x: number; y: number }, centre: { x: number; y: number }): number {
  return -Math.atan2(centre.x - hanger.x, hanger.y - centre.y);
}

function stateOf(single: boolean, tips: boolean, aside: number, above: number): HangingState {
  if (single && above <= 0) return 'unstable';
  if (tips) return 'tips';
  return single && Math.abs(aside) > plumbToleranceMm ? 'turns' : 'held';
}

const sum = (values: readonly number[]): number => values.reduce((a, b) => a + b, 0);
const share = (part: number, whole: number): number => (whole === 0 ? 0 : part / whole);
