import { applyHomography, depthSign, homographyFrom, type Homography, type Point } from './homography.ts';
import type { z } from 'zod';
import type { Mark as MarkShape } from './mark.ts';

export type Mark = z.infer<typeof MarkShape>;

/** Why marks cannot carry a straightening, in words for the person who set them. */
export interface MarksTrouble {
  code: 'too few' | 'repeated on photo' | 'repeated on wall' | 'in line on photo' | 'in line on wall' | 'wrong order' | 'outside photo';
  words: string;
  /** Marks concerned, counted from 0. */
  which: number[];
  /** For a wrong order, where one order works: mark i belongs with the wall position now typed for mark `order[i]`. */
  order?: number[];
}

/** Marks on a photo closer than this (of its longer side) are one mark set twice: 0.5 %, 20 px of 4000. */
const sameOnPhoto = 0.005;
/** Positions on a wall closer than this, mm, cannot be told apart with a tape. */
const sameOnWallMm = 5;
/** Three points count as in line where the triangle's height is less than this part of its longest side (about 1.7°). */
const flatPart = 0.03;
/** Of many marks some three are always nearly in line, and a lens may bend those over: their turn says nothing below this. */
const flatOfMany = 0.1;

/**
 * Judges four or more marks before they are used: null where they are fit, else the first trouble found.
 * `photo` is the upright photo's size, px. Any three of four marks must stand clear of one line, and going round
 * the marks must turn the same way on the photo as on the wall: a camera in front of a wall never mirrors it.
 */
export function marksTrouble(marks: readonly Mark[], photo: { widthPx: number; heightPx: number }): MarksTrouble | null {
  if (marks.length < 4) {
    return { code: 'too few', words: `Four marks are needed; there are ${marks.length}.`, which: marks.map((_, i) => i) };
  }
  return outside(marks, photo) ?? repeated(marks, photo) ?? inLine(marks) ?? wrongOrder(marks);
}

/** The map from the photo (px) to the wall (mm) that the marks give. Judge the marks first. */
export function photoToWall(marks: readonly Mark[]): Homography {
  return homographyFrom(marks.map((m) => ({ from: m.px, to: m.mm })));
}

function outside(marks: readonly Mark[], photo: { widthPx: number; heightPx: number }): MarksTrouble | null {
  const which = marks.flatMap((m, i) => (m.px.x < 0 || m.px.y < 0 || m.px.x > photo.widthPx || m.px.y > photo.heightPx ? [i] : []));
  if (which.length === 0) return null;
  return { code: 'outside photo', which, words: `${name(which)} ${which.length > 1 ? 'lie' : 'lies'} outside the photo. Drag ${which.length > 1 ? 'them' : 'it'} back onto the picture.` };
}

function repeated(marks: readonly Mark[], photo: { widthPx: number; heightPx: number }): MarksTrouble | null {
  const nearPx = sameOnPhoto * Math.max(photo.widthPx, photo.heightPx);
  for (const [i, j] of pairsOf(marks.length)) {
    const a = at(marks, i);
    const b = at(marks, j);
    if (distance(a.px, b.px) < nearPx) {
      return { code: 'repeated on photo', which: [i, j], words: `${name([i, j])} stand on the same spot of the photo. Drag one of them to its own point.` };
    }
    if (distance(a.mm, b.mm) < sameOnWallMm) {
      return { code: 'repeated on wall', which: [i, j], words: `${name([i, j])} have the same position on the wall. Check the measures typed for them.` };
    }
  }
  return null;
}

/** With four marks no three may be in line; with more, some four must be found of which that is true. */
function inLine(marks: readonly Mark[]): MarksTrouble | null {
  const bad = triplesOf(marks.length).flatMap((triple): { triple: number[]; where: 'photo' | 'wall' }[] => {
    const three = triple.map((i) => at(marks, i));
    if (isFlat(three.map((m) => m.px))) return [{ triple, where: 'photo' }];
    return isFlat(three.map((m) => m.mm)) ? [{ triple, where: 'wall' }] : [];
  });
  const first = bad[0];
  if (!first) return null;
  const flatOnes = new Set(bad.map((b) => b.triple.join()));
  if (hasFour(marks.length, (i, j, k) => !flatOnes.has([i, j, k].join()))) return null;
  return first.where === 'photo'
    ? { code: 'in line on photo', which: first.triple, words: `${name(first.triple)} lie nearly in one line on the photo, so the wall's slant cannot be read from them. Spread the marks into a four-cornered shape.` }
    : { code: 'in line on wall', which: first.triple, words: `${name(first.triple)} lie nearly in one line by the positions typed. Check the measures, or mark points that make a four-cornered shape.` };
}

function wrongOrder(marks: readonly Mark[]): MarksTrouble | null {
  const order = marks.map((_, i) => i);
  if (agrees(marks, order)) return null;
  const which = order;
  const swapped = marks.length > 4 && marks.length <= mostToSort ? swaps(order).find((o) => agrees(marks, o)) : undefined;
  if (swapped) {
    const [a, b] = order.filter((i) => swapped[i] !== i);
    return { code: 'wrong order', which: [a!, b!], order: swapped, words: `${name([a!, b!])} seem to have each other’s positions: with the two exchanged all marks go round the same way on the photo as on the wall.` };
  }
  if (marks.length > 4) {
    return { code: 'wrong order', which, words: 'The marks do not go round the same way on the photo as on the wall. Check which position belongs to which mark.' };
  }
  const working = permutations(4).filter((p) => agrees(marks, p));
  const best = working.map((p) => ({ p, lean: leanOf(marks, p) })).sort((a, b) => a.lean - b.lean)[0];
  if (!best) {
    return { code: 'wrong order', which, words: 'These positions cannot belong to these marks in any order: check the marks and the measures.' };
  }
  const list = best.p.map((from, i) => `mark ${i + 1} with the position typed for mark ${from + 1}`).filter((_, i) => best.p[i] !== i);
  return {
    code: 'wrong order', which, order: best.p,
    words: `The marks are in a different order on the photo than on the wall, so the lines between them cross. This order works: ${list.join(', ')}.`,
  };
}

/** Whether every three marks turn oppositely in px (y down) and mm (y up), as they do on any photo from the front. */
function agrees(marks: readonly Mark[], order: readonly number[]): boolean {
  const least = marks.length > 4 ? flatOfMany : flatPart;
  return triplesOf(marks.length).every((triple) => {
    const px = triple.map((i) => at(marks, i).px);
    const mm = triple.map((i) => at(marks, order[i] ?? i).mm);
    if (isFlat(px, least) || isFlat(mm, least)) return true;
    return Math.sign(turn(px)) === -Math.sign(turn(mm));
  });
}

/** How far from upright the wall would stand on the photo under this order, rad: 0 where wall-up is photo-up. */
function leanOf(marks: readonly Mark[], order: readonly number[]): number {
  const h = homographyFrom(marks.map((m, i) => ({ from: at(marks, order[i] ?? i).mm, to: m.px })));
  const middle = { x: sum(marks.map((m) => m.mm.x)) / marks.length, y: sum(marks.map((m) => m.mm.y)) / marks.length };
  const span = Math.max(...marks.map((m) => distance(m.mm, middle)));
  const step = { x: middle.x, y: middle.y + span / 10 };
  if (Math.sign(depthSign(h, middle)) !== Math.sign(depthSign(h, step))) return Math.PI;
  const a = applyHomography(h, middle);
  const b = applyHomography(h, step);
  return Math.abs(Math.atan2(b.x - a.x, a.y - b.y));
}

/** With more marks than this, each exchange of two is not tried. */
const mostToSort = 12;

function swaps(order: readonly number[]): number[][] {
  return pairsOf(order.length).map(([a, b]) => order.map((v, i) => (i === a ? order[b]! : i === b ? order[a]! : v)));
}

function isFlat(three: readonly Point[], flat = flatPart): boolean {
  const longest = Math.max(distance(at(three, 0), at(three, 1)), distance(at(three, 1), at(three, 2)), distance(at(three, 0), at(three, 2)));
  return longest === 0 || Math.abs(turn(three)) / (longest * longest) < flat;
}

/** Twice the signed area of a triangle: above nought where it turns counter-clockwise in axes with y up. */
function turn(three: readonly Point[]): number {
  const [a, b, c] = [at(three, 0), at(three, 1), at(three, 2)];
  return (b.x - a.x) * (c.y - a.y) - (b.y - a.y) * (c.x - a.x);
}

function distance(a: Point, b: Point): number {
  return Math.hypot(a.x - b.x, a.y - b.y);
}

function sum(values: readonly number[]): number {
  return values.reduce((total, v) => total + v, 0);
}

function at<T>(list: readonly T[], i: number): T {
  const item = list[i];
  if (item === undefined) throw new RangeError(`There is no item ${i} of ${list.length}.`);
  return item;
}

function name(which: readonly number[]): string {
  const numbers = which.map((i) => String(i + 1));
  const last = numbers.pop();
  return numbers.length === 0 ? `Mark ${last}` : `Marks ${numbers.join(', ')} and ${last}`;
}

function pairsOf(n: number): [number, number][] {
  return range(n).flatMap((i) => range(n).filter((j) => j > i).map((j): [number, number] => [i, j]));
}

function triplesOf(n: number): number[][] {
  return pairsOf(n).flatMap(([i, j]) => range(n).filter((k) => k > j).map((k) => [i, j, k]));
}

/** Whether there are four of n, counted upwards, each three of which are good. */
function hasFour(n: number, good: (i: number, j: number, k: number) => boolean): boolean {
  for (let i = 0; i < n; i++) for (let j = i + 1; j < n; j++) for (let k = j + 1; k < n; k++) {
    if (!good(i, j, k)) continue;
    for (let l = k + 1; l < n; l++) if (good(i, j, l) && good(i, k, l) && good(j, k, l)) return true;
  }
  return false;
}

function range(n: number): number[] {
  return Array.from({ length: n }, (_, i) => i);
}

function permutations(n: number): number[][] {
  if (n === 0) return [[]];
  return permutations(n - 1).flatMap((p) => range(n).map((place) => [...p.slice(0, place), n - 1, ...p.slice(place)]));
}
