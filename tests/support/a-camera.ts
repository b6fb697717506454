import type { Point } from '../../shared/walls/homography.ts';

/** A pinhole camera before a wall (z = 0), for tests: where it stands, what it looks at, its roll. 4000 × 3000 px. */
export interface Camera {
  at: readonly [number, number, number];
  lookAt: readonly [number, number, number];
  rollDegrees: number;
}

export function aCamera(change: Partial<Camera> = {}): Camera {
  return { at: [1500, 1200, 3000], lookAt: [1500, 1200, 0], rollDegrees: 0, ...change };
}

export const photoSize = { widthPx: 4000, heightPx: 3000 };
const focalPx = 3000;

/** Pixel (y down, outer corner of the first pixel at 0, 0) of a wall point (mm, y up), by similar triangles. */
export function seenBy(camera: Camera, wall: Point): Point {
  const forward = unit([0, 1, 2].map((i) => camera.lookAt[i]! - camera.at[i]!));
  const level = unit(cross(forward, [0, 1, 0]));
  const plumb = cross(level, forward);
  const roll = (camera.rollDegrees * Math.PI) / 180;
  const right = level.map((v, i) => v * Math.cos(roll) - plumb[i]! * Math.sin(roll));
  const up = level.map((v, i) => v * Math.sin(roll) + plumb[i]! * Math.cos(roll));
  const ray = [wall.x - camera.at[0], wall.y - camera.at[1], -camera.at[2]];
  const depth = dot(ray, forward);
  return { x: photoSize.widthPx / 2 + (focalPx * dot(ray, right)) / depth, y: photoSize.heightPx / 2 - (focalPx * dot(ray, up)) / depth };
}

const dot = (a: readonly number[], b: readonly number[]) => a.reduce((s, v, i) => s + v * b[i]!, 0);
const cross = (a: readonly number[], b: readonly number[]) => [a[1]! * b[2]! - a[2]! * b[1]!, a[2]! * b[0]! - a[0]! * b[2]!, a[0]! * b[1]! - a[1]! * b[0]!];
const unit = (a: readonly number[]) => a.map((v) => v / Math.hypot(...a));
