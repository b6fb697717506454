import { placedAll, type Polygon } from '../../../../../shared/geometry/polygon.ts';
import { frameDrawing, type Primitive } from '../../../../../shared/layouts/drawing.ts';
import type { Frame } from '../../../../../shared/layouts/layout.ts';
import { frameGeometry } from '../../../../../shared/patterns/frame.ts';
import { ShapeError } from '../../../../../shared/patterns/outline.ts';
import type { Pattern, PatternDesign } from '../../../../../shared/patterns/pattern.ts';

/** A pattern made ready for the wall: what every gesture and every stroke needs, worked out once. */
export interface ReadyPattern {
  id: string;
  name: string;
  archived: boolean;
  design: PatternDesign;
  /** About its centroid, counter-clockwise, mm. */
  outline: Polygon;
  /** The outline less the members; empty where they leave none. */
  opening: Polygon;
  /** Farthest corner from the centroid, mm. */
  radiusMm: number;
  drawing: (flipped: boolean) => { body: Primitive[]; hangers: Primitive[] };
}

export type Designs = ReadonlyMap<string, ReadyPattern>;

/** The pattern book made ready; patterns whose shape cannot be made are left out. */
export function readyDesigns(patterns: readonly Pattern[]): Designs {
  const ready = new Map<string, ReadyPattern>();
  for (const { id, name, archived, design } of patterns) {
    try {
      const { outline, opening } = frameGeometry(design);
      ready.set(id, { id, name, archived, design, outline, opening, radiusMm: Math.max(...outline.map((p) => Math.hypot(p.x, p.y))), drawing: onceEach((flipped) => frameDrawing(design, flipped)) });
    } catch (error) {
      if (!(error instanceof ShapeError)) throw error;
    }
  }
  return ready;
}

function onceEach<T>(make: (flag: boolean) => T): (flag: boolean) => T {
  const made = new Map<boolean, T>();
  return (flag) => {
    let value = made.get(flag);
    if (value === undefined) made.set(flag, (value = make(flag)));
    return value;
  };
}

const outlines = new WeakMap<Frame, { outline: Polygon; placed: Polygon }>();

/** A frame's outline on the wall; null where its pattern is not in the book. Frames are never changed in place, so each is worked out once. */
export function wallOutline(frame: Frame, designs: Designs): Polygon | null {
  const pattern = designs.get(frame.patternId);
  if (!pattern) return null;
  const known = outlines.get(frame);
  if (known && known.outline === pattern.outline) return known.placed;
  const placed = placedAll(pattern.outline, frame);
  outlines.set(frame, { outline: pattern.outline, placed });
  return placed;
}
