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

/** One hanger against all zones, in millionths: zone k is met by shifts from `starts[k]` to `ends[k]`, best in the middle by `halves[k]`. */
export class Reach {
  readonly hanger: SeekHanger;
  readonly zones: readonly StudZone[];
  readonly starts: number[] = [];
  readonly ends: number[] = [];
  readonly halves: number[] = [];
  private readonly at: number[] = [];
  private readonly lowest: number;
  private readonly highest: number;

  constructor(hanger: SeekHanger, zones: readonly StudZone[]) {
    this.hanger = hanger;
    this.zones = zones;
    this.lowest = whole(hanger.xMm + hanger.slide[0]);
    this.highest = whole(hanger.xMm + hanger.slide[1]);
    zones.forEach((zone, k) => {
      const half = whole(zone.halfMm - hanger.edgeMm);
      // Too narrow for this screw: no place in it is sure, but it can still be the nearest.
      this.halves[k] = half;
      this.at[k] = whole(zone.xMm);
      this.starts[k] = this.at[k] - half - this.highest;
      this.ends[k] = this.at[k] + half - this.lowest;
    });
  }

  /** The same hanger nailed to its place. */
  still(): Reach {
    return new Reach({ ...this.hanger, slide: [0, 0] }, this.zones);
  }

  /** Shifts within the allowed ones that bring it into a stud, merged. */
  ranges(allowed: readonly Range[]): Range[] {
    const first = allowed[0]?.[0] ?? Infinity;
    const last = allowed[allowed.length - 1]?.[1] ?? -Infinity;
    const found: Range[] = [];
    for (let k = 0; k < this.halves.length; k++) {
      const from = this.starts[k] as number;
      const to = this.ends[k] as number;
      if ((this.halves[k] as number) < 0 || to < first || from > last) continue;
      found.push([from, to]);
    }
    return found.length < 2 ? found : mergeRanges(found);
  }

  /** Margin (millionths) in zone k after the best slide. */
  margin(k: number, shift: number): number {
    return Math.min(this.halves[k] as number, shift - (this.starts[k] as number), (this.ends[k] as number) - shift);
  }

  /** The zone with the greatest margin; zone −1 on a wall without studs. */
  best(shift: number): { zone: number; margin: number } {
    let zone = -1;
    let margin = -Infinity;
    for (let k = 0; k < this.halves.length; k++) {
      const here = this.margin(k, shift);
      if (here > margin || (here === margin && this.reachFor(k, shift) < this.reachFor(zone, shift))) {
        margin = here;
        zone = k;
      }
    }
    return { zone, margin };
  }

  /** How far it must slide to stand best in zone k. */
  private reachFor(k: number, shift: number): number {
    return Math.abs(this.slideFor(k, shift));
  }

  private slideFor(k: number, shift: number): number {
    const x = whole(this.hanger.xMm);
    const wanted = (this.at[k] as number) - x - shift;
    return Math.min(Math.max(wanted, this.lowest - x), this.highest - x);
  }

  place(shift: number): SeekPlace {
    const { id, frameId } = this.hanger;
    const { zone, margin } = this.best(shift);
    const x = whole(this.hanger.xMm);
    const met = zone >= 0 && margin >= 0;
    // A hanger that meets no stud keeps its place on the frame: an anchor is as good anywhere.
    const slide = met ? this.slideFor(zone, shift) : 0;
    return {
      id, frameId, studId: met ? (this.zones[zone]?.studId ?? null) : null, slideMm: slide / parts, xMm: (x + shift + slide) / parts,
      marginMm: zone < 0 ? null : margin / parts, words: this.words(zone, margin, slide, shift),
    };
  }

  private words(zone: number, margin: number, slide: number, shift: number): string {
    if (zone < 0) return 'No studs are marked on this wall.';
    const mm = (v: number) => `${Math.round(Math.abs(v) / (parts / 10)) / 10} mm`;
    if (margin < 0) {
      if ((this.halves[zone] as number) < 0) return 'The nearest stud is not known well enough for so thick a screw.';
      return `Misses the nearest stud by ${mm(margin)} even when slid as far as it may.`;
    }
    const centred = this.slideFor(zone, shift) === (this.at[zone] as number) - whole(this.hanger.xMm) - shift;
    const how = slide === 0 ? 'In the stud as it is' : `In the stud when slid ${mm(slide)} to the ${slide > 0 ? 'right' : 'left'}`;
    return centred ? `${how}, on its centre.` : `${how}, ${mm(margin)} to spare; its allowance ends there.`;
  }
}
