import { boxOf } from '../../geometry/polygon.ts';
import type { SeekScore } from '../../hanging/seek-studs.ts';
import { applyEdits } from '../../layouts/edits.ts';
import type { Frame } from '../../layouts/layout.ts';
import type { Ledger } from '../ledger.ts';
import { placeFrame, type PlacedFrame } from '../placed-frame.ts';
import type { Scene } from '../scene.ts';
import { seekEdits, seekOnWall, type SeekChoice, type WallSeek } from '../seek-on-wall.ts';
import { boxRoundPuts, frameOf, type ArrangeAsk, type Put } from './ask.ts';
import type { Ground } from './ground.ts';

/** One arrangement, shifted to the studs, with what the checks say of it. */
export interface Candidate {
  /** The same for arrangements that put the same patterns in the same places. */
  key: string;
  how: string;
  /** Under ids and labels that hold only among themselves. */
  frames: Frame[];
  asked: number;
  /** Findings that one of these frames has a part in. */
  stops: number;
  cautions: number;
  /** How hangers meet studs; null on a wall without any. */
  studs: SeekScore | null;
  /** How far all of it was moved along the wall to meet studs. */
  shiftMm: number;
  /** From the middle of the shape to the centre of mass: to the right and upwards, mm. */
  balance: { acrossMm: number; upMm: number };
  /** Width and height of the whole, mm, and the middle of it above the floor. */
  size: { widthMm: number; heightMm: number; middleAboveFloorMm: number };
}

/** Studs 24 in on centre repeat themselves within half of that to either side: a longer shift is taken only where it holds more. */
const nearMm = 305;

/** A name for what is put where, to a tenth of a millimetre. */
export function keyOf(puts: readonly Put[]): string {
  return puts.map(({ piece, at }) => `${piece.pattern.id} ${at.xMm.toFixed(1)} ${at.yMm.toFixed(1)} ${at.turnRad.toFixed(4)}`).sort().join('|');
}

/** Gives an arrangement its best uniform shift, and puts it before the checks. `ledgerOf` may be kept from one arrangement to the next. */
export function judge(puts: readonly Put[], how: string, ask: ArrangeAsk, ground: Ground, ledgerOf: (scene: Scene) => Ledger, asked: number): Candidate {
  const { scene } = ask;
  const drawn = puts.map((put, i) => frameOf(put, `new ${i + 1}`, `+${i + 1}`));
  const choice = bestChoice(drawn.map((frame, i) => placeFrame(frame, puts[i]!.piece.pattern)), puts, scene, ground);
  const frames = choice ? applyEdits(drawn, scene.sheet, seekEdits(drawn.map((f, i) => placeFrame(f, puts[i]!.piece.pattern)), choice)).frames : drawn;

  const ledger = ledgerOf({ ...scene, frames: [...scene.frames, ...frames] });
  const own = new Set(frames.map((f) => f.id));
  const findings = ledger.findings.filter((f) => f.frameIds.some((id) => own.has(id)));
  const hung = ledger.frames.filter((f) => own.has(f.frame.id));
  const box = boxOf(hung.flatMap((f) => f.outline));
  return {
    key: keyOf(puts), how, frames, asked,
    stops: findings.filter((f) => f.weight === 'stop').length,
    cautions: findings.filter((f) => f.weight === 'caution').length,
    studs: choice?.score ?? null,
    shiftMm: choice?.shiftMm ?? 0,
    balance: balanceOf(hung),
    size: { widthMm: box.right - box.left, heightMm: box.top - box.bottom, middleAboveFloorMm: (box.bottom + box.top) / 2 },
  };
}

/** The best shift nearby; one from farther along the wall only where it holds more frames, or has more hangers in studs. */
function bestChoice(placed: readonly PlacedFrame[], puts: readonly Put[], scene: Scene, ground: Ground): SeekChoice | null {
  const { left, right } = boxRoundPuts(puts);
  const near = { ...ground.bounds, left: Math.max(ground.bounds.left, left - nearMm), right: Math.min(ground.bounds.right, right + nearMm) };
  const seek = (bounds: typeof near): SeekChoice | null => {
    const found = seekOnWall(placed, { wall: ground.fenced(bounds), book: scene.book, limits: scene.limits });
    return found && firstFree(found, puts, ground);
  };
  const here = seek(near);
  if (near.left === ground.bounds.left && near.right === ground.bounds.right) return here;
  const anywhere = seek(ground.bounds);
  return here && anywhere && holds(anywhere.score, here.score) > 0 ? anywhere : (here ?? anywhere);
}

/** Seeking knows width alone: under a sloped ceiling the first of the best shifts that keeps to the wall's face counts. */
function firstFree({ best, slidOnly }: WallSeek, puts: readonly Put[], { isFree }: Ground): SeekChoice | null {
  const choices = slidOnly ? [...best, slidOnly] : best;
  return choices.find(({ shiftMm }) => puts.every((p) => isFree(p.outline.map(({ x, y }) => ({ x: x + shiftMm, y }))))) ?? null;
}

/** Above 0 where `a` holds more by studs than `b`. */
export const holds = (a: SeekScore, b: SeekScore): number => a.framesHeld - b.framesHeld || a.hangersInStuds - b.hangersInStuds;

function balanceOf(frames: readonly PlacedFrame[]): Candidate['balance'] {
  const box = boxOf(frames.flatMap((f) => f.outline));
  let kg = 0;
  let x = 0;
  let y = 0;
  for (const { mass, contents, centre } of frames) {
    const own = mass.kg + contents.kg;
    kg += own;
    x += own * centre.x;
    y += own * centre.y;
  }
  if (kg === 0) return { acrossMm: 0, upMm: 0 };
  return { acrossMm: x / kg - (box.left + box.right) / 2, upMm: y / kg - (box.bottom + box.top) / 2 };
}
