import canonicalize from 'canonicalize';
import { z } from 'zod';
import { id } from '../api/endpoint.ts';
import { usualStudSpecies } from '../hardware/stud-species.ts';
import { Frame, LayoutPattern, LayoutSheet } from '../layouts/layout.ts';
import { Obstruction, Stud, WallShape, Zone } from '../walls/wall.ts';

/** All that a client agrees to, whole in itself: later changes of wall, pattern or shop do not reach it. */
export const Snapshot = z.object({
  format: z.literal(1),
  shop: z.string(),
  job: z.string(),
  client: z.string(),
  letter: z.string(),
  note: z.string(),
  layoutId: id,
  sheet: LayoutSheet,
  frames: z.array(Frame),
  patterns: z.array(LayoutPattern),
  wall: WallShape.extend({ studs: z.array(Stud), obstructions: z.array(Obstruction), zones: z.array(Zone) }),
  /** The photo behind it, by the hash of its bytes, and the wall rectangle it shows. */
  elevation: z.object({ photoId: id, sha256: z.string(), leftMm: z.number(), bottomMm: z.number(), widthMm: z.number(), heightMm: z.number() }).nullable(),
});
export type Snapshot = z.infer<typeof Snapshot>;

type Content = Pick<Snapshot, 'layoutId' | 'sheet' | 'frames' | 'patterns' | 'wall' | 'elevation'>;

const inOrder = <T extends { id: string }>(list: readonly T[]) => [...list].sort((a, b) => (a.id < b.id ? -1 : a.id > b.id ? 1 : 0));

/**
 * Lists by id. The species of the studs and the wall's outline came later to the format than the rest: where they are the usual ones, which is
 * what their absence is read as, they are left out, so that what was sent before keeps its hash.
 */
const ordered = <C extends Content>(content: C) => ({
  ...content,
  frames: inOrder(content.frames),
  patterns: inOrder(content.patterns),
  wall: { ...content.wall, studSpecies: content.wall.studSpecies === usualStudSpecies ? undefined : content.wall.studSpecies, outlineMm: content.wall.outlineMm ?? undefined, studs: inOrder(content.wall.studs), obstructions: inOrder(content.wall.obstructions), zones: inOrder(content.wall.zones) },
});

/** The one text of a snapshot that is hashed: JSON in canonical form (RFC 8785), lists ordered by id. */
export function canonicalText(snapshot: Snapshot): string {
  return canonicalize(ordered(snapshot)) ?? '';
}

/** The same for the content alone, to tell whether a layout has changed since it was sent. */
export function contentText({ layoutId, sheet, frames, patterns, wall, elevation }: Content): string {
  return canonicalize(ordered({ layoutId, sheet, frames, patterns, wall, elevation })) ?? '';
}
