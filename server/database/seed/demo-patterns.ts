import type { HardwareBook } from '../../../shared/hardware/hardware-book.ts';
import { defaultHangers } from '../../../shared/patterns/hangers.ts';
import type { PatternDesign } from '../../../shared/patterns/pattern.ts';

const inch = 25.4;

/** Brackets and anchors of the demo shop. Names and ratings are invented: a real shop enters what its maker states. */
export const demoBracket = (frameScrewId: string) => ({
  kind: 'bracket' as const,
  name: 'Keyhole plate, 14 gauge (invented)',
  body: { steelMm: 1.9, holeMm: 5.4, wallScrews: 1, frameScrews: 2, frameScrewId, ratingN: 350, offsetMm: 19 },
});
export const demoAnchor = {
  kind: 'anchor' as const,
  name: 'Toggle for 1/2 in board (invented)',
  body: { kind: 'hollow wall' as const, ratedAs: 'ultimate' as const, shearN: 900, tensionN: 700 },
};

/** The demo pattern book: three frames that go together edge to edge, and one that is too heavy for its hangers. */
export function demoPatterns(book: HardwareBook): { name: string; design: PatternDesign }[] {
  const bracketId = book.brackets[0]?.id ?? null;
  const wallScrewId = book.screws.find((s) => s.name.includes('#10 × 1 3/4'))?.id ?? null;
  const anchorId = book.anchors[0]?.id ?? null;
  const hung = (form: Omit<PatternDesign, 'hangers'>): PatternDesign => ({
    ...form,
    hangers: defaultHangers(form).map((h) => ({ ...h, bracketId, wallScrewId, anchorId })),
  });
  // Hangers on the two sloping upper members stand 1.5 sides apart, which at 10 1/2 in is a stud bay of 16 in less what they may slide.
  const onSlopes = (form: Omit<PatternDesign, 'hangers'>): PatternDesign => ({
    ...form,
    hangers: [[4, 'left'], [2, 'right']].map(([member, id]) => ({
      id: String(id), member: Number(member), alongMm: 0, insetMm: ((form.thicknessMm - (form.groove?.widthMm ?? 0)) / 2), allowanceMm: [-40, 40], bracketId, wallScrewId, anchorId,
    })),
  });
  const mirror = { widthMm: 0.28125 * inch, depthMm: 0.375 * inch, clearanceMm: 1, mirrorMm: 0.125 * inch, backerMm: 0.125 * inch };
  const backer = { ...mirror, mirrorMm: 0 };
  return [
    { name: 'Comb 10 1/2', design: onSlopes({ shape: { kind: 'regular', sides: 6, sideMm: 10.5 * inch }, thicknessMm: 0.75 * inch, depthMm: 4.5 * inch, species: 'white ash', moisturePercent: 8, groove: null, contentsKg: null }) },
    { name: 'Comb 10 1/2 with mirror', design: onSlopes({ shape: { kind: 'regular', sides: 6, sideMm: 10.5 * inch }, thicknessMm: 0.75 * inch, depthMm: 3.5 * inch, species: 'walnut', moisturePercent: 8, groove: mirror, contentsKg: 1 }) },
    { name: 'Diamond 10 1/2', design: hung({ shape: { kind: 'rhombus', sideMm: 10.5 * inch, angleRad: Math.PI / 3 }, thicknessMm: 0.75 * inch, depthMm: 4.5 * inch, species: 'cherry', moisturePercent: 8, groove: backer, contentsKg: null }) },
    { name: 'Long comb', design: hung({ shape: { kind: 'stretched hexagon', sideMm: 10.5 * inch, stretchMm: 18 * inch }, thicknessMm: 0.75 * inch, depthMm: 5.5 * inch, species: 'white ash', moisturePercent: 8, groove: null, contentsKg: null }) },
  ];
}
