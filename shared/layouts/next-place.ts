import { gapBetween, overlapDepth } from '../geometry/polygon-distance.ts';
import { boxOf, placedAll, sidesOf, type Placement, type Point, type Polygon } from '../geometry/polygon.ts';
import { edgeField, strongestSnap, type Neighbour } from './snap.ts';

export interface NextPlaceAsk {
  /** Outline of the frame to place, about its own centroid. */
  outline: Polygon;
  neighbours: readonly Neighbour[];
  /** The frame to place it beside; the last one placed, or the one chosen. */
  besideId: string | null;
  wall: { widthMm: number; heightMm: number };
  /** Outlines of what stands in the way: taken only where there is no other place. */
  keepClear?: readonly Polygon[];
  revealMm: number;
}

/**
 * Where a frame goes that is placed without a hand: against an edge of the frame named, at the reveal, clear of all
 * others and on the wall, as near to the middle of what hangs there as can be; the middle of the wall where that is
 * free or nothing else is.
 */
export function nextPlace({ outline, neighbours, besideId, wall, keepClear = [], revealMm }: NextPlaceAsk): Placement {
  const middle: Placement = { xMm: wall.widthMm / 2, yMm: wall.heightMm / 2, turnRad: 0, flipped: false };
  const beside = neighbours.find((n) => n.frameId === besideId) ?? neighbours.at(-1);
  const isFree = (placed: Polygon) => keepClear.every((o) => gapBetween(placed, o).mm > 0);
  if (!beside) return middle;

  const heart = meanOf(neighbours.flatMap((n) => n.outline));
  const radius = Math.max(...outline.map((p) => Math.hypot(p.x, p.y)));
  const found: { at: Placement; far: number }[] = [];
  // Unturned first; a turn only where no edge fits without one.
  for (const maxTurnRad of [0, Math.PI]) {
    for (const { from, to } of sidesOf(beside.outline)) {
      const length = Math.hypot(to.x - from.x, to.y - from.y);
      const away = revealMm + radius * 0.85;
      const at: Placement = {
        xMm: (from.x + to.x) / 2 + ((to.y - from.y) / length) * away,
        yMm: (from.y + to.y) / 2 - ((to.x - from.x) / length) * away,
        turnRad: 0, flipped: false,
      };
      const snap = strongestSnap(edgeField(neighbours), { outline, placement: at, revealMm, reachMm: radius, maxTurnRad });
      if (!snap || !isOnWall(placedAll(outline, snap.placement), wall)) continue;
      const inTheWay = isFree(placedAll(outline, snap.placement)) ? 0 : wall.widthMm + wall.heightMm;
      found.push({ at: snap.placement, far: inTheWay + Math.hypot(snap.placement.xMm - heart.x, snap.placement.yMm - heart.y) });
    }
    if (found.some(({ far }) => far < wall.widthMm + wall.heightMm)) break;
  }
  found.sort((a, b) => a.far - b.far);
  const best = found[0];
  if (best && best.far < wall.widthMm + wall.heightMm) return best.at;
  // No edge has room: the wall's middle, or the first clear place from it outwards.
  for (let ring = 0; ring <= 12; ring++) {
    for (let k = 0; k < Math.max(1, 6 * ring); k++) {
      const angle = (2 * Math.PI * k) / Math.max(1, 6 * ring);
      const at = { ...middle, xMm: middle.xMm + ring * radius * Math.cos(angle), yMm: middle.yMm + ring * radius * Math.sin(angle) };
      const placed = placedAll(outline, at);
      if (isOnWall(placed, wall) && isFree(placed) && neighbours.every((n) => overlapDepth(placed, n.outline) <= 0)) return at;
    }
  }
  return best?.at ?? middle;
}

function isOnWall(outline: Polygon, wall: { widthMm: number; heightMm: number }): boolean {
  const { left, right, bottom, top } = boxOf(outline);
  return left >= -1e-6 && bottom >= -1e-6 && right <= wall.widthMm + 1e-6 && top <= wall.heightMm + 1e-6;
}

function meanOf(points: readonly Point[]): Point {
  return { x: points.reduce((s, p) => s + p.x, 0) / points.length, y: points.reduce((s, p) => s + p.y, 0) / points.length };
}
