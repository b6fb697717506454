import { feelsGrain, steelBearing, woodBearing } from './bearing.ts';
import { tipLength, type ScrewBody } from './screws.ts';
import { steelTension, withdrawalPerMm } from './withdrawal.ts';
import { generalDowel, reductionTerms, yieldModes, type ByMode, type YieldMode } from './yield-limit.ts';

/** One screw through a steel plate, across a covering, into the side grain of wood. */
export interface ScrewJoint {
  screw: ScrewBody;
  plateMm: number;
  /** Covering between plate and wood, mm; it is taken to carry nothing. */
  gapMm: number;
  /** Assigned specific gravity of the wood. */
  gravity: number;
  /** Wood behind the covering along the screw, mm; null when there is always enough. */
  woodMm: number | null;
  /** Between the lateral load and the grain. */
  angleToGrainRad: number;
  /** C_D. */
  loadDuration: number;
}

/** What one screw may carry, with all that led to it; N and mm. */
export interface ScrewCapacity {
  /** Of the screw in the wood, its point included. */
  penetrationMm: number;
  /** Less than this gives no lateral value (6D for wood screws, 12.1.5.6; 4D for lags, 12.1.4.6). */
  leastPenetrationMm: number;
  comesThrough: boolean;
  threadMm: number;
  withdrawalPerMm: number;
  /** W'p: thread × W × C_D, or the steel's own tension where that is less. */
  withdrawalN: number;
  steelTensionN: number;
  /** Bearing length in the wood, mm. */
  bearingMm: number;
  woodBearingMPa: number;
  plateBearingMPa: number;
  /** Reference lateral value by mode after reduction, N; null when the screw is too short. */
  modes: ByMode | null;
  mode: YieldMode | null;
  /** What that mode's yield load was divided by, R_d. */
  reduction: number | null;
  /** Z: the least of the modes. Z': times C_D. Zero when too short. */
  lateralReferenceN: number;
  lateralN: number;
  /** Z of the same screw, as deep in the wood, with no gap. */
  lateralWithoutGapN: number;
}

/** Least penetration that earns a lateral value, mm, by NDS-2018 12.1.5.6 (wood screws, 6D) and 12.1.4.6 (lags, 4D). */
export function leastPenetration(screw: Pick<ScrewBody, 'kind' | 'diameterMm'>): number {
  return (screw.kind === 'wood screw' ? 6 : 4) * screw.diameterMm;
}

/**
 * Bearing length in the wood, mm: the penetration p from 10D on, below that p − E/2 with E the tapered tip (NDS-2018 12.3.5.3,
 * from memory). A screw whose tip comes out of the far side bears along the whole of the wood.
 */
export function bearingLength(screw: Pick<ScrewBody, 'kind' | 'diameterMm'>, penetrationMm: number, comesThrough: boolean): number {
  if (comesThrough || penetrationMm >= 10 * screw.diameterMm - 1e-9) return penetrationMm;
  return Math.max(0, penetrationMm - tipLength(screw) / 2);
}

/**
 * Values of one screw by NDS-2018 chapter 12, lateral by the general dowel equations of AWC TR12 so that the covering counts as a gap.
 * In service dry and below 100 °F: the wet-service and temperature factors are 1.
 */
export function screwCapacity(joint: ScrewJoint): ScrewCapacity {
  const { screw, plateMm, gapMm, gravity, angleToGrainRad, loadDuration } = joint;
  const reach = Math.max(0, screw.lengthMm - plateMm - gapMm);
  const comesThrough = joint.woodMm !== null && reach > joint.woodMm + 1e-9;
  const penetrationMm = comesThrough ? (joint.woodMm ?? 0) : reach;

  // A lag's tip holds nothing in withdrawal (12.2.1.1); a wood screw's thread is counted to its point. What has come through is lost.
  const lost = Math.max(screw.kind === 'lag screw' ? tipLength(screw) : 0, comesThrough ? reach - penetrationMm : 0);
  const threadMm = Math.max(0, Math.min(screw.threadLengthMm, reach) - lost);
  const perMm = withdrawalPerMm(screw.kind, gravity, screw.diameterMm);
  const steelTensionN = steelTension(screw);
  const withdrawalN = Math.min(perMm * threadMm * loadDuration, steelTensionN);

  const leastPenetrationMm = leastPenetration(screw);
  const bearingMm = bearingLength(screw, penetrationMm, comesThrough);
  const woodBearingMPa = woodBearing(gravity, screw.diameterMm, angleToGrainRad);
  const plateBearingMPa = steelBearing(plateMm);
  const deepEnough = penetrationMm >= leastPenetrationMm - 1e-9;
  const terms = reductionTerms(screw.diameterMm, screw.rootDiameterMm, feelsGrain(screw.diameterMm) ? angleToGrainRad : 0);
  const modes = (gap: number) =>
    reduced(
      generalDowel({
        diameterMm: screw.rootDiameterMm, bendingYieldMPa: screw.bendingYieldMPa, sideMPa: plateBearingMPa, mainMPa: woodBearingMPa,
        sideMm: plateMm, mainMm: bearingMm, gapMm: gap,
      }),
      terms,
    );
  const withGap = deepEnough ? modes(gapMm) : null;
  const mode = withGap ? governing(withGap) : null;
  const lateralReferenceN = withGap && mode ? withGap[mode] : 0;
  const without = deepEnough ? modes(0) : null;
  return {
    penetrationMm, leastPenetrationMm, comesThrough, threadMm, withdrawalPerMm: perMm, withdrawalN, steelTensionN, bearingMm,
    woodBearingMPa, plateBearingMPa, modes: withGap, mode, reduction: mode && terms[mode], lateralReferenceN, lateralN: lateralReferenceN * loadDuration,
    lateralWithoutGapN: without ? without[governing(without)] : 0,
  };
}

/** The mode that yields first. */
export function governing(modes: ByMode): YieldMode {
  return yieldModes.reduce((least, mode) => (modes[mode] < modes[least] ? mode : least));
}

/** Yield loads divided by their reduction terms, N. */
export function reduced(loads: ByMode, terms: ByMode): ByMode {
  return Object.fromEntries(yieldModes.map((m) => [m, loads[m] / terms[m]])) as ByMode;
}

/**
 * What one lag or wood screw may carry, N, when the load pulls at an angle (rad) to the wood's surface: 0 is all lateral, π/2 all
 * withdrawal. Z'_α = W'p Z' / (W'p cos²α + Z' sin²α). Source: NDS-2018 eq. 12.4-1.
 */
export function combinedLoad(withdrawalN: number, lateralN: number, angleRad: number): number {
  const cos2 = Math.cos(angleRad) ** 2;
  const sin2 = Math.sin(angleRad) ** 2;
  // A share too small to matter must not wake a value of zero.
  if (sin2 < 1e-18) return lateralN;
  if (cos2 < 1e-18) return withdrawalN;
  if (withdrawalN <= 0 || lateralN <= 0) return 0;
  return (withdrawalN * lateralN) / (withdrawalN * cos2 + lateralN * sin2);
}
