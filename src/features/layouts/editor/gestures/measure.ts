import { boxRing, type Point, type Polygon } from '../../../../../shared/geometry/polygon.ts';
import { pickPoint } from '../../../../../shared/layouts/measure.ts';
import type { Wall } from '../../../../../shared/walls/wall.ts';
import { type Designs, wallOutline } from '../state/designs.ts';
import type { EditorStore } from '../state/editor-store.ts';
import { snapReachPx } from './carry.ts';

/** Sets the next end of a measure: the first, then the second; a third begins anew. */
export function setMeasure(store: EditorStore, designs: Designs, wall: Wall, at: Point): void {
  const { measuring } = store.getState();
  const picked = pick(store, designs, wall, at);
  if (measuring?.from && !measuring.done) store.setState({ measuring: { from: measuring.from, to: picked, done: true } });
  else store.setState({ measuring: { from: picked, to: null, done: false } });
}

/** Lets the open end of a measure follow the pointer. */
export function followMeasure(store: EditorStore, designs: Designs, wall: Wall, at: Point): void {
  const { measuring } = store.getState();
  if (measuring?.from && !measuring.done) store.setState({ measuring: { ...measuring, to: pick(store, designs, wall, at) } });
}

function pick(store: EditorStore, designs: Designs, wall: Wall, at: Point) {
  const { bench, view } = store.getState();
  const reachMm = (0.7 * snapReachPx) / view.scale;
  const near = bench.frames.flatMap((frame): Polygon[] => {
    const reach = (designs.get(frame.patternId)?.radiusMm ?? 0) + reachMm;
    const outline = Math.hypot(frame.xMm - at.x, frame.yMm - at.y) <= reach ? wallOutline(frame, designs) : null;
    return outline ? [outline] : [];
  });
  const site: Polygon[] = [boxRing({ left: 0, bottom: 0, right: wall.widthMm, top: wall.heightMm }), ...wall.obstructions.map((o) => o.outlineMm.map(([x, y]) => ({ x, y })))];
  return pickPoint([...near, ...site], at, reachMm);
}
