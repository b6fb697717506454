import { allowedShifts, type WallOutline } from '../hanging/allowed-shifts.ts';
import type { SeekHanger, SeekPlace } from '../hanging/hanger-reach.ts';
import { seekStuds, type SeekInput, type SeekScore } from '../hanging/seek-studs.ts';
import { edgeDiameters } from '../hanging/stud-zones.ts';
import { sameFrame } from '../layouts/edits.ts';
import type { Edit, Frame } from '../layouts/layout.ts';
import type { PlacedHanger } from '../patterns/hangers.ts';
import { formatLength } from '../units/length.ts';
import { pastFace } from '../walls/wall-face.ts';
import { hasStuds, usualDiameterMm } from './hung-body.ts';
import { hangerKey, type PlacedFrame } from './placed-frame.ts';
import type { Surroundings } from './scene.ts';

/** A shift of the whole layout, with how each hanger then stands. */
export interface SeekChoice {
  shiftMm: number;
  /** Every shift within this range does as well. */
  range: { fromMm: number; toMm: number };
  score: SeekScore;
  places: SeekPlace[];
}

/** What seeking studs comes to on a wall. */
export interface WallSeek {
  today: SeekScore;
  /** Hangers slid, frames left where they are; null where the frames may not stand so. */
  slidOnly: SeekChoice | null;
  /** The best shift and those that tie with it, the shortest way first; empty where no shift is allowed. */
  best: SeekChoice[];
  /** Why the layout as a whole stays where it is, in words; null where it may move. */
  held: string | null;
}

/** Most tying shifts that are told one by one. */
export const mostTies = 8;

/**
 * Seeks studs for all frames of a layout as they stand, hangers starting from where they have been slid to. A locked frame keeps its place,
 * and so do all others then, for the layout moves as one; hangers may still slide. Null on a wall without studs, or with none known.
 */
export function seekOnWall(frames: readonly PlacedFrame[], around: Surroundings): WallSeek | null {
  if (!hasStuds(around) || around.wall.studs.length === 0 || frames.every((f) => f.hangers.length === 0)) return null;
  const { wall, limits } = around;
  const hangers = frames.flatMap((placed) => placed.hangers.map((hanger, i) => seekHanger(placed, hanger, i, around)));
  const zones = wall.studs.map((s) => ({ studId: s.id, xMm: s.xMm, halfMm: s.widthMm / 2 - s.uncertaintyMm }));
  const outlines = frames.map((f): WallOutline => f.outline.map(({ x, y }) => [x, y] as const));
  const past = pastFace(wall).map((outlineMm) => ({ outlineMm, clearanceMm: 0 }));
  const free = allowedShifts(outlines, wall.widthMm, [...wall.obstructions, ...past]);
  const locked = frames.filter((f) => f.frame.locked);
  const allowed: SeekInput['allowed'] = locked.length > 0 ? [[0, 0]] : free;
  const input: SeekInput = { hangers, zones, allowed, lengthText: (mm) => formatLength(mm, limits.units) };

  const found = seekStuds(input);
  const at = (shiftMm: number, range: SeekChoice['range']): SeekChoice | null => {
    const { score, places } = seekStuds({ ...input, allowed: [[shiftMm, shiftMm]] });
    return score && { shiftMm, range, score, places };
  };
  const best = found.ties
    .map((range) => ({ range, shiftMm: Math.min(Math.max(0, range.fromMm), range.toMm) }))
    .sort((a, b) => Math.abs(a.shiftMm) - Math.abs(b.shiftMm) || b.shiftMm - a.shiftMm)
    .slice(0, mostTies)
    .flatMap(({ range, shiftMm }) => at(shiftMm, range) ?? []);
  const held = locked.length > 0 ? `${locked.length === 1 ? 'A frame is' : `${locked.length} frames are`} locked, so the layout stays where it is.`
    : free.length === 0 ? 'The layout is wider than the wall, or something stands in its way wherever it is put.' : null;
  return { today: found.today, slidOnly: at(0, { fromMm: 0, toMm: 0 }), best, held };
}

function seekHanger(placed: PlacedFrame, at: PlacedHanger, index: number, { book }: Surroundings): SeekHanger {
  const hanger = placed.pattern.design.hangers[index]!;
  const screw = book.screws.find((s) => s.id === hanger.wallScrewId);
  const ends = [at.slide.from.x - at.x, at.slide.to.x - at.x];
  return {
    id: hangerKey(placed.frame, hanger), frameId: placed.frame.id, xMm: at.x,
    slide: [Math.min(0, ...ends), Math.max(0, ...ends)], edgeMm: edgeDiameters * (screw?.diameterMm ?? usualDiameterMm),
  };
}

/** The edits that put a choice on the wall: every frame moved by its shift, every hanger slid along its member as far as it asks. */
export function seekEdits(frames: readonly PlacedFrame[], choice: Pick<SeekChoice, 'shiftMm' | 'places'>): Edit[] {
  const slides = new Map(choice.places.map((p) => [p.id, p.slideMm]));
  return frames.flatMap((placed): Edit[] => {
    const before = placed.frame;
    const hangerSlides = Object.fromEntries(
      placed.hangers.flatMap((hanger, i) => {
        const slid = slidBy(placed.pattern.design.hangers[i]!.allowanceMm, hanger, slides.get(hangerKey(before, hanger)) ?? 0);
        return slid === 0 ? [] : [[hanger.id, slid]];
      }),
    );
    const after: Frame = { ...before, xMm: before.xMm + choice.shiftMm, hangerSlides };
    if (Object.keys(hangerSlides).length === 0) delete after.hangerSlides;
    return sameFrame(before, after) ? [] : [{ kind: 'frame', frameId: before.id, before, after }];
  });
}

/** Where along its member a hanger stands once it has moved by `dx` along the wall. */
function slidBy([low, high]: readonly [number, number], at: PlacedHanger, dx: number): number {
  const along = at.slide.to.x - at.slide.from.x;
  if (dx === 0 || along === 0) return at.slidMm;
  return Math.min(high, Math.max(low, at.slidMm + (dx * (high - low)) / along));
}
