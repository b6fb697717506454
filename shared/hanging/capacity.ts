import { anchorAllowable, type AnchorBody } from '../hardware/anchors.ts';
import { feelsGrain } from '../hardware/bearing.ts';
import type { BracketBody } from '../hardware/brackets.ts';
import { combinedLoad, screwCapacity, type ScrewCapacity, type ScrewJoint } from '../hardware/dowel.ts';
import type { ScrewBody } from '../hardware/screws.ts';
import type { YieldMode } from '../hardware/yield-limit.ts';
import { MM_PER_INCH } from '../units/constants.ts';
import type { Figure } from '../units/figure.ts';
import { anchorFigures, bracketFigures, screwFigures } from './capacity-figures.ts';
import type { HangerLoad } from './statics.ts';

/** What goes into the wall. */
export type WallFixing =
  | { kind: 'wood'; screw: ScrewBody; gravity: number; coveringMm: number; /** Depth of the stud, mm; null when always enough. */ woodMm: number | null }
  | { kind: 'anchor'; anchor: AnchorBody }
  | { kind: 'none' };

/** What goes into the frame: the bracket's screws, into the back edge of a member. */
export interface FrameFixing {
  screw: ScrewBody;
  /** Specific gravity of the frame's wood, oven-dry. */
  gravity: number;
  /** Wood behind the bracket along the screw, beside or in front of the groove, mm. */
  woodMm: number;
  /** Direction of the member in the wall plane, rad from level; null takes the worst. */
  grainRad: number | null;
}

/** All that holds one hanger. */
export interface HangerFixing {
  bracket: BracketBody | null;
  wall: WallFixing;
  frame: FrameFixing | null;
  /** C_D; 0.9 for what hangs for good. */
  loadDuration: number;
}

export type HangerPart = 'wall' | 'bracket' | 'frame';

/** What the reader should know beside the number. */
export interface CapacityFlag {
  id: 'no rating' | 'not chosen' | 'screw too short' | 'comes through' | 'head slips through' | 'covering halves lateral' | 'may reach a cable';
  part: HangerPart;
  words: string;
}

/** One link of the chain from frame to wall. */
export interface LinkCheck {
  part: HangerPart;
  /** What the link carries in the direction of this load, N. */
  capacityN: number;
  demandN: number;
  /** Demand over capacity; Infinity where the link carries nothing. */
  utilisation: number;
  mode: YieldMode | null;
  /** Worked out when first asked for: most links of a layout are never opened. */
  readonly figures: Figure[];
}

export interface HangerCheck {
  id: string;
  /** Of the worst link. */
  utilisation: number;
  verdict: 'good' | 'caution' | 'stop';
  worst: HangerPart;
  links: LinkCheck[];
  flags: CapacityFlag[];
}

/** Above 1 stop, above this caution (shop practice). */
export const cautionUtilisation = 0.8;

/**
 * How deep in a stud a cable set back as the code asks may lie, mm: NEC 300.4 keeps cables 1 1/4 in from the stud's face.
 * Cables fished into finished walls are exempt, so the setback cannot be counted on.
 */
export const cableSetbackMm = 1.25 * MM_PER_INCH;

/**
 * How far one hanger is used: each link against the load (N) it gets, the worst decides. Screws and anchors of one bracket share alike.
 * A link that was not chosen, or bears no rating, carries nothing.
 */
export function checkHanger(load: HangerLoad, fixing: HangerFixing): HangerCheck {
  const flags: CapacityFlag[] = [];
  const links = [wallLink(load, fixing, flags), bracketLink(load, fixing, flags), frameLink(load, fixing, flags)];
  const worst = links.reduce((a, b) => (b.utilisation > a.utilisation ? b : a));
  return { id: load.id, utilisation: worst.utilisation, verdict: verdictOf(worst.utilisation), worst: worst.part, links, flags };
}

export function verdictOf(utilisation: number): HangerCheck['verdict'] {
  if (utilisation > 1) return 'stop';
  return utilisation > cautionUtilisation ? 'caution' : 'good';
}

function wallLink(load: HangerLoad, fixing: HangerFixing, flags: CapacityFlag[]): LinkCheck {
  const { bracket, wall } = fixing;
  if (wall.kind === 'none' || !bracket) {
    if (wall.kind === 'none') flags.push({ id: 'not chosen', part: 'wall', words: 'No screw or anchor is chosen for the wall, so nothing is counted.' });
    return nothing('wall', load);
  }
  if (wall.kind === 'anchor') return anchorLink(load, wall.anchor, bracket.wallScrews, flags);

  const { screw, gravity, coveringMm, woodMm } = wall;
  // Studs stand upright: the angle to the grain is that of the load to plumb.
  const angleToGrainRad = Math.atan2(Math.abs(load.shear.x), Math.abs(load.shear.y));
  const value = valueOf({ screw, plateMm: bracket.steelMm, gapMm: coveringMm, gravity, woodMm, angleToGrainRad, loadDuration: fixing.loadDuration });
  flagScrew('wall', screw, value, bracket, flags);
  if (value.mode !== null && value.lateralReferenceN < value.lateralWithoutGapN / 2) {
    flags.push({ id: 'covering halves lateral', part: 'wall', words: 'The covering between bracket and stud cuts what the screw carries sideways by more than half.' });
  }
  if (value.penetrationMm > cableSetbackMm + 1e-9) {
    flags.push({ id: 'may reach a cable', part: 'wall', words: 'The screw goes more than 1 1/4 in (32 mm) into the stud and may reach a cable set back as the code asks. Look before you drive it.' });
  }
  return screwLink('wall', load, bracket.wallScrews, value, screw.headDiameterMm > bracket.holeMm, { screw, bracket, coveringMm, gravity, loadDuration: fixing.loadDuration });
}

function frameLink(load: HangerLoad, fixing: HangerFixing, flags: CapacityFlag[]): LinkCheck {
  const { bracket, frame } = fixing;
  if (!frame || !bracket) {
    if (!frame) flags.push({ id: 'not chosen', part: 'frame', words: 'No screw is chosen for the bracket into the frame, so nothing is counted.' });
    return nothing('frame', load);
  }
  const { screw, gravity, woodMm, grainRad } = frame;
  const toMember = grainRad === null ? Math.PI / 2 : Math.abs(Math.atan2(load.shear.y, load.shear.x) - grainRad) % Math.PI;
  const angleToGrainRad = load.shearN === 0 ? 0 : Math.min(toMember, Math.PI - toMember);
  const value = valueOf({ screw, plateMm: bracket.steelMm, gapMm: 0, gravity, woodMm, angleToGrainRad, loadDuration: fixing.loadDuration });
  flagScrew('frame', screw, value, null, flags);
  return screwLink('frame', load, bracket.frameScrews, value, true, { screw, bracket, coveringMm: 0, gravity, loadDuration: fixing.loadDuration });
}

function screwLink(part: HangerPart, load: HangerLoad, screws: number, value: ScrewCapacity, headHolds: boolean, of: Parameters<typeof screwFigures>[3]): LinkCheck {
  const one = headHolds ? allowedOnScrew(value, load.angleRad) : 0;
  const capacityN = one * screws;
  const utilisation = ratio(load.resultantN, capacityN);
  return link(part, load, capacityN, utilisation, value.mode, () => screwFigures(load, screws, value, of, one, utilisation));
}

const values = new WeakMap<ScrewBody, Map<string, ScrewCapacity>>();
const mostKept = 200;

/** The screw's values, kept for the next hanger that sits alike. A screw under 1/4 in does not feel the grain, so the angle is all one to it. */
function valueOf(joint: ScrewJoint): ScrewCapacity {
  const { screw, plateMm, gapMm, gravity, woodMm, loadDuration } = joint;
  const angleToGrainRad = feelsGrain(screw.diameterMm) ? joint.angleToGrainRad : 0;
  const key = `${plateMm} ${gapMm} ${gravity} ${woodMm} ${angleToGrainRad} ${loadDuration}`;
  let kept = values.get(screw);
  if (!kept || kept.size >= mostKept) values.set(screw, (kept = new Map()));
  let value = kept.get(key);
  if (!value) kept.set(key, (value = screwCapacity({ ...joint, angleToGrainRad })));
  return value;
}

/**
 * What one screw may carry at this angle, N: NDS-2018 eq. 12.4-1, but never more along the wood than Z' nor out of it than W'p. Where
 * one is over twice the other the equation by itself would let a pull in the strong direction raise what the weak one carries.
 */
function allowedOnScrew(value: ScrewCapacity, angleRad: number): number {
  const along = Math.cos(angleRad);
  const out = Math.sin(angleRad);
  return Math.min(
    combinedLoad(value.withdrawalN, value.lateralN, angleRad),
    along > 1e-9 ? value.lateralN / along : Infinity,
    out > 1e-9 ? value.withdrawalN / out : Infinity,
  );
}

function flagScrew(part: HangerPart, screw: ScrewBody, value: ScrewCapacity, bracket: BracketBody | null, flags: CapacityFlag[]): void {
  const into = part === 'wall' ? 'the stud' : 'the frame';
  if (value.mode === null) {
    const least = screw.kind === 'wood screw' ? 'six' : 'four';
    flags.push({ id: 'screw too short', part, words: `The screw goes less than ${least} times its diameter into ${into}: it counts for nothing sideways.` });
  }
  if (value.comesThrough) flags.push({ id: 'comes through', part, words: `The screw is longer than ${into} is deep where it goes in.` });
  if (bracket && screw.headDiameterMm <= bracket.holeMm) {
    flags.push({ id: 'head slips through', part, words: 'The screw’s head is no wider than the bracket’s hole: it holds nothing.' });
  }
}

function anchorLink(load: HangerLoad, anchor: AnchorBody, count: number, flags: CapacityFlag[]): LinkCheck {
  if (anchor.shearN === null || anchor.tensionN === null) {
    const missing = [anchor.shearN === null ? 'shear' : '', anchor.tensionN === null ? 'tension' : ''].filter(Boolean).join(' or ');
    flags.push({ id: 'no rating', part: 'wall', words: `No rating in ${missing} is entered for this anchor, so it counts for nothing there. Take it from the packet.` });
  }
  const allowed = anchorAllowable(anchor);
  // V/Va + T/Ta ≤ 1, the straight-line interaction.
  const utilisation = ratio(load.shearN, allowed.shearN * count) + ratio(load.tensionN, allowed.tensionN * count);
  const capacityN = utilisation > 0 ? load.resultantN / utilisation : Math.min(allowed.shearN, allowed.tensionN) * count;
  return link('wall', load, capacityN, utilisation, null, () => anchorFigures(load, anchor, allowed, count, utilisation));
}

function bracketLink(load: HangerLoad, { bracket }: HangerFixing, flags: CapacityFlag[]): LinkCheck {
  if (!bracket) {
    flags.push({ id: 'not chosen', part: 'bracket', words: 'No bracket is chosen, so nothing is counted.' });
    return nothing('bracket', load);
  }
  if (bracket.ratingN === null) {
    flags.push({ id: 'no rating', part: 'bracket', words: 'No rating is entered for this bracket, so it counts for nothing. Take it from its maker.' });
  }
  const capacityN = bracket.ratingN ?? 0;
  const utilisation = ratio(load.resultantN, capacityN);
  return link('bracket', load, capacityN, utilisation, null, () => bracketFigures(load, bracket, utilisation));
}

function nothing(part: HangerPart, load: HangerLoad): LinkCheck {
  return link(part, load, 0, ratio(load.resultantN, 0), null, () => []);
}

function link(part: HangerPart, load: HangerLoad, capacityN: number, utilisation: number, mode: YieldMode | null, make: () => Figure[]): LinkCheck {
  let made: Figure[] | null = null;
  return {
    part, capacityN, demandN: load.resultantN, utilisation, mode,
    get figures() {
      return (made ??= make());
    },
  };
}

const ratio = (demand: number, capacity: number): number => (demand === 0 ? 0 : demand / capacity);
