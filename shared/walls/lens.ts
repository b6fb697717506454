import type { Point } from './homography.ts';

/**
 * One radial term of a lens, by the division model (Fitzgibbon, "Simultaneous linear estimation of multiple view
 * geometry and lens distortion", 2001): a photo's point at radius r from the picture's centre, in units of `radiusPx`
 * (half the diagonal), belongs at r / (1 + lambda·r²) in a picture without distortion. Below nought: barrel.
 */
export interface LensTerm {
  lambda: number;
  centre: Point;
  radiusPx: number;
}

/** The lens of a photo whose optical axis meets the middle of the picture, with the given term. */
export function lensOf(photo: { widthPx: number; heightPx: number }, lambda: number): LensTerm {
  return { lambda, centre: { x: photo.widthPx / 2, y: photo.heightPx / 2 }, radiusPx: Math.hypot(photo.widthPx, photo.heightPx) / 2 };
}

/** Where a point of the photo (px) would lie had the lens been perfect. */
export function undistorted(lens: LensTerm, p: Point): Point {
  const x = p.x - lens.centre.x;
  const y = p.y - lens.centre.y;
  const by = 1 / (1 + (lens.lambda * (x * x + y * y)) / (lens.radiusPx * lens.radiusPx));
  return { x: lens.centre.x + x * by, y: lens.centre.y + y * by };
}

/**
 * Where the lens puts a point (px) that a perfect lens would have put at `p`: the inverse of `undistorted`, by its
 * quadratic. Not a number where the model reaches no further (a pincushion's rim).
 */
export function distorted(lens: LensTerm, p: Point): Point {
  const x = p.x - lens.centre.x;
  const y = p.y - lens.centre.y;
  const by = stretch(lens.lambda, (x * x + y * y) / (lens.radiusPx * lens.radiusPx));
  return { x: lens.centre.x + x * by, y: lens.centre.y + y * by };
}

/** The factor by which a radius grows from the perfect picture to the photo, at the perfect radius squared `rr`. */
export function stretch(lambda: number, rr: number): number {
  return 2 / (1 + Math.sqrt(1 - 4 * lambda * rr));
}

/** How much the lens magnifies about a point of the perfect picture: square root of the area factor. */
export function lensMagnification(lens: LensTerm, p: Point): number {
  const rr = ((p.x - lens.centre.x) ** 2 + (p.y - lens.centre.y) ** 2) / (lens.radiusPx * lens.radiusPx);
  const along = stretch(lens.lambda, rr);
  // d(r·s)/dr, from r = q / (1 + λq²): dq/dr = (1 + λq²)² / (1 − λq²) with q = r·s.
  const qq = rr * along * along;
  const out = (1 + lens.lambda * qq) ** 2 / (1 - lens.lambda * qq);
  return Math.sqrt(Math.abs(along * out));
}

/** The term as people know it: how far a corner of the photo is out, in hundredths of its distance from the middle. */
export function cornerPercent(lambda: number): number {
  return lambda * 100;
}
