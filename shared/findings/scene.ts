import type { HardwareBook } from '../hardware/hardware-book.ts';
import type { Frame, LayoutPattern, LayoutSheet } from '../layouts/layout.ts';
import type { LengthUnits } from '../units/constants.ts';
import type { Obstruction, Stud, WallShape, Zone } from '../walls/wall.ts';

/** The shop's own bounds that rules ask about. */
export interface ShopLimits {
  units: LengthUnits;
  /** How far the saw tilts, rad from square. */
  sawTiltRad: number;
  /** Wood that must be left between a bracket's hole and either edge of the lip, mm. */
  holeEdgeMm: number;
}

/** 45° is where most saws end; 1/8 in beside a hole keeps a lip whole (both common practice). */
export const usualLimits: ShopLimits = { units: 'in', sawTiltRad: Math.PI / 4, holeEdgeMm: 3.175 };

export type SceneWall = WallShape & { studs: readonly Stud[]; obstructions: readonly Obstruction[]; zones: readonly Zone[] };

/** Everything that findings depend on. Parts that stay the same object count as unchanged. */
export interface Scene {
  wall: SceneWall;
  sheet: LayoutSheet;
  frames: readonly Frame[];
  patterns: readonly LayoutPattern[];
  book: HardwareBook;
  limits: ShopLimits;
  changedSinceSigned: boolean;
}

/** What stays the same while frames are moved; rules on frames see this and no other frame. */
export interface Surroundings {
  wall: SceneWall;
  book: HardwareBook;
  limits: ShopLimits;
}
