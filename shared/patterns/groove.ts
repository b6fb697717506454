import type { Point } from '../geometry/point.ts';
import { area } from '../geometry/polygon.ts';
import { inset } from '../geometry/polygon-inset.ts';
import type { Groove } from './pattern.ts';

/** Engagement a router bit is given at one pass in hardwood, mm: 1/8 in, common practice. */
export const passCapMm = 3.175;

/** The groove in the back, open to the inner face and to the back edge, and the panel that lies in it. */
export interface GrooveGeometry {
  widthMm: number;
  depthMm: number;
  /** What is left of the thickness outside the groove. */
  lipMm: number;
  /** Width as a share of the members' thickness. */
  shareOfThickness: number;
  /** The groove's outer wall, where it meets the lip. */
  wall: Point[];
  /** The panel: the wall less the clearance all round. */
  panelOutline: Point[];
  panelAreaMm2: number;
  /** How far the panel rests on the shoulder, on each side, when it lies in the middle. */
  restMm: number;
  /** Depth left behind mirror and backer; below zero when they stand proud of the back. */
  spareDepthMm: number;
  /** Wood taken out of the whole ring, mm³. */
  volumeMm3: number;
  passes: RouterPasses;
}

export interface RouterPasses {
  count: number;
  eachMm: number;
  capMm: number;
}

/** Equal passes over the groove's width, none wider than the cap. */
export function routerPasses(widthMm: number, capMm = passCapMm): RouterPasses {
  const count = Math.max(1, Math.ceil(widthMm / capMm - 1e-9));
  return { count, eachMm: widthMm / count, capMm };
}

/** The groove round an opening that lies `thicknessMm` inside the outline. */
export function grooveGeometry(outline: readonly Point[], opening: readonly Point[], thicknessMm: number, groove: Groove, capMm = passCapMm): GrooveGeometry {
  const lipMm = thicknessMm - groove.widthMm;
  const wall = inset(outline, lipMm);
  const panelOutline = inset(outline, lipMm + groove.clearanceMm);
  return {
    widthMm: groove.widthMm,
    depthMm: groove.depthMm,
    lipMm,
    shareOfThickness: groove.widthMm / thicknessMm,
    wall,
    panelOutline,
    panelAreaMm2: area(panelOutline),
    restMm: groove.widthMm - groove.clearanceMm,
    spareDepthMm: groove.depthMm - groove.mirrorMm - groove.backerMm,
    volumeMm3: (area(wall) - area(opening)) * groove.depthMm,
    passes: routerPasses(groove.widthMm, capMm),
  };
}
