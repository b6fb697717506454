import { MM_PER_INCH } from '../units/constants.ts';
import { feelsGrain } from './bearing.ts';

export const yieldModes = ['Im', 'Is', 'II', 'IIIm', 'IIIs', 'IV'] as const;
export type YieldMode = (typeof yieldModes)[number];
export type ByMode = Record<YieldMode, number>;

/** What happens in each mode, in words; m is the wood that holds the point, s the plate under the head. */
export const yieldModeWords: Record<YieldMode, string> = {
  Im: 'the wood crushes along the whole screw',
  Is: 'the plate crushes at the screw',
  II: 'the screw turns as a whole, crushing both sides',
  IIIm: 'the screw bends at the plate and turns in the wood',
  IIIs: 'the screw bends in the wood and turns in the plate',
  IV: 'the screw bends at the plate and in the wood',
};

/** A single-shear joint of two solid members with a gap between them, mm and N/mm². */
export interface YieldJoint {
  /** Diameter that bears: the root for threaded screws (NDS-2018 12.3.7). */
  diameterMm: number;
  bendingYieldMPa: number;
  sideMPa: number;
  mainMPa: number;
  /** Bearing lengths. */
  sideMm: number;
  mainMm: number;
  gapMm: number;
}

/**
 * Load at yield in each mode, N, before reduction: the general dowel equations for solid members with a gap.
 * I: P = q L. Others: P = (−B + √(B² − 4AC)) / 2A, with q = F_e D and M = F_yb D³/6. Source: AWC Technical Report 12 (2015),
 * table 1-1. The gap carries nothing and friction under the head is left out.
 */
export function generalDowel(joint: YieldJoint): ByMode {
  const qs = joint.sideMPa * joint.diameterMm;
  const qm = joint.mainMPa * joint.diameterMm;
  const moment = (joint.bendingYieldMPa * joint.diameterMm ** 3) / 6;
  const { sideMm: ls, mainMm: lm, gapMm: g } = joint;
  const rigidSide = { a: 1 / (4 * qs), b: ls / 2, c: (qs * ls ** 2) / 4 };
  const rigidMain = { a: 1 / (4 * qm), b: lm / 2, c: (qm * lm ** 2) / 4 };
  const hingeSide = { a: 1 / (2 * qs), b: 0, c: moment };
  const hingeMain = { a: 1 / (2 * qm), b: 0, c: moment };
  const solve = (s: typeof rigidSide, m: typeof rigidSide): number => {
    const a = s.a + m.a;
    const b = s.b + g + m.b;
    const c = s.c + m.c;
    // (−b + √(b² + 4ac)) / 2a, written so that a long gap loses no digits.
    return (2 * c) / (b + Math.sqrt(b ** 2 + 4 * a * c));
  };
  return {
    Im: qm * lm,
    Is: qs * ls,
    II: solve(rigidSide, rigidMain),
    IIIm: solve(hingeSide, rigidMain),
    IIIs: solve(rigidSide, hingeMain),
    IV: solve(hingeSide, hingeMain),
  };
}

/**
 * The same loads without a gap by the closed forms of NDS-2018 table 12.3.1A, multiplied out (before reduction), N: the check that
 * both sets agree where they must.
 */
export function closedFormDowel(joint: Omit<YieldJoint, 'gapMm'>): ByMode {
  const { diameterMm: d, bendingYieldMPa: fyb, sideMPa: fes, mainMPa: fem, sideMm: ls, mainMm: lm } = joint;
  const re = fem / fes;
  const rt = lm / ls;
  const k1 = (Math.sqrt(re + 2 * re ** 2 * (1 + rt + rt ** 2) + rt ** 2 * re ** 3) - re * (1 + rt)) / (1 + re);
  const k2 = -1 + Math.sqrt(2 * (1 + re) + (2 * fyb * (1 + 2 * re) * d ** 2) / (3 * fem * lm ** 2));
  const k3 = -1 + Math.sqrt((2 * (1 + re)) / re + (2 * fyb * (2 + re) * d ** 2) / (3 * fem * ls ** 2));
  return {
    Im: d * lm * fem,
    Is: d * ls * fes,
    II: k1 * d * ls * fes,
    IIIm: (k2 * d * lm * fem) / (1 + 2 * re),
    IIIs: (k3 * d * ls * fem) / (2 + re),
    IV: d ** 2 * Math.sqrt((2 * fem * fyb) / (3 * (1 + re))),
  };
}

/**
 * What each yield load is divided by. Source: NDS-2018 table 12.3.1B with its first note: K_D (2.2, or 10 D + 0.5 above 0.17 in) by
 * the root diameter while that is under 1/4 in, times K_θ where the nominal diameter is 1/4 in or more; else 4, 3.6 and 3.2 times K_θ.
 * K_θ = 1 + θ/360° with θ the greatest angle between load and grain (rad). Tables 12K and 12M come out only in this way.
 */
export function reductionTerms(nominalMm: number, rootMm: number, angleToGrainRad: number): ByMode {
  const grain = feelsGrain(nominalMm) ? 1 + angleToGrainRad / (2 * Math.PI) : 1;
  const root = rootMm / MM_PER_INCH;
  if (root < 0.25 - 1e-9) {
    const all = (root <= 0.17 + 1e-9 ? 2.2 : 10 * root + 0.5) * grain;
    return { Im: all, Is: all, II: all, IIIm: all, IIIs: all, IV: all };
  }
  return { Im: 4 * grain, Is: 4 * grain, II: 3.6 * grain, IIIm: 3.2 * grain, IIIs: 3.2 * grain, IV: 3.2 * grain };
}
