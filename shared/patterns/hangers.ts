import { placed, type Placement, type Point, type Segment } from '../geometry/point.ts';
import { boxOf, placedAll, reversed } from '../geometry/polygon.ts';
import { frameGeometry, type FrameForm } from './frame.ts';
import { membersOf, membersOfDesign, type Member } from './members.ts';
import { outlineOf } from './outline.ts';
import type { Hanger, PatternDesign } from './pattern.ts';

/** A hanger's screw on the wall, and the stretch it may slide along its member. */
export interface PlacedHanger {
  id: string;
  x: number;
  y: number;
  /** How far it has been slid from where the pattern puts it, mm along its member. */
  slidMm: number;
  slide: Segment;
}

type HangerPlace = Pick<Hanger, 'member' | 'alongMm' | 'insetMm'>;

/** A place told along a member, in the pattern's own coordinates, mm. Throws a RangeError where the frame has no such member. */
export function hangerPosition(design: Pick<PatternDesign, 'shape' | 'thicknessMm'>, hanger: HangerPlace): Point {
  return alongMember(memberOf(membersOfDesign(design), hanger.member), hanger.alongMm, hanger.insetMm);
}

function memberOf(members: readonly Member[], index: number): Member {
  const member = members[index];
  if (!member) throw new RangeError(`member: this frame has no member ${index + 1}.`);
  return member;
}

function alongMember({ outerFrom, longPointMm, inclinationRad }: Member, alongMm: number, insetMm: number): Point {
  const along = { x: Math.cos(inclinationRad), y: Math.sin(inclinationRad) };
  const way = longPointMm / 2 + alongMm;
  return { x: outerFrom.x + along.x * way - along.y * insetMm, y: outerFrom.y + along.y * way + along.x * insetMm };
}

/** The outline of a frame on the wall: flipped, turned, moved; counter-clockwise. Flipped, its side k is member n − 1 − k. */
export function placedOutline(frame: Placement, design: Pick<PatternDesign, 'shape'>): Point[] {
  return placedAll(outlineOf(design.shape), frame);
}

/** Members of a frame on the wall, each under its own number whether flipped or not; inner faces on their left. */
export function placedMembers(frame: Placement, design: Pick<PatternDesign, 'shape' | 'thicknessMm'>): Member[] {
  const outline = outlineOf(design.shape);
  const ring = (frame.flipped ? reversed(outline) : outline).map((p) => placed(p, frame));
  const members = membersOf(ring, design.thicknessMm);
  const n = members.length;
  return frame.flipped ? members.map((_, index) => ({ ...members[n - 1 - index]!, index })) : members;
}

/** The direction of a member's outer side on the wall, (−π, π]. Flipped, a ring is run the other way, so that the direction is mirrored top for bottom. */
export function placedInclination(frame: Placement, member: Pick<Member, 'inclinationRad'>): number {
  const rad = frame.turnRad + (frame.flipped ? -member.inclinationRad : member.inclinationRad);
  return Math.atan2(Math.sin(rad), Math.cos(rad));
}

/** A frame's place and what its own hangers were slid by, mm along their members; see `Frame`. */
export type HangerPlacement = Placement & { hangerSlides?: Readonly<Record<string, number>> };

/** The hangers of a frame on the wall, in the design's order. No hanger is slid beyond its allowance, even where that was made less since. */
export function placedHangers(frame: HangerPlacement, design: Pick<PatternDesign, 'shape' | 'thicknessMm' | 'hangers'>): PlacedHanger[] {
  const members = membersOfDesign(design);
  return design.hangers.map((hanger) => {
    const member = memberOf(members, hanger.member);
    const at = (offset: number): Point => placed(alongMember(member, hanger.alongMm + offset, hanger.insetMm), frame);
    const [low, high] = hanger.allowanceMm;
    const slidMm = Math.min(Math.max(frame.hangerSlides?.[hanger.id] ?? 0, low), high);
    return { id: hanger.id, ...at(slidMm), slidMm, slide: { from: at(low), to: at(high) } };
  });
}

/** Members within this of level carry a hanger well; the same bound as for a floor. */
export const nearLevelRad = (35 * Math.PI) / 180;

/** Wood kept between a hanger's screw and the end of its member's inner face, mm; common practice. */
const keepFromEndMm = 15;

/**
 * Two hangers on what is uppermost as the pattern lies: both on a top member that is near level, else one on each of the two members that
 * meet at the highest corner, at one height. In the middle of the lip (or of the member, without a groove), and free to slide along the
 * inner face as far as leaves 15 mm at its ends and the two apart. Common practice; brackets and screws are left to be chosen.
 */
export function defaultHangers(design: FrameForm): Hanger[] {
  const { members, groove, thicknessMm, outline, heightMm } = frameGeometry(design);
  const insetMm = (groove ? groove.lipMm : thicknessMm) / 2;
  // A member on top runs to the left: its outer face looks up.
  const offLevel = (member: Member) => Math.abs(Math.abs(member.inclinationRad) - Math.PI);
  const tops = members.filter((member) => offLevel(member) <= nearLevelRad);
  const level = tops.find((member) => tops.length === 1 || offLevel(member) < 1e-6);
  const hanger = (id: string, member: Member, share: number, reach: [number, number]): Hanger => {
    const half = halfUsable(member);
    const alongMm = innerShift(member, thicknessMm) + share * half;
    return { id, member: member.index, alongMm, insetMm, allowanceMm: [(reach[0] - share) * half || 0, (reach[1] - share) * half || 0], bracketId: null, wallScrewId: null, anchorId: null };
  };
  if (level) return [hanger('left', level, 0.6, [0.25, 1]), hanger('right', level, -0.6, [-1, -0.25])];
  const { left, right } = atHighestCorner(members);
  const height = boxOf(outline).top - 0.3 * heightMm;
  const atHeight = (member: Member): number => shareAtHeight(member, height, insetMm, thicknessMm);
  const around = (share: number): [number, number] => [Math.max(-1, share - 0.6), Math.min(1, share + 0.6)];
  return [hanger('left', left, atHeight(left), around(atHeight(left))), hanger('right', right, atHeight(right), around(atHeight(right)))];
}

/** Half the inner face, less what is kept from its ends. */
const halfUsable = (member: Member): number => Math.max(0, member.shortPointMm / 2 - keepFromEndMm);

/** Where along the usable inner face (−0.8 to 0.8) a hanger comes nearest to a height. */
function shareAtHeight(member: Member, height: number, insetMm: number, thicknessMm: number): number {
  const half = halfUsable(member);
  const rise = Math.sin(member.inclinationRad);
  if (half === 0 || Math.abs(rise) < 1e-9) return 0;
  const alongMm = (height - alongMember(member, 0, insetMm).y) / rise;
  return Math.min(0.8, Math.max(-0.8, (alongMm - innerShift(member, thicknessMm)) / half));
}

/** The middle of the inner face, told from the middle of the outer side: not zero where the two ends are bevelled unlike. */
function innerShift({ start, end }: Member, thicknessMm: number): number {
  return (thicknessMm * (Math.tan(start.bevelRad) - Math.tan(end.bevelRad))) / 2;
}

/** The member that rises to the highest corner (on the right) and the one that falls from it (on the left). */
function atHighestCorner(members: Member[]): { left: Member; right: Member } {
  const falling = members.reduce((best, member) => (member.outerFrom.y > best.outerFrom.y + 1e-9 ? member : best));
  const rising = members[(falling.index + members.length - 1) % members.length]!;
  return { left: falling, right: rising };
}
