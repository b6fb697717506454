import { mergeRanges, type Range } from './shift-sweep.ts';

/** A hanger whose wall screw may slide along its member; all mm. */
export interface SeekHanger {
  id: string;
  frameId: string;
  xMm: number;
  /** How far it may slide, told along x: lowest and highest. */
  slide: readonly [number, number];
  /** What its own screw needs from the stud's edge, 1.5 D. */
  edgeMm: number;
}

/** Where studs are: centre, and half the width less the stud's own uncertainty. */
export interface StudZone {
  studId: string;
  xMm: number;
  halfMm: number;
}

/** Where a hanger ends up. */
export interface SeekPlace {
  id: string;
  frameId: string;
  studId: string | null;
  slideMm: number;
  /** Where the screw ends up. */
  xMm: number;
  /** Left until it no longer counts as in the stud; negative by how far it misses the nearest; null on a wall without studs. */
  marginMm: number | null;
  words: string;
}

/** Everything is reckoned in whole millionths of a millimetre, so that ends that touch do touch. */
export const parts = 1e6;
export const whole = (mm: number): number => Math.round(mm * parts);

const tenths = (mm: number): string => `${Math.round(mm * 10) / 10} mm`;

/** All studs of a wall, in millionths, left to right. */
export class Studs {
  readonly ids: readonly string[];
  readonly at: Float64Array;
  readonly half: Float64Array;

  constructor(zones: readonly StudZone[]) {
    const sorted = [...zones].sort((a, b) => a.xMm - b.xMm);
    this.ids = sorted.map((z) => z.studId);
    this.at = Float64Array.from(sorted, (z) => whole(z.xMm));
    this.half = Float64Array.from(sorted, (z) => whole(z.halfMm));
  }

  get count(): number {
    return this.at.length;
  }
}

/** One hanger against all studs, in millionths: stud k is met by shifts from start(k) to end(k), best about the middle, by half(k). */
export class Reach {
  readonly hanger: SeekHanger;
  private readonly studs: Studs;
  private readonly edge: number;
  private readonly x: number;
  private readonly down: number;
  private readonly up: number;

  constructor(hanger: SeekHanger, studs: Studs) {
    this.hanger = hanger;
    this.studs = studs;
    this.edge = whole(hanger.edgeMm);
    this.x = whole(hanger.xMm);
    this.down = whole(hanger.slide[0]);
    this.up = whole(hanger.slide[1]);
  }

  get studCount(): number {
    return this.studs.count;
  }

  /** Half the width that counts for this screw; below zero no place in the stud is sure, but it can still be the nearest. */
  half(k: number): number {
    return (this.studs.half[k] as number) - this.edge;
  }

  start(k: number): number {
    return (this.studs.at[k] as number) - this.half(k) - this.x - this.up;
  }

  end(k: number): number {
    return (this.studs.at[k] as number) + this.half(k) - this.x - this.down;
  }

  /** Shifts within the allowed ones that bring it into a stud, merged. */
  ranges(allowed: readonly Range[]): Range[] {
    const first = allowed[0]?.[0] ?? Infinity;
    const last = allowed[allowed.length - 1]?.[1] ?? -Infinity;
    const found: [number, number][] = [];
    let inOrder = true;
    for (let k = 0; k < this.studs.count; k++) {
      const from = this.start(k);
      const to = this.end(k);
      if (this.half(k) < 0 || to < first || from > last) continue;
      const before = found[found.length - 1];
      // Studs stand left to right, so nearly always one range follows the other.
      if (before && from <= before[1]) inOrder = false;
      found.push([from, to]);
    }
    return inOrder ? found : mergeRanges(found);
  }

  /** Margin in stud k after the best slide. */
  margin(k: number, shift: number): number {
    return this.half(k) - Math.max(0, this.start(k) + this.half(k) - shift, shift - this.end(k) + this.half(k));
  }

  /** The stud with the greatest margin, the one that needs the least slide among equals; −1 on a wall without studs. */
  best(shift: number): { stud: number; margin: number } {
    let stud = -1;
    let margin = -Infinity;
    for (let k = 0; k < this.studs.count; k++) {
      const here = this.margin(k, shift);
      if (here > margin || (here === margin && Math.abs(this.slide(k, shift)) < Math.abs(this.slide(stud, shift)))) {
        margin = here;
        stud = k;
      }
    }
    return { stud, margin };
  }

  /** Margin as drawn: no shift and no slide. */
  marginAsDrawn(): number {
    let margin = -Infinity;
    for (let k = 0; k < this.studs.count; k++) margin = Math.max(margin, this.half(k) - Math.abs((this.studs.at[k] as number) - this.x));
    return margin;
  }

  /** Slide that brings it nearest to the centre of stud k. */
  private slide(k: number, shift: number): number {
    return Math.min(Math.max((this.studs.at[k] as number) - this.x - shift, this.down), this.up);
  }

  place(shift: number, lengthText = tenths): SeekPlace {
    const { id, frameId } = this.hanger;
    const { stud, margin } = this.best(shift);
    const met = stud >= 0 && margin >= 0;
    // A hanger that meets no stud keeps its place on the frame: an anchor is as good anywhere.
    const slide = met ? this.slide(stud, shift) : 0;
    return {
      id, frameId, studId: met ? (this.studs.ids[stud] ?? null) : null, slideMm: slide / parts, xMm: (this.x + shift + slide) / parts,
      marginMm: stud < 0 ? null : margin / parts, words: this.words(stud, margin, slide, shift, lengthText),
    };
  }

  private words(stud: number, margin: number, slide: number, shift: number, lengthText: (mm: number) => string): string {
    if (stud < 0) return 'No studs are marked on this wall.';
    const mm = (v: number) => lengthText(Math.abs(v) / parts);
    if (margin < 0) {
      if (this.half(stud) < 0) return 'The nearest stud is not known well enough for so thick a screw.';
      return `Misses the nearest stud by ${mm(margin)} even when slid as far as it may.`;
    }
    const centred = this.x + shift + slide === this.studs.at[stud];
    const how = slide === 0 ? 'In the stud as it is' : `In the stud when slid ${mm(slide)} to the ${slide > 0 ? 'right' : 'left'}`;
    return centred ? `${how}, on its centre.` : `${how}, ${mm(margin)} to spare; its allowance ends there.`;
  }
}
