import type { Point } from '../geometry/point.ts';
import { distanceBetween } from '../geometry/polygon-distance.ts';
import { boxOf } from '../geometry/polygon.ts';
import { MM_PER_INCH } from '../units/constants.ts';
import { formatLength } from '../units/length.ts';
import type { TemplateFrame, TemplateHanger, TemplateInput } from './template-input.ts';

/** The level line above the floor and the plumb line from the wall's left edge that the whole template is set by, mm. */
export interface Datums {
  levelMm: number;
  plumbMm: number;
}

/** Heights nearer than this count as one course of frames, mm. */
const courseMm = 20;
/** Frames no farther from each other than a wide reveal stand side by side, mm. */
const touchMm = 20;

interface Placed {
  frame: TemplateFrame;
  foot: number;
  left: number;
}

/**
 * Frames in the order they are hung: from the lowest course up, each course from the left, so that no frame waits for one below it. With a chosen
 * first frame the order grows from there: next is always a frame that touches one already hung, and of those one that no other frame still to be
 * hung carries, the nearest in height first.
 */
export function hangOrder(frames: TemplateFrame[], firstId: string | null = null): TemplateFrame[] {
  const placed = frames.map((frame): Placed => ({ frame, foot: least(frame.outlineMm, 'y'), left: least(frame.outlineMm, 'x') }));
  placed.sort((a, b) => a.foot - b.foot);
  const first = placed.find((one) => one.frame.id === firstId);
  return first ? grownFrom(first, placed) : byCourses(placed);
}

function byCourses(placed: Placed[]): TemplateFrame[] {
  const courses: Placed[][] = [];
  for (const one of placed) {
    const course = courses.at(-1);
    if (course && one.foot - course[0]!.foot <= courseMm) course.push(one);
    else courses.push([one]);
  }
  return courses.flatMap((course) => course.sort((a, b) => a.left - b.left).map((one) => one.frame));
}

function grownFrom(first: Placed, placed: Placed[]): TemplateFrame[] {
  const touching = neighbours(placed);
  const hung = new Set([first]);
  while (hung.size < placed.length) {
    let next: Placed | null = null;
    let least: number[] = [];
    for (const one of placed) {
      if (hung.has(one)) continue;
      const beside = touching.get(one)!;
      // What lies lower than the first frame cannot carry before its turn comes.
      const waits = beside.some((b) => !hung.has(b) && b.foot < one.foot - courseMm && b.foot >= first.foot - courseMm);
      const score = [beside.some((b) => hung.has(b)) ? 0 : 1, waits ? 1 : 0, Math.round(Math.abs(one.foot - first.foot) / courseMm), one.left];
      if (next === null || comesBefore(score, least)) [next, least] = [one, score];
    }
    hung.add(next!);
  }
  return [...hung].map((one) => one.frame);
}

function neighbours(placed: Placed[]): Map<Placed, Placed[]> {
  const boxes = placed.map((one) => boxOf(one.frame.outlineMm));
  const near = new Map<Placed, Placed[]>(placed.map((one) => [one, []]));
  for (const [i, a] of placed.entries()) {
    for (let k = i + 1; k < placed.length; k += 1) {
      const b = placed[k]!;
      const [boxA, boxB] = [boxes[i]!, boxes[k]!];
      if (boxA.left > boxB.right + touchMm || boxB.left > boxA.right + touchMm || boxA.bottom > boxB.top + touchMm || boxB.bottom > boxA.top + touchMm) continue;
      if (distanceBetween(a.frame.outlineMm, b.frame.outlineMm) > touchMm) continue;
      near.get(a)!.push(b);
      near.get(b)!.push(a);
    }
  }
  return near;
}

function comesBefore(a: number[], b: number[]): boolean {
  for (const [i, value] of a.entries()) if (value !== b[i]) return value < b[i]!;
  return false;
}

function least(points: Point[], axis: 'x' | 'y'): number {
  return Math.min(...points.map((p) => p[axis]));
}

/** Pilot hole in the shop's units: inches to the nearest 1/64, as drill bits are sold, with the millimetres beside; or mm alone. */
export function drillText(hanger: Pick<TemplateHanger, 'drillMm'>, units: 'in' | 'mm'): string {
  if (hanger.drillMm === null) return 'drill as screw asks';
  const metric = formatLength(hanger.drillMm, 'mm');
  if (units === 'mm') return `drill ${metric}`;
  let over = Math.max(1, Math.round((hanger.drillMm / MM_PER_INCH) * 64));
  let under = 64;
  while (over % 2 === 0 && under > 1) {
    over /= 2;
    under /= 2;
  }
  const inches = under === 1 ? `${over}` : over < under ? `${over}/${under}` : `${Math.floor(over / under)} ${over % under}/${under}`;
  return `drill ${inches}" (${metric})`;
}

/** The two screws farthest from each other, and their distance: one tape across the taped-up template proves the whole. */
export function longestSpan(frames: TemplateFrame[]): { from: TemplateHanger; to: TemplateHanger; mm: number } | null {
  const screws = frames.flatMap((f) => f.hangers);
  let longest: { from: TemplateHanger; to: TemplateHanger; mm: number } | null = null;
  for (const [i, from] of screws.entries()) {
    for (const to of screws.slice(i + 1)) {
      const mm = Math.hypot(to.x - from.x, to.y - from.y);
      if (longest === null || mm > longest.mm) longest = { from, to, mm };
    }
  }
  return longest;
}

/**
 * Heights and distances of the two datums: round figures near the middle of the screws (or of the frames where there are none), so that the
 * lines cross as many sheets as can be.
 */
export function chooseDatums(input: Pick<TemplateInput, 'frames' | 'units'>): Datums {
  const screws: Point[] = input.frames.flatMap((f) => f.hangers);
  const points = screws.length > 0 ? screws : input.frames.flatMap((f) => f.outlineMm);
  if (points.length === 0) return { levelMm: 0, plumbMm: 0 };
  const round = input.units === 'mm' ? 50 : MM_PER_INCH;
  const middle = (axis: 'x' | 'y') => {
    const values = points.map((p) => p[axis]);
    return Math.round((Math.min(...values) + Math.max(...values)) / 2 / round) * round;
  };
  return { levelMm: middle('y'), plumbMm: middle('x') };
}

/** How many of each hardware the screws ask for, most first. */
export function hardwareCounts(frames: TemplateFrame[]): { hardware: string; count: number }[] {
  const counts = new Map<string, number>();
  for (const { hardware } of frames.flatMap((f) => f.hangers)) if (hardware !== '') counts.set(hardware, (counts.get(hardware) ?? 0) + 1);
  return [...counts].map(([hardware, count]) => ({ hardware, count })).sort((a, b) => b.count - a.count);
}

/** What one hanger is hung by, piece by piece: `plate; #8 screw` is a plate and a screw. */
function piecesOf({ hardware }: TemplateHanger): string[] {
  return hardware.split(/;\s*/).filter(Boolean);
}

/** The hardware of each frame as one packs it: frames whose bags are alike stand together. */
export function hardwareBags(order: TemplateFrame[]): { frames: string[]; pieces: { name: string; count: number }[] }[] {
  const bags = new Map<string, { frames: string[]; pieces: { name: string; count: number }[] }>();
  for (const frame of order) {
    const counts = new Map<string, number>();
    for (const piece of frame.hangers.flatMap(piecesOf)) counts.set(piece, (counts.get(piece) ?? 0) + 1);
    const pieces = [...counts].map(([name, count]) => ({ name, count })).sort((a, b) => (a.name < b.name ? -1 : 1));
    const key = JSON.stringify(pieces);
    const bag = bags.get(key);
    if (bag) bag.frames.push(frame.label);
    else bags.set(key, { frames: [frame.label], pieces });
  }
  return [...bags.values()];
}
