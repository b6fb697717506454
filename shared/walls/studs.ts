import type { z } from 'zod';
import { isConfirmed, type Obstruction, type Stud } from './wall.ts';

/**
 * Usual spacings of studs on centre, mm. 16 in and 24 in: the International Residential Code's table R602.3(5)
 * spacings for stud walls; 400 mm and 600 mm: the metric sheet sizes' halves and thirds (common practice).
 */
export const usualSpacings = [
  { name: '16 in o.c.', mm: 406.4 },
  { name: '24 in o.c.', mm: 609.6 },
  { name: '400 mm o.c.', mm: 400 },
  { name: '600 mm o.c.', mm: 600 },
] as const;

/** Face widths: 1 1/2 in dressed two-by lumber (American Softwood Lumber Standard PS 20), 1 5/8 in steel flange 41.3 mm (common practice). */
export const studFaceMm = { wood: 38.1, steel: 41.3 } as const;

/**
 * How far off a stud may be by the way it was found, mm, until someone says better (common practice: a finder reads
 * an edge to about 6 mm, a probe or a magnet on a screw to 3 mm; framing by its spacing alone wanders by 1/2 in).
 */
export const usualUncertaintyMm: Record<Stud['foundBy'], number> = { finder: 6, probe: 3, magnet: 3, seen: 2, spacing: 12.7 };

/** Centres (mm) of studs at a spacing from a first one to the wall's right end; the first stands as given. */
export function studsBySpacing(firstMm: number, spacingMm: number, wallWidthMm: number): number[] {
  if (!(spacingMm >= 100)) throw new RangeError(`Studs are at least 100 mm on centre; this is ${spacingMm} mm.`);
  const count = firstMm > wallWidthMm ? 0 : Math.floor((wallWidthMm - firstMm) / spacingMm + 1e-9) + 1;
  return Array.from({ length: count }, (_, i) => firstMm + i * spacingMm);
}

/** Left to right. */
export function inOrder<S extends Pick<Stud, 'xMm'>>(studs: readonly S[]): S[] {
  return [...studs].sort((a, b) => a.xMm - b.xMm);
}

/** How many studs someone must still put a probe to. */
export function unconfirmedCount(studs: readonly Pick<Stud, 'foundBy'>[]): number {
  return studs.filter((s) => !isConfirmed(s)).length;
}

type Outline = z.infer<typeof Obstruction>['outlineMm'];
export interface Rectangle { leftMm: number; bottomMm: number; widthMm: number; heightMm: number }

/** A rectangle's outline, lower left corner first, counter-clockwise. */
export function rectangleOutline(r: Rectangle): Outline {
  const right = r.leftMm + r.widthMm;
  const top = r.bottomMm + r.heightMm;
  return [[r.leftMm, r.bottomMm], [right, r.bottomMm], [right, top], [r.leftMm, top]];
}

/** The rectangle that an outline fills from edge to edge. */
export function boundsOf(outline: Outline): Rectangle {
  const xs = outline.map(([x]) => x);
  const ys = outline.map(([, y]) => y);
  const leftMm = Math.min(...xs);
  const bottomMm = Math.min(...ys);
  return { leftMm, bottomMm, widthMm: Math.max(...xs) - leftMm, heightMm: Math.max(...ys) - bottomMm };
}

/** Clearances to start from, mm, by kind (shop practice: room for a hand and a plate's edge). */
export const usualClearanceMm: Record<Obstruction['kind'], number> = {
  opening: 25, switch: 50, outlet: 50, thermostat: 100, vent: 100, radiator: 150, trim: 10, furniture: 25, pipe: 50, cable: 50,
};

/** The clearance to start from, mm, as a shop would say it: to the millimetre, or to the half inch. */
export function startingClearanceMm(kind: Obstruction['kind'], units: 'in' | 'mm'): number {
  const mm = usualClearanceMm[kind];
  return units === 'mm' ? mm : Math.max(1, Math.round(mm / 12.7)) * 12.7;
}

/** New studs nearer than this to one that was found are taken to be that one, mm. */
const sameStudMm = 100;

/**
 * Lays studs at `centresMm` beside those already there: what only a spacing promised is given up, what was found stays,
 * and no promised stud is set where a found one stands. `newId` makes identifiers.
 */
export function laidBySpacing(studs: readonly Stud[], centresMm: readonly number[], widthMm: number, newId: () => string): Stud[] {
  const found = studs.filter((s) => s.foundBy !== 'spacing');
  const promised = centresMm
    .filter((x) => !found.some((s) => Math.abs(s.xMm - x) < sameStudMm))
    .map((xMm): Stud => ({ id: newId(), xMm, widthMm, foundBy: 'spacing', uncertaintyMm: usualUncertaintyMm.spacing }));
  return inOrder([...found, ...promised]);
}
