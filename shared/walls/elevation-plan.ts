import { applyHomography, depthSign, homographyFrom, magnification, type Homography, type Point } from './homography.ts';
import { lensMagnification, undistorted, type LensTerm } from './lens.ts';
import type { Mark } from './marks.ts';

/** What a straightened picture shows and how finely. */
export interface ElevationPlan {
  /** Rectangle of the wall shown, mm. */
  leftMm: number;
  bottomMm: number;
  widthMm: number;
  heightMm: number;
  /** Scale and size of the picture; a pixel (i, j) counts from the picture's upper left corner. */
  pxPerMm: number;
  widthPx: number;
  heightPx: number;
  /** The finest the photo itself resolves the wall within the rectangle, px of the photo per mm. */
  photoPxPerMm: number;
  /** From the wall (mm) to the upright photo as a perfect lens shows it (px, outer corner of the top left pixel at 0, 0). */
  wallToPhoto: Homography;
  /** What the lens did to that; null where nobody knows. */
  lens: LensTerm | null;
}

/** No finer than this, px per mm: past it the file grows and a tape's error does not shrink. */
const finestPxPerMm = 1.5;
/** A picture of at most this many pixels, and no longer than this on a side, which every browser can show. */
const mostPixels = 30e6;
const longestSidePx = 16_000;

/**
 * Decides the wall rectangle that the straightened photo shows (the wall, less what the photo does not reach, to
 * whole mm) and its scale: as fine as the photo is there, no finer than 1.5 px per mm, no more than 30 megapixels.
 * Returns null where the photo shows nothing of the wall. Judge the marks with `marksTrouble` first.
 */
export function elevationPlan(
  marks: readonly Mark[],
  photo: { widthPx: number; heightPx: number },
  wall: { widthMm: number; heightMm: number },
): ElevationPlan | null {
  const wallToPhoto = homographyFrom(marks.map((m) => ({ from: m.mm, to: m.px })));
  return elevationPlanOf({ wallToPhoto, lens: null }, marks[0]?.mm ?? { x: 0, y: 0 }, photo, wall);
}

/** The same by a camera that was fitted, with its lens; `onWall` is a point of the wall that the photo shows, a mark for instance. */
export function elevationPlanOf(
  fitted: { wallToPhoto: Homography; lens: LensTerm | null },
  onWall: Point,
  photo: { widthPx: number; heightPx: number },
  wall: { widthMm: number; heightMm: number },
): ElevationPlan | null {
  const { lens } = fitted;
  const wallToPhoto = facing(fitted.wallToPhoto, onWall);
  const seen = seenPart(wallToPhoto, reachOf(photo, lens), wall);
  if (seen.length < 3) return null;
  const leftMm = Math.floor(Math.min(...seen.map((p) => p.x)) + 1e-6);
  const bottomMm = Math.floor(Math.min(...seen.map((p) => p.y)) + 1e-6);
  const rightMm = Math.min(wall.widthMm, Math.ceil(Math.max(...seen.map((p) => p.x)) - 1e-6));
  const topMm = Math.min(wall.heightMm, Math.ceil(Math.max(...seen.map((p) => p.y)) - 1e-6));
  const widthMm = rightMm - leftMm;
  const heightMm = topMm - bottomMm;
  if (widthMm <= 0 || heightMm <= 0) return null;
  const finest = (p: Point) => magnification(wallToPhoto, p) * (lens ? lensMagnification(lens, applyHomography(wallToPhoto, p)) : 1);
  const middle = { x: leftMm + widthMm / 2, y: bottomMm + heightMm / 2 };
  const photoPxPerMm = Math.max(...(lens ? [...seen, middle] : seen).map(finest));
  const pxPerMm = Math.min(
    photoPxPerMm,
    finestPxPerMm,
    Math.sqrt(mostPixels / (widthMm * heightMm)),
    longestSidePx / Math.max(widthMm, heightMm),
  );
  // The picture's size is whole; its scale is kept exact and the rectangle's last part of a pixel is lost at right and foot.
  return {
    leftMm, bottomMm, widthMm, heightMm, pxPerMm, photoPxPerMm, wallToPhoto, lens,
    widthPx: Math.max(1, Math.round(widthMm * pxPerMm)),
    heightPx: Math.max(1, Math.round(heightMm * pxPerMm)),
  };
}

/** The map from a pixel of the picture (continuous, upper left corner 0, 0) to the upright photo as a perfect lens shows it (px). */
export function elevationToPhoto(plan: Pick<ElevationPlan, 'leftMm' | 'bottomMm' | 'heightMm' | 'pxPerMm' | 'wallToPhoto'>): Homography {
  const h = plan.wallToPhoto;
  const s = 1 / plan.pxPerMm;
  const top = plan.bottomMm + plan.heightMm;
  // x = left + s·i, y = top − s·j, put into each row of the map.
  const row = (a: number, b: number, c: number): [number, number, number] => [a * s, -b * s, a * plan.leftMm + b * top + c];
  return [...row(h[0], h[1], h[2]), ...row(h[3], h[4], h[5]), ...row(h[6], h[7], h[8])];
}

/** The same map with its third coordinate above nought at a point that is seen, hence on all of the wall before the camera. */
function facing(h: Homography, seen: Point): Homography {
  return depthSign(h, seen) < 0 ? (h.map((v) => -v) as unknown as Homography) : h;
}

interface Reach { left: number; top: number; right: number; bottom: number }

/** The rectangle within which the photo's own edges come to lie without the lens, px. */
function reachOf({ widthPx, heightPx }: { widthPx: number; heightPx: number }, lens: LensTerm | null): Reach {
  if (!lens) return { left: 0, top: 0, right: widthPx, bottom: heightPx };
  const steps = Array.from({ length: 17 }, (_, i) => i / 16);
  const rim = steps.flatMap((t) => [{ x: t * widthPx, y: 0 }, { x: t * widthPx, y: heightPx }, { x: 0, y: t * heightPx }, { x: widthPx, y: t * heightPx }]).map((p) => undistorted(lens, p));
  const xs = rim.map((p) => p.x);
  const ys = rim.map((p) => p.y);
  return { left: Math.min(...xs), top: Math.min(...ys), right: Math.max(...xs), bottom: Math.max(...ys) };
}

/**
 * The part of the wall that the photo shows, mm: the wall's rectangle cut by the photo's four edges and by the horizon.
 * In homogeneous coordinates (X, Y, W) of the photo each of these is a straight line on the wall: X ≥ left·W, X ≤ right·W,
 * and so on; W, the distance along the lens's axis, is kept above a hundredth of the wall's farthest.
 */
function seenPart(h: Homography, reach: Reach, wall: { widthMm: number; heightMm: number }): Point[] {
  const corners: Point[] = [
    { x: 0, y: 0 }, { x: wall.widthMm, y: 0 }, { x: wall.widthMm, y: wall.heightMm }, { x: 0, y: wall.heightMm },
  ];
  const X = (p: Point) => h[0] * p.x + h[1] * p.y + h[2];
  const Y = (p: Point) => h[3] * p.x + h[4] * p.y + h[5];
  const W = (p: Point) => depthSign(h, p);
  const least = 0.01 * Math.max(...corners.map(W), 0);
  const sides: ((p: Point) => number)[] = [
    (p) => W(p) - least,
    (p) => X(p) - reach.left * W(p),
    (p) => reach.right * W(p) - X(p),
    (p) => Y(p) - reach.top * W(p),
    (p) => reach.bottom * W(p) - Y(p),
  ];
  return sides.reduce(cut, corners);
}

/** What of a convex outline lies where `inside` (linear in x and y) is not below nought. */
function cut(outline: Point[], inside: (p: Point) => number): Point[] {
  return outline.flatMap((a, i) => {
    const b = outline[(i + 1) % outline.length] ?? a;
    const da = inside(a);
    const db = inside(b);
    const kept = da >= 0 ? [a] : [];
    if (da >= 0 === db >= 0) return kept;
    const t = da / (da - db);
    return [...kept, { x: a.x + t * (b.x - a.x), y: a.y + t * (b.y - a.y) }];
  });
}
