import type { Scene, SceneWall } from '../../shared/findings/scene.ts';
import { usualLimits } from '../../shared/findings/scene.ts';
import type { HardwareBook } from '../../shared/hardware/hardware-book.ts';
import { standardWoodScrew } from '../../shared/hardware/screws.ts';
import type { Frame, LayoutPattern } from '../../shared/layouts/layout.ts';
import type { PatternDesign } from '../../shared/patterns/pattern.ts';
import type { Obstruction } from '../../shared/walls/wall.ts';
import { aDesign, aFrame, aStud, aWallShape } from './builders.ts';

export const wallScrewId = '00000000-0000-4000-8000-000000000001';
export const frameScrewId = '00000000-0000-4000-8000-000000000002';
export const bracketId = '00000000-0000-4000-8000-000000000003';
export const anchorId = '00000000-0000-4000-8000-000000000004';
export const patternId = '00000000-0000-4000-8000-000000000005';

/** A book with a #10 × 3 in screw, a #8 × 1 1/4 in screw, a bracket rated 900 N and an anchor that nobody has rated. */
export function aBook(): HardwareBook {
  return {
    screws: [
      { id: wallScrewId, name: '#10 × 3', ...standardWoodScrew('#10', 76.2) },
      { id: frameScrewId, name: '#8 × 1 1/4', ...standardWoodScrew('#8', 31.75) },
    ],
    brackets: [{ id: bracketId, name: 'Flat plate', steelMm: 1.9, holeMm: 5.5, wallScrews: 1, frameScrews: 2, frameScrewId, ratingN: 900, offsetMm: 20 }],
    anchors: [{ id: anchorId, name: 'Unrated anchor', kind: 'hollow wall', ratedAs: 'allowable', shearN: null, tensionN: null }],
  };
}

/** Two hangers on the upper member, each with bracket, screw and anchor chosen. */
export const heldHangers = (alongMm: readonly number[] = [-50, 50]): PatternDesign['hangers'] =>
  alongMm.map((along, i) => ({ id: `h${i + 1}`, member: 3, alongMm: along, insetMm: 9, allowanceMm: [-20, 20], bracketId, wallScrewId, anchorId }));

export const aPattern = (change: Partial<PatternDesign> = {}): LayoutPattern => ({ id: patternId, name: 'Comb', design: aDesign({ hangers: heldHangers(), contentsKg: 3, ...change }) });

export function anObstruction(kind: Obstruction['kind'], left: number, bottom: number, width: number, height: number, clearanceMm = 0): Obstruction {
  return { id: `${kind}-${left}-${bottom}`, kind, name: '', clearanceMm, outlineMm: [[left, bottom], [left + width, bottom], [left + width, bottom + height], [left, bottom + height]] };
}

/** A wall with probed studs under both hangers of a frame at x = 1800, and no other trouble. */
export function aScene(change: { frames?: Frame[]; patterns?: LayoutPattern[]; wall?: Partial<SceneWall>; revealMm?: number; changedSinceSigned?: boolean; book?: HardwareBook } = {}): Scene {
  return {
    wall: { ...aWallShape(), studs: [aStud(1750), aStud(1850)], obstructions: [], zones: [], ...change.wall },
    sheet: { name: 'First', revealMm: change.revealMm ?? 6 },
    frames: change.frames ?? [aFrame(patternId)],
    patterns: change.patterns ?? [aPattern()],
    book: change.book ?? aBook(),
    limits: usualLimits,
    changedSinceSigned: change.changedSinceSigned ?? false,
  };
}
