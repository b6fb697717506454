import { boxOf, turnedAll, type Box, type Placement, type Point, type Polygon } from '../../geometry/polygon.ts';
import type { Frame, LayoutPattern } from '../../layouts/layout.ts';
import { outlineOf } from '../../patterns/outline.ts';
import type { Scene } from '../scene.ts';

/** In rows or columns; round a centre; grown edge to edge; packed into a marked area. */
export const arrangeKinds = ['rows', 'ring', 'drift', 'fill'] as const;
export type ArrangeKind = (typeof arrangeKinds)[number];

/** What is to be arranged, where, and by which kind. Plain data, so that it can be handed to a worker. */
export interface ArrangeAsk {
  /** The wall with what stands on it and stays; `patterns` hold at least those that are used. */
  scene: Scene;
  /** How many frames of which pattern. */
  counts: readonly { patternId: string; count: number }[];
  kind: ArrangeKind;
  /** Where the middle of the arrangement is wanted, mm on the wall; not asked for `fill`. */
  centre: Point;
  /** What `fill` packs, and what it keeps within; null takes the whole wall. Other kinds do not look at it. */
  area: Box | null;
  /** Whether frames may be turned from how their pattern draws them. */
  mayTurn: boolean;
  /** Another seed, other candidates; the same, the same. */
  seed: number;
}

/** Most frames arranged at once. */
export const mostArranged = 60;

/** One frame's worth of a pattern, made ready. */
export interface Piece {
  pattern: LayoutPattern;
  /** About its centroid, counter-clockwise, mm. */
  outline: Polygon;
  radiusMm: number;
  /** Its half turn between corners, 180° / n: what stands a flat-topped comb on its corner. */
  stepRad: number;
}

/** A piece put on the wall. */
export interface Put {
  piece: Piece;
  at: Placement;
  outline: Polygon;
  box: Box;
}

/** The pieces asked for, one for each frame, pattern by pattern. Patterns that are not in the scene are left out. */
export function piecesOf({ scene, counts }: Pick<ArrangeAsk, 'scene' | 'counts'>): Piece[] {
  return counts.flatMap(({ patternId, count }): Piece[] => {
    const pattern = scene.patterns.find((p) => p.id === patternId);
    if (!pattern || count <= 0) return [];
    const outline = outlineOf(pattern.design.shape);
    const piece: Piece = { pattern, outline, radiusMm: Math.max(...outline.map((p) => Math.hypot(p.x, p.y))), stepRad: Math.PI / outline.length };
    return Array.from({ length: count }, () => piece);
  });
}

/** A piece at a point, turned. */
export function putAt(piece: Piece, x: number, y: number, turnRad: number): Put {
  const outline = (turnRad === 0 ? piece.outline : turnedAll(piece.outline, turnRad)).map((p) => ({ x: p.x + x, y: p.y + y }));
  return { piece, at: { xMm: x, yMm: y, turnRad, flipped: false }, outline, box: boxOf(outline) };
}

export function movedPut({ piece, at, outline, box }: Put, dx: number, dy: number): Put {
  return {
    piece,
    at: { ...at, xMm: at.xMm + dx, yMm: at.yMm + dy },
    outline: outline.map((p) => ({ x: p.x + dx, y: p.y + dy })),
    box: { left: box.left + dx, right: box.right + dx, bottom: box.bottom + dy, top: box.top + dy },
  };
}

/** The box round all that is put. */
export const boxRoundPuts = (puts: readonly Put[]): Box => boxOf(puts.flatMap((p) => p.outline));

/** The frame that a put comes to, under an id and a label of its own. */
export function frameOf({ piece, at }: Put, id: string, label: string): Frame {
  return { id, patternId: piece.pattern.id, ...at, locked: false, label, contentsKg: null, hungGroup: null };
}
