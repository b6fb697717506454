import type { Point } from '../../../shared/walls/homography.ts';
import type { Typed } from './wall-draft.ts';

/** A line over a thing on the straightened picture, and its length as measured on the wall. */
export interface Check {
  fromXMm: Typed;
  fromYMm: Typed;
  toXMm: Typed;
  toYMm: Typed;
  measuredMm: Typed;
}

export const emptyCheck: Check = { fromXMm: null, fromYMm: null, toXMm: null, toYMm: null, measuredMm: null };

export const typed = (mm: Typed): mm is number => mm !== null && Number.isFinite(mm);

/** The ends of a check as far as they are given. */
export function endsOf({ fromXMm, fromYMm, toXMm, toYMm }: Check): [Point, Point] | null {
  return typed(fromXMm) && typed(fromYMm) && typed(toXMm) && typed(toYMm) ? [{ x: fromXMm, y: fromYMm }, { x: toXMm, y: toYMm }] : null;
}
