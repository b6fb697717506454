import { distance, type Point } from '../geometry/point.ts';
import { exteriorAngles, sidesOf } from '../geometry/polygon.ts';
import { outlineOf } from './outline.ts';
import type { Shape } from './shape.ts';

/** How an end of a member is cut. */
export interface MemberEnd {
  /** From a square cut: 30° for a hexagon. */
  bevelRad: number;
  /** The same cut read from the length of the board: 90° less the bevel. */
  fromEdgeRad: number;
}

/** One member of the ring. Its outer side runs counter-clockwise, so the opening is on its left. */
export interface Member {
  /** 0 first, counter-clockwise from the lowest side. */
  index: number;
  longPointMm: number;
  /** Not above zero when the member has no inner face left. */
  shortPointMm: number;
  start: MemberEnd;
  end: MemberEnd;
  /** Direction of the outer side, counter-clockwise from level to the right, radians in (−π, π]: 0 for a level bottom, ±π for a level top. */
  inclinationRad: number;
  outerFrom: Point;
  outerTo: Point;
  innerFrom: Point;
  innerTo: Point;
}

/**
 * Members round an outline (counter-clockwise, convex) of a thickness in mm. At each corner both members are bevelled by half the
 * exterior angle: β = ε/2. Short point = long point − t (tan β_start + tan β_end). Source: plane geometry.
 */
export function membersOf(outline: readonly Point[], thicknessMm: number): Member[] {
  const bends = exteriorAngles(outline);
  return sidesOf(outline).map(({ from, to }, index) => {
    const startBevel = bends[index]! / 2;
    const endBevel = bends[(index + 1) % bends.length]! / 2;
    const longPointMm = distance(from, to);
    const along = { x: (to.x - from.x) / longPointMm, y: (to.y - from.y) / longPointMm };
    const cutAtStart = thicknessMm * Math.tan(startBevel);
    const cutAtEnd = thicknessMm * Math.tan(endBevel);
    const inner = (mm: number): Point => ({ x: from.x + along.x * mm - along.y * thicknessMm, y: from.y + along.y * mm + along.x * thicknessMm });
    return {
      index,
      longPointMm,
      shortPointMm: longPointMm - cutAtStart - cutAtEnd,
      start: endOf(startBevel),
      end: endOf(endBevel),
      inclinationRad: Math.atan2(to.y - from.y, to.x - from.x),
      outerFrom: from,
      outerTo: to,
      innerFrom: inner(cutAtStart),
      innerTo: inner(longPointMm - cutAtEnd),
    };
  });
}

const known = new WeakMap<Shape, { thicknessMm: number; members: readonly Member[] }>();

/** Members of a design in its own coordinates, worked out once: shapes are never changed in place. */
export function membersOfDesign({ shape, thicknessMm }: { shape: Shape; thicknessMm: number }): readonly Member[] {
  let kept = known.get(shape);
  if (kept?.thicknessMm !== thicknessMm) known.set(shape, (kept = { thicknessMm, members: membersOf(outlineOf(shape), thicknessMm) }));
  return kept.members;
}

const endOf = (bevelRad: number): MemberEnd => ({ bevelRad, fromEdgeRad: Math.PI / 2 - bevelRad });
