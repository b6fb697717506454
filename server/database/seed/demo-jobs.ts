import { randomUUID } from 'node:crypto';
import { readFileSync } from 'node:fs';
import path from 'node:path';
import { z } from 'zod';
import type { Frame } from '../../../shared/layouts/layout.ts';
import { startingClearanceMm, usualUncertaintyMm } from '../../../shared/walls/studs.ts';
import { demoShop } from './accounts.ts';
import type { Mark, Obstruction, Stud, Zone } from '../../../shared/walls/wall.ts';

const pair = z.tuple([z.number(), z.number()]);
const Scene = z.object({
  wallMm: z.object({ width: z.number(), height: z.number() }),
  marks: z.array(z.object({ id: z.string(), wallMm: pair, pixel: pair })),
  objects: z.array(z.object({ id: z.string(), kind: z.string(), rectMm: z.object({ x: z.number(), y: z.number(), width: z.number(), height: z.number() }) })),
  studs: z.object({ widthMm: z.number(), at: z.array(z.object({ xMm: z.number() })) }),
});

const folder = path.join(import.meta.dirname, 'scenes');

/** An invented wall with its photo, and what a measurer would have written down. */
export function demoScene(name: string) {
  const scene = Scene.parse(JSON.parse(readFileSync(path.join(folder, `${name}.json`), 'utf8')));
  return {
    photo: path.join(folder, `${name}.jpg`),
    widthMm: scene.wallMm.width,
    heightMm: scene.wallMm.height,
    marks: scene.marks.filter((m) => m.id.startsWith('tape-')).map((m): Mark => ({ px: { x: m.pixel[0], y: m.pixel[1] }, mm: { x: m.wallMm[0], y: m.wallMm[1] } })),
    /** Studs behind the open wall; `unsure` of them are known by the finder alone. */
    studs: (unsure: number): Stud[] => scene.studs.at.map(({ xMm }, i) => {
      const foundBy = i % 4 < unsure ? 'finder' : 'probe';
      return { id: randomUUID(), xMm, widthMm: scene.studs.widthMm, foundBy, uncertaintyMm: usualUncertaintyMm[foundBy] };
    }),
    obstructions: scene.objects.map(({ id, kind, rectMm: r }): Obstruction => {
      const known = kind === 'door' || kind === 'window' ? 'opening' : (kind as Obstruction['kind']);
      return { id: randomUUID(), kind: known, name: id.replace('-', ' '), clearanceMm: startingClearanceMm(known, demoShop.units), outlineMm: [[r.x, r.y], [r.x + r.width, r.y], [r.x + r.width, r.y + r.height], [r.x, r.y + r.height]] };
    }),
  };
}

export const zone = (kind: Zone['kind'], fromMm: number, toMm: number): Zone => ({ id: randomUUID(), kind, fromMm, toMm });

/** Hexagons of one side (mm), edge to edge with a reveal, at the given columns and rows of a comb; column 0, row 0 at the centre. */
export function comb(at: { xMm: number; yMm: number; sideMm: number; revealMm: number }, cells: readonly (readonly [column: number, row: number, patternId: string])[], firstLabel = 1): Frame[] {
  const across = Math.sqrt(3) * at.sideMm + at.revealMm;
  return cells.map(([column, row, patternId], i) => ({
    id: randomUUID(), patternId, turnRad: 0, flipped: false, locked: false, label: String(firstLabel + i), contentsKg: null, hungGroup: null,
    xMm: at.xMm + column * across * Math.cos(Math.PI / 6),
    yMm: at.yMm + (row + (Math.abs(column) % 2) / 2) * across,
  }));
}
