import type Konva from 'konva';
import { type ReactNode, useCallback, useMemo } from 'react';
import { Layer, Shape } from 'react-konva';
import { placedAll, type Placement } from '../../../../../shared/geometry/polygon.ts';
import { hangerDrawing, shadowDrawing, wallDrawing, type Primitive } from '../../../../../shared/layouts/drawing.ts';
import type { Frame } from '../../../../../shared/layouts/layout.ts';
import type { Wall } from '../../../../../shared/walls/wall.ts';
import { colours } from '../../../../../tailwind.config.ts';
import type { Designs, ReadyPattern } from '../state/designs.ts';
import { useEditor } from '../state/editor-store.ts';
import { draw, drawPicture, write } from './canvas-pen.ts';
import { layerPlace } from './view.ts';

/** A canvas in wall mm, y up. What changes at the same times shares one: the fewer canvases, the less there is to lay over one another at every move. */
export function WallLayer({ children }: { children: ReactNode }) {
  const view = useEditor((e) => e.view);
  return (
    <Layer listening={false} {...layerPlace(view)}>
      {children}
    </Layer>
  );
}

/** One thing drawn on a wall layer; hits are found on the bench, never on the canvas. */
export function WallShape({ paint }: { paint: (context: CanvasRenderingContext2D, pxPerMm: number) => void }) {
  const scene = useCallback((context: Konva.Context, shape: Konva.Shape) => paint(context._context, shape.getAbsoluteScale().x), [paint]);
  return <Shape sceneFunc={scene} perfectDrawEnabled={false} />;
}

type Elevation = NonNullable<NonNullable<Wall['photo']>['elevation']>;

/** The wall's face and its photo: changes when a photo arrives. */
export function GroundShape({ wall, picture, image }: { wall: Wall; picture: Elevation | null; image: HTMLImageElement | null }) {
  const ground = useMemo(() => wallDrawing(wall, null).ground, [wall]);
  const brightness = useEditor((e) => e.show.photo);
  const paint = useCallback(
    (context: CanvasRenderingContext2D, pxPerMm: number) => {
      draw(context, ground, pxPerMm);
      if (picture && image) {
        // Over the white face of the wall, so that less of it is lighter, never darker.
        context.globalAlpha = brightness;
        drawPicture(context, image, picture);
        context.globalAlpha = 1;
        draw(context, ground.slice(-1), pxPerMm);
      }
    },
    [ground, picture, image, brightness],
  );
  return <WallShape paint={paint} />;
}

/** Studs and obstructions: change when the wall is measured again. */
export function SiteShape({ wall }: { wall: Wall }) {
  const drawn = useMemo(() => wallDrawing(wall, null), [wall]);
  const showStuds = useEditor((e) => e.show.studs);
  const paint = useCallback(
    (context: CanvasRenderingContext2D, pxPerMm: number) => {
      if (showStuds) draw(context, drawn.studs, pxPerMm);
      draw(context, drawn.obstructions, pxPerMm);
    },
    [drawn, showStuds],
  );
  return <WallShape paint={paint} />;
}

const shadows = new WeakMap<Placement, ReturnType<typeof shadowDrawing>>();
const labelPx = 14;
const leastLabelledPx = 15;

type Slides = NonNullable<Frame['hangerSlides']>;
const slid = new WeakMap<Slides, { pattern: ReadyPattern; flipped: boolean; drawing: Primitive[] }>();

function slidHangers(pattern: ReadyPattern, flipped: boolean, slides: Slides): Primitive[] {
  let known = slid.get(slides);
  if (!known || known.pattern !== pattern || known.flipped !== flipped) slid.set(slides, (known = { pattern, flipped, drawing: hangerDrawing(pattern.design, flipped, slides) }));
  return known.drawing;
}

function paintFrame(context: CanvasRenderingContext2D, pattern: ReadyPattern, at: Placement, pxPerMm: number, hangers: boolean, slides: Slides | undefined): void {
  context.save();
  context.translate(at.xMm, at.yMm);
  context.rotate(at.turnRad);
  const drawing = pattern.drawing(at.flipped);
  draw(context, drawing.body, pxPerMm);
  if (hangers) draw(context, slides ? slidHangers(pattern, at.flipped, slides) : drawing.hangers, pxPerMm);
  context.restore();
}

function paintShadow(context: CanvasRenderingContext2D, pattern: ReadyPattern, at: Placement, pxPerMm: number): void {
  let shadow = shadows.get(at);
  if (!shadow) shadows.set(at, (shadow = shadowDrawing(pattern.design, placedAll(pattern.outline, at), placedAll(pattern.opening, at))));
  draw(context, shadow, pxPerMm);
}

const none: ReadonlySet<string> = new Set();

/** The frames that stay: changes when the bench does, not while one is carried. */
export function FramesShape({ designs }: { designs: Designs }) {
  const frames = useEditor((e) => e.bench.frames);
  const hangers = useEditor((e) => e.show.hangers);
  const heldKey = useEditor((e) => (e.hand ? [...e.hand.placements.keys()].join(' ') : ''));
  const paint = useCallback(
    (context: CanvasRenderingContext2D, pxPerMm: number) => {
      const held = heldKey ? new Set(heldKey.split(' ')) : none;
      const still = frames.filter((f) => !held.has(f.id) && designs.has(f.patternId));
      for (const frame of still) paintShadow(context, designs.get(frame.patternId)!, frame, pxPerMm);
      for (const frame of still) paintFrame(context, designs.get(frame.patternId)!, frame, pxPerMm, hangers, frame.hangerSlides);
      for (const frame of still) {
        // Too small to read is left out: the ledger has them all.
        if (designs.get(frame.patternId)!.radiusMm * pxPerMm > leastLabelledPx) paintLabel(context, frame, pxPerMm);
      }
    },
    [frames, designs, hangers, heldKey],
  );
  return <WallShape paint={paint} />;
}

function paintLabel(context: CanvasRenderingContext2D, frame: Frame, pxPerMm: number): void {
  if (frame.label) write(context, frame.label, frame.xMm, frame.yMm, labelPx / pxPerMm, colours.ink[900], colours.plaster[50]);
}

/** What the hand holds: changes with every move of the pointer. */
export function HandShape({ designs }: { designs: Designs }) {
  const hand = useEditor((e) => e.hand);
  const frames = useEditor((e) => e.bench.frames);
  const hangers = useEditor((e) => e.show.hangers);
  const byId = useMemo(() => new Map(frames.map((f) => [f.id, f])), [frames]);
  const paint = useCallback(
    (context: CanvasRenderingContext2D, pxPerMm: number) => {
      if (!hand) return;
      const held: [ReadyPattern | undefined, Placement, Slides | undefined][] = [...hand.placements].map(([id, at]) => {
        const frame = byId.get(id);
        return [designs.get(frame?.patternId ?? ''), at, frame?.hangerSlides];
      });
      if (hand.fromTray?.at) held.push([designs.get(hand.fromTray.patternId), hand.fromTray.at, undefined]);
      for (const [pattern, at, slides] of held) {
        if (!pattern) continue;
        paintShadow(context, pattern, at, pxPerMm);
        paintFrame(context, pattern, at, pxPerMm, hangers, slides);
      }
    },
    [hand, byId, designs, hangers],
  );
  return <WallShape paint={paint} />;
}
