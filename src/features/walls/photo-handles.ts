import type { Point } from '../../../shared/walls/homography.ts';
import { cornerNames } from './marks-draft.ts';
import type { PhotoDraft } from './photo-draft.ts';

/** A point on the photo that can be moved: a mark, a point of a straight edge, an end of a line or a length. */
export type HandleOf =
  | { kind: 'mark'; index: number }
  | { kind: 'edge' | 'line' | 'length'; index: number; end: number };

export interface Handle {
  key: string;
  of: HandleOf;
  px: Point;
  name: string;
}

const ends = ['first end', 'second end'] as const;

export function lineName(draft: PhotoDraft, index: number): string {
  const { direction } = draft.lines[index]!;
  const number = draft.lines.slice(0, index + 1).filter((l) => l.direction === direction).length;
  return `${direction === 'plumb' ? 'Plumb' : 'Level'} line ${number}`;
}

/** A mark's name; the first four are a rectangle's corners. */
export function markName(draft: Pick<PhotoDraft, 'marks'>, index: number): string {
  const corner = draft.marks.length >= 4 ? cornerNames[index] : undefined;
  return `Mark ${index + 1}, ${corner ?? 'a point you measured'}`;
}

/** All handles of a draft in the order in which the Tab key meets them. */
export function handlesOf(draft: PhotoDraft): Handle[] {
  return [
    ...draft.marks.map(({ px }, index): Handle => ({ key: `mark ${index}`, of: { kind: 'mark', index }, px, name: markName(draft, index) })),
    ...draft.lines.flatMap((line, index) => line.px.map((px, end): Handle => ({ key: `line ${index} ${end}`, of: { kind: 'line', index, end }, px, name: `${lineName(draft, index)}, ${ends[end as 0 | 1]}` }))),
    ...draft.lengths.flatMap((length, index) => length.px.map((px, end): Handle => ({ key: `length ${index} ${end}`, of: { kind: 'length', index, end }, px, name: `Length ${index + 1}, ${ends[end as 0 | 1]}` }))),
    ...draft.straightEdges.flatMap((edge, index) => edge.map((px, end): Handle => ({ key: `edge ${index} ${end}`, of: { kind: 'edge', index, end }, px, name: `Straight edge ${index + 1}, point ${end + 1}` }))),
  ];
}

/** The draft with one handle elsewhere on the photo. */
export function withHandle(draft: PhotoDraft, of: HandleOf, px: Point): PhotoDraft {
  const at = <T>(list: readonly T[], index: number, next: (item: T) => T): T[] => list.map((item, i) => (i === index ? next(item) : item));
  const pair = (points: readonly [Point, Point], end: number): [Point, Point] => (end === 0 ? [px, points[1]] : [points[0], px]);
  switch (of.kind) {
    case 'mark':
      return { ...draft, marks: at(draft.marks, of.index, (m) => ({ ...m, px })) };
    case 'line':
      return { ...draft, lines: at(draft.lines, of.index, (l) => ({ ...l, px: pair(l.px, of.end) })) };
    case 'length':
      return { ...draft, lengths: at(draft.lengths, of.index, (l) => ({ ...l, px: pair(l.px, of.end) })) };
    case 'edge':
      return { ...draft, straightEdges: at(draft.straightEdges, of.index, (e) => at(e, of.end, () => px)) };
  }
}

type Size = { widthPx: number; heightPx: number };
const within = ({ widthPx, heightPx }: Size, x: number, y: number): Point => ({ x: Math.round(x * widthPx), y: Math.round(y * heightPx) });
/** New things are set a little apart, so that none hides the one before. */
const apart = (count: number) => 0.06 * (count % 5);

export function withMark(draft: PhotoDraft, photo: Size): PhotoDraft {
  return { ...draft, marks: [...draft.marks, { px: within(photo, 0.44 + apart(draft.marks.length), 0.5), xMm: null, yMm: null }] };
}

export function withLine(draft: PhotoDraft, direction: 'plumb' | 'level', photo: Size): PhotoDraft {
  const by = 0.38 + apart(draft.lines.length);
  const px: [Point, Point] = direction === 'plumb' ? [within(photo, by, 0.7), within(photo, by, 0.3)] : [within(photo, 0.3, by), within(photo, 0.7, by)];
  return { ...draft, lines: [...draft.lines, { direction, px }] };
}

export function withLength(draft: PhotoDraft, photo: Size): PhotoDraft {
  const y = 0.4 + apart(draft.lengths.length);
  return { ...draft, lengths: [...draft.lengths, { px: [within(photo, 0.35, y), within(photo, 0.65, y)], mm: null }] };
}

export function withEdge(draft: PhotoDraft, photo: Size): PhotoDraft {
  const y = 0.86 - apart(draft.straightEdges.length);
  return { ...draft, straightEdges: [...draft.straightEdges, [within(photo, 0.15, y), within(photo, 0.5, y), within(photo, 0.85, y)]] };
}

/** One more point on a straight edge: in the middle of its widest gap. */
export function withEdgePoint(draft: PhotoDraft, index: number): PhotoDraft {
  const edge = draft.straightEdges[index] ?? [];
  const gaps = edge.slice(1).map((p, i) => Math.hypot(p.x - edge[i]!.x, p.y - edge[i]!.y));
  const widest = gaps.indexOf(Math.max(...gaps));
  const [a, b] = [edge[widest]!, edge[widest + 1]!];
  const middle = { x: Math.round((a.x + b.x) / 2), y: Math.round((a.y + b.y) / 2) };
  return { ...draft, straightEdges: draft.straightEdges.map((e, i) => (i === index ? [...e.slice(0, widest + 1), middle, ...e.slice(widest + 1)] : e)) };
}
