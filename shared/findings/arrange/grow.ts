import type { Point } from '../../geometry/polygon.ts';
import { sidesOf, turnedAll } from '../../geometry/polygon.ts';
import { gapBetween } from '../../geometry/polygon-distance.ts';
import { plainTurnRad } from '../../layouts/turn.ts';
import { putAt, type Piece, type Put } from './ask.ts';
import type { Ground } from './ground.ts';

export interface GrowAsk {
  /** In the order in which they are put. */
  pieces: readonly Piece[];
  ground: Ground;
  /** Where the first goes, or the free place nearest to it. */
  start: Point;
  startTurnRad: number;
  mayTurn: boolean;
  /** Left free, and grown against as if they hung there. */
  kept?: readonly Put[];
  /** How dear a place is, mm; the cheapest is taken. */
  cost: (at: Point) => number;
  /** What each neighbour at the reveal takes off the cost, mm: more makes tighter clusters. */
  neighbourMm: number;
}

/** A place that may be taken; its outline is worked out only once it is looked at. */
interface Site {
  at: Point;
  turnRad: number;
  cost: number;
  put: Put | null;
}

/** Places that fit and are looked at more closely before one is taken. */
const mostCompared = 8;
/** A turn costs its arc at this share of the radius: frames stand as drawn where they can. */
const turnShare = 0.3;

/**
 * Puts pieces edge to edge, the reveal between them, each at the cheapest free place against what was put before: edges face each other,
 * corner opposite corner or middle opposite middle. Where no edge has room it starts again at the cheapest free place. Pieces that find no
 * place are left out.
 */
export function grow(ask: GrowAsk): Put[] {
  const { pieces, kept = [] } = ask;
  const kinds = [...new Set(pieces)];
  const sites = new Map<Piece, Site[]>(kinds.map((piece) => [piece, []]));
  const offer = (to: Put): void => {
    for (const piece of kinds) sites.get(piece)!.push(...sitesAgainst(to, piece, ask));
  };
  const puts: Put[] = [];
  for (const put of kept) offer(put);
  for (const piece of pieces) {
    const put = bestSite(piece, sites.get(piece)!, [...kept, ...puts], ask) ?? seat(piece, [...kept, ...puts], ask);
    if (!put) continue;
    puts.push(put);
    offer(put);
  }
  return puts;
}

/** The places of a piece against the edges of one that is put. */
function sitesAgainst(to: Put, piece: Piece, { ground: { revealMm }, mayTurn, cost }: GrowAsk): Site[] {
  const own = sidesOf(piece.outline).map(({ from, to: end }) => Math.atan2(end.y - from.y, end.x - from.x));
  return sidesOf(to.outline).flatMap(({ from, to: end }) => {
    const length = Math.hypot(end.x - from.x, end.y - from.y);
    const out = { x: ((end.y - from.y) / length) * revealMm, y: ((from.x - end.x) / length) * revealMm };
    const facing = Math.atan2(from.y - end.y, from.x - end.x);
    const turns = own.map((rad, edge) => ({ edge, turn: plainTurnRad(facing - rad) })).sort((a, b) => Math.abs(a.turn) - Math.abs(b.turn));
    const taken = mayTurn ? turns.slice(0, 2) : turns.filter(({ turn }) => Math.abs(turn) < 1e-9);
    return taken.flatMap(({ edge, turn }) => {
      const turnRad = Math.abs(turn) < 1e-9 ? 0 : turn;
      const ring = turnedAll(piece.outline, turnRad);
      const a = ring[edge]!;
      const b = ring[(edge + 1) % ring.length]!;
      const corners = [{ x: end.x - a.x, y: end.y - a.y }, { x: from.x - b.x, y: from.y - b.y }];
      const ways = Math.abs(Math.hypot(b.x - a.x, b.y - a.y) - length) < 1e-6 ? corners.slice(0, 1) : [...corners, { x: (corners[0]!.x + corners[1]!.x) / 2, y: (corners[0]!.y + corners[1]!.y) / 2 }];
      return ways.map((at): Site => {
        const to = { x: at.x + out.x, y: at.y + out.y };
        return { at: to, turnRad, cost: cost(to) + Math.abs(turnRad) * piece.radiusMm * turnShare, put: null };
      });
    });
  });
}

/** Takes the best of the cheapest free sites; sites that are no longer free are dropped for good. */
function bestSite(piece: Piece, sites: Site[], put: readonly Put[], { ground, neighbourMm }: GrowAsk): Put | null {
  sites.sort((a, b) => a.cost - b.cost);
  const gone = new Set<Site>();
  let best: { put: Put; cost: number } | null = null;
  let compared = 0;
  for (const site of sites) {
    const own = (site.put ??= putAt(piece, site.at.x, site.at.y, site.turnRad));
    if (!ground.isFree(own.outline) || !ground.isClearOf(own.outline, put)) {
      gone.add(site);
      continue;
    }
    if (neighbourMm === 0) {
      best = { put: own, cost: site.cost };
      break;
    }
    const near = put.filter((p) => Math.hypot(p.at.xMm - site.at.x, p.at.yMm - site.at.y) < piece.radiusMm + p.piece.radiusMm + ground.revealMm + 1);
    const neighbours = near.filter((p) => gapBetween(p.outline, own.outline).mm <= ground.revealMm + 1).length;
    const cost = site.cost - neighbours * neighbourMm;
    if (!best || cost < best.cost) best = { put: own, cost };
    if (++compared >= mostCompared) break;
  }
  const left = sites.filter((s) => !gone.has(s));
  sites.length = 0;
  for (const site of left) sites.push(site);
  return best?.put ?? null;
}

/** The free place nearest to the start, on rings round it. */
function seat(piece: Piece, put: readonly Put[], { ground, start, startTurnRad }: GrowAsk): Put | null {
  const { bounds } = ground;
  const farthest = Math.hypot(bounds.right - bounds.left, bounds.top - bounds.bottom);
  const step = Math.max(piece.radiusMm / 3, farthest / 120);
  for (let ring = 0; ring * step <= farthest; ring++) {
    for (let k = 0; k < Math.max(1, 6 * ring); k++) {
      const angle = (2 * Math.PI * k) / Math.max(1, 6 * ring);
      const at = putAt(piece, start.x + ring * step * Math.cos(angle), start.y + ring * step * Math.sin(angle), startTurnRad);
      if (ground.isFree(at.outline) && ground.isClearOf(at.outline, put)) return at;
    }
  }
  return null;
}
