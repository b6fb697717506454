/**
 * The pinhole camera that both the ray tracer and the mark projection use.
 *
 * Wall frame: origin at the wall's lower left corner at finished floor, x right, y up, z out of the wall
 * towards the camera, mm. Photo frame: u right, v down, in pixels, with (0, 0) at the outer corner of the
 * top left pixel, so that the centre of that pixel is (0.5, 0.5).
 */

export type Point3 = readonly [number, number, number];
export type Point2 = readonly [number, number];

export interface CameraDescription {
  /** Where the lens stands, mm. */
  readonly at: Point3;
  /** The point that falls on the middle of the photo, mm. */
  readonly lookAt: Point3;
  /** Clockwise turn of the phone as seen from behind it, degrees. */
  readonly rollDegrees: number;
  /** Angle of view across the long (upright: horizontal) side, degrees. */
  readonly fieldDegrees: number;
}

export interface PhotoSize {
  readonly width: number;
  readonly height: number;
}

export interface Pinhole {
  readonly at: Point3;
  readonly forward: Point3;
  readonly right: Point3;
  readonly up: Point3;
  /** Focal length in pixels. */
  readonly focal: number;
  readonly photo: PhotoSize;
}

const subtract = (a: Point3, b: Point3): Point3 => [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
const dot = (a: Point3, b: Point3): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
const cross = (a: Point3, b: Point3): Point3 => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
];
const blend = (a: Point3, s: number, b: Point3, t: number): Point3 => [
  a[0] * s + b[0] * t,
  a[1] * s + b[1] * t,
  a[2] * s + b[2] * t,
];
const unit = (a: Point3): Point3 => blend(a, 1 / Math.hypot(...a), a, 0);

/** The camera's axes (unit vectors in the wall frame) and focal length (px) for a photo of the given size. */
export function pinholeOf(camera: CameraDescription, photo: PhotoSize): Pinhole {
  const forward = unit(subtract(camera.lookAt, camera.at));
  const level = unit(cross(forward, [0, 1, 0]));
  const plumb = cross(level, forward);
  const roll = (camera.rollDegrees * Math.PI) / 180;
  return {
    at: camera.at,
    forward,
    right: blend(level, Math.cos(roll), plumb, -Math.sin(roll)),
    up: blend(level, Math.sin(roll), plumb, Math.cos(roll)),
    focal: photo.width / 2 / Math.tan((camera.fieldDegrees * Math.PI) / 360),
    photo,
  };
}

/** Pixel of a point given in the wall frame (mm). The point must lie in front of the camera. */
export function projectPoint(camera: Pinhole, point: Point3): Point2 {
  const ray = subtract(point, camera.at);
  const depth = dot(ray, camera.forward);
  if (depth <= 0) throw new RangeError('The point lies behind the camera.');
  return [
    camera.photo.width / 2 + (camera.focal * dot(ray, camera.right)) / depth,
    camera.photo.height / 2 - (camera.focal * dot(ray, camera.up)) / depth,
  ];
}

/** Where the line of sight through a pixel meets the wall plane: wall position (mm) and depth along the axis (mm). */
export function meetWall(camera: Pinhole, pixel: Point2): { wall: Point2; depth: number } {
  const across = (pixel[0] - camera.photo.width / 2) / camera.focal;
  const down = (pixel[1] - camera.photo.height / 2) / camera.focal;
  const ray = blend(camera.forward, 1, blend(camera.right, across, camera.up, -down), 1);
  const depth = -camera.at[2] / ray[2];
  return { wall: [camera.at[0] + depth * ray[0], camera.at[1] + depth * ray[1]], depth };
}

/** Angle between the camera's axis and the wall's normal, degrees. */
export function obliquityDegrees(camera: Pinhole): number {
  return (Math.acos(-camera.forward[2]) * 180) / Math.PI;
}
