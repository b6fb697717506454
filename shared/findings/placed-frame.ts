import type { Point } from '../geometry/point.ts';
import { placed } from '../geometry/point.ts';
import { boxOf, type Box } from '../geometry/polygon.ts';
import type { Frame, LayoutPattern } from '../layouts/layout.ts';
import { contentsOf, type Contents } from '../patterns/contents.ts';
import { placedHangers, placedOutline, type PlacedHanger } from '../patterns/hangers.ts';
import { frameMass, hardwareKgEach, type FrameMass } from '../patterns/mass.ts';
import type { PatternDesign } from '../patterns/pattern.ts';

/** A frame on the wall with what follows from its place and its pattern. */
export interface PlacedFrame {
  frame: Frame;
  pattern: LayoutPattern;
  outline: Point[];
  box: Box;
  hangers: PlacedHanger[];
  mass: FrameMass;
  contents: Contents;
  /** Centre of mass of frame and contents, wall coordinates; the contents are taken to lie at the frame's own centre. */
  centre: { x: number; y: number; z: number };
}

const masses = new WeakMap<PatternDesign, FrameMass>();

/** Mass of a design, worked out once for each design object. */
export function massOf(design: PatternDesign): FrameMass {
  let mass = masses.get(design);
  if (!mass) masses.set(design, (mass = frameMass(design)));
  return mass;
}

export function placeFrame(frame: Frame, pattern: LayoutPattern): PlacedFrame {
  const { design } = pattern;
  const outline = placedOutline(frame, design);
  const mass = massOf(design);
  const hangers = placedHangers(frame, design);
  const centre = placed(mass.centre, frame);
  if (frame.hangerSlides) {
    // Brackets that were slid take their own mass along.
    const drawn = placedHangers({ ...frame, hangerSlides: undefined }, design);
    const share = mass.kg > 0 ? hardwareKgEach / mass.kg : 0;
    hangers.forEach((h, i) => {
      centre.x += share * (h.x - drawn[i]!.x);
      centre.y += share * (h.y - drawn[i]!.y);
    });
  }
  return {
    frame,
    pattern,
    outline,
    box: boxOf(outline),
    hangers,
    mass,
    contents: contentsOf(design, frame),
    centre: { ...centre, z: mass.centre.z },
  };
}

export const nameOf = ({ frame, pattern }: Pick<PlacedFrame, 'frame' | 'pattern'>): string => (frame.label ? `Frame ${frame.label}` : pattern.name);
export const hangerKey = (frame: { id: string }, hanger: { id: string }): string => `${frame.id}/${hanger.id}`;
