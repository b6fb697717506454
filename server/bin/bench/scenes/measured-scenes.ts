import type { Point } from '../../../../shared/walls/homography.ts';
import type { Mark } from '../../../../shared/walls/marks.ts';

/**
 * A camera before a wall (z = 0, x right, y up, mm): where it stands, what it looks at, its roll, its focal length and
 * the two radial terms by which its lens differs from a pinhole (Brown 1966: r·(1 + k1·r² + k2·r⁴), r the tangent of the
 * angle to the axis). This is not the model that the product fits, so that a fit is not judged by its own kind.
 */
export interface SceneCamera {
  at: readonly [number, number, number];
  lookAt: readonly [number, number, number];
  rollDegrees: number;
  focalPx: number;
  k1: number;
  k2: number;
  photo: { widthPx: number; heightPx: number };
}

export interface MeasuredScene {
  name: string;
  camera: SceneCamera;
  wall: { widthMm: number; heightMm: number };
  /** Standard deviation of a mark on the photo, px. */
  noisePx: number;
  /** Four marks, and four more. */
  fourMm: Point[];
  moreMm: Point[];
  /** Straight things: both ends on the wall, mm. */
  edgesMm: [Point, Point][];
}

const at = (x: number, y: number): Point => ({ x, y });
const wall = { widthMm: 4000, heightMm: 2400 };
const fourMm = [at(700, 500), at(3300, 500), at(3300, 2000), at(700, 2000)];
const moreMm = [at(2000, 450), at(2000, 2050), at(650, 1250), at(3350, 1250)];
const edgesMm: [Point, Point][] = [[at(150, 120), at(3850, 120)], [at(150, 2300), at(3850, 2300)], [at(250, 100), at(250, 2300)], [at(3700, 100), at(3700, 2300)]];
const level: SceneCamera = { at: [2000, 1300, 3600], lookAt: [2000, 1200, 0], rollDegrees: 0.6, focalPx: 3050, k1: 0, k2: 0, photo: { widthPx: 4032, heightPx: 3024 } };

/** A camera turned about the wall's middle by so many degrees from straight on. */
const oblique = (degrees: number): SceneCamera => {
  const a = (degrees * Math.PI) / 180;
  return { ...level, at: [2000 + 3900 * Math.sin(a), 1350, 3900 * Math.cos(a)] };
};

const scene = (name: string, camera: SceneCamera, more: Partial<MeasuredScene> = {}): MeasuredScene => ({ name, camera, wall, noisePx: 0.7, fourMm, moreMm, edgesMm, ...more });

export const measuredScenes: readonly MeasuredScene[] = [
  scene('frontal', level),
  scene('oblique 20°', oblique(20)),
  scene('oblique 40°', oblique(40)),
  scene('portrait', { ...level, photo: { widthPx: 3024, heightPx: 4032 }, at: [1300, 1300, 3400], lookAt: [1250, 1250, 0] }, {
    wall: { widthMm: 2500, heightMm: 2600 },
    fourMm: [at(400, 400), at(2100, 400), at(2100, 2200), at(400, 2200)],
    moreMm: [at(1250, 380), at(1250, 2250), at(380, 1300), at(2150, 1300)],
    edgesMm: [[at(100, 100), at(2400, 100)], [at(100, 2500), at(2400, 2500)], [at(150, 100), at(150, 2500)], [at(2350, 100), at(2350, 2500)]],
  }),
  scene('barrel', { ...level, at: [2100, 1350, 3300], k1: -0.12, k2: 0.02 }),
  scene('wide angle', { ...level, at: [1900, 1350, 2100], focalPx: 1750, k1: -0.14, k2: 0.016 }),
];

/** Pixel (y down, outer corner of the first at 0, 0) of a wall point. */
export function seen(camera: SceneCamera, p: Point): Point {
  const forward = unit([0, 1, 2].map((i) => camera.lookAt[i]! - camera.at[i]!));
  const levelWise = unit(cross(forward, [0, 1, 0]));
  const plumb = cross(levelWise, forward);
  const roll = (camera.rollDegrees * Math.PI) / 180;
  const right = levelWise.map((v, i) => v * Math.cos(roll) - plumb[i]! * Math.sin(roll));
  const up = levelWise.map((v, i) => v * Math.sin(roll) + plumb[i]! * Math.cos(roll));
  const ray = [p.x - camera.at[0], p.y - camera.at[1], -camera.at[2]];
  const depth = dot(ray, forward);
  const [x, y] = [dot(ray, right) / depth, -dot(ray, up) / depth];
  const rr = x * x + y * y;
  const by = camera.focalPx * (1 + camera.k1 * rr + camera.k2 * rr * rr);
  return { x: camera.photo.widthPx / 2 + x * by, y: camera.photo.heightPx / 2 + y * by };
}

/** Marks set with the scene's unsteady hand. */
export function marksAt(s: MeasuredScene, places: readonly Point[], chance: () => number): Mark[] {
  return places.map((mm) => ({ mm, px: shaken(seen(s.camera, mm), s.noisePx, chance) }));
}

/** The scene's straight things as a hand marks them: so many points each, on the photo alone; those off it are left out. */
export function edgesMarked(s: MeasuredScene, count: number, chance: () => number): Point[][] {
  return s.edgesMm
    .map(([a, b]) =>
      Array.from({ length: count }, (_, i) => at(a.x + ((b.x - a.x) * i) / (count - 1), a.y + ((b.y - a.y) * i) / (count - 1)))
        .map((p) => shaken(seen(s.camera, p), s.noisePx, chance))
        .filter((p) => isOn(s, p)),
    )
    .filter((e) => e.length >= 4);
}

/** Wall points that take no part in the fit, every 200 mm, as far as the photo shows them. */
export function heldBack(s: MeasuredScene): Point[] {
  const points: Point[] = [];
  for (let y = 100; y < s.wall.heightMm; y += 200) for (let x = 100; x < s.wall.widthMm; x += 200) points.push(at(x, y));
  return points.filter((p) => isOn(s, seen(s.camera, p)));
}

const isOn = (s: MeasuredScene, p: Point) => p.x >= 0 && p.y >= 0 && p.x <= s.camera.photo.widthPx && p.y <= s.camera.photo.heightPx;

function shaken(p: Point, spread: number, chance: () => number): Point {
  // Box and Muller 1958.
  const r = spread * Math.sqrt(-2 * Math.log(1 - chance()));
  const a = 2 * Math.PI * chance();
  return { x: p.x + r * Math.cos(a), y: p.y + r * Math.sin(a) };
}

/** Numbers in [0, 1) that are the same for the same seed (a 32-bit congruential generator, Numerical Recipes; its upper bits). */
export function seeded(seed: number): () => number {
  let s = seed >>> 0;
  const next = () => (s = (Math.imul(s, 1664525) + 1013904223) >>> 0);
  return () => ((next() >>> 5) * 67108864 + (next() >>> 6)) / 9007199254740992;
}

const dot = (a: readonly number[], b: readonly number[]) => a.reduce((s, v, i) => s + v * b[i]!, 0);
const cross = (a: readonly number[], b: readonly number[]) => [a[1]! * b[2]! - a[2]! * b[1]!, a[2]! * b[0]! - a[0]! * b[2]!, a[0]! * b[1]! - a[1]! * b[0]!];
const unit = (a: readonly number[]) => a.map((v) => v / Math.hypot(...a));
