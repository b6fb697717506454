import { hatchStrokes, type Primitive } from '../../../../../shared/layouts/drawing.ts';
import type { Polygon } from '../../../../../shared/geometry/polygon.ts';
import { inkLook } from '../../../../lib/drawing-inks.ts';

type Stroke = (context: CanvasRenderingContext2D, pxPerMm: number) => void;

const ready = new WeakMap<readonly Primitive[], Stroke[]>();

/**
 * Draws primitives on a canvas whose units are wall mm with y up. Line weights stay the same on screen at every scale.
 * Paths are built once for each list, so keep lists and draw them again.
 */
export function draw(context: CanvasRenderingContext2D, primitives: readonly Primitive[], pxPerMm: number): void {
  let strokes = ready.get(primitives);
  if (!strokes) ready.set(primitives, (strokes = primitives.map(strokeOf)));
  for (const stroke of strokes) stroke(context, pxPerMm);
}

function pathOf(rings: readonly Polygon[], closed: boolean): Path2D {
  const path = new Path2D();
  for (const ring of rings) {
    ring.forEach(({ x, y }, i) => (i === 0 ? path.moveTo(x, y) : path.lineTo(x, y)));
    if (closed) path.closePath();
  }
  return path;
}

function strokeOf(primitive: Primitive): Stroke {
  switch (primitive.kind) {
    case 'area': {
      const { colour } = inkLook(primitive.ink);
      const path = pathOf([primitive.points, ...primitive.holes], true);
      const opacity = primitive.opacity ?? 1;
      return (context) => {
        context.globalAlpha = opacity;
        context.fillStyle = colour;
        context.fill(path, 'evenodd');
        context.globalAlpha = 1;
      };
    }
    case 'line': {
      const { colour, linePx } = inkLook(primitive.ink);
      const path = pathOf([primitive.points], primitive.closed);
      return (context, pxPerMm) => {
        context.strokeStyle = colour;
        context.lineWidth = linePx / pxPerMm;
        context.lineJoin = 'round';
        context.setLineDash(primitive.dashed ? [7 / pxPerMm, 5 / pxPerMm] : []);
        context.stroke(path);
        context.setLineDash([]);
      };
    }
    case 'hatch': {
      const { colour, linePx } = inkLook(primitive.ink);
      const path = pathOf([primitive.points], true);
      for (const { from, to } of hatchStrokes(primitive.points, primitive.pitchMm)) {
        path.moveTo(from.x, from.y);
        path.lineTo(to.x, to.y);
      }
      return (context, pxPerMm) => {
        context.strokeStyle = colour;
        context.lineWidth = linePx / pxPerMm;
        context.stroke(path);
      };
    }
    case 'dot': {
      const { colour } = inkLook(primitive.ink);
      const { at, radiusMm, ink } = primitive;
      // Hangers stay in sight when the whole wall is.
      const leastPx = ink === 'hanger rim' ? 4 : 2.6;
      return (context, pxPerMm) => {
        context.fillStyle = colour;
        context.beginPath();
        context.arc(at.x, at.y, Math.max(radiusMm, leastPx / pxPerMm), 0, 2 * Math.PI);
        context.fill();
      };
    }
    case 'text':
      return (context) => write(context, primitive.words, primitive.at.x, primitive.at.y, primitive.sizeMm, inkLook(primitive.ink).colour);
    case 'picture':
      // Pictures are loaded first, so the layer that has one draws it.
      return () => undefined;
  }
}

/** Words in the middle of a place, upright whatever way y runs. `halo` is a rim that keeps them legible over a photo. */
export function write(context: CanvasRenderingContext2D, words: string, x: number, y: number, size: number, colour: string, halo?: string): void {
  context.save();
  context.translate(x, y);
  context.scale(1, -1);
  context.font = `700 ${size}px "Nunito Sans", system-ui, sans-serif`;
  context.textAlign = 'center';
  context.textBaseline = 'middle';
  if (halo) {
    context.strokeStyle = halo;
    context.lineWidth = size * 0.28;
    context.lineJoin = 'round';
    context.strokeText(words, 0, 0);
  }
  context.fillStyle = colour;
  context.fillText(words, 0, 0);
  context.restore();
}

/** A picture over a wall rectangle, the right way up. */
export function drawPicture(context: CanvasRenderingContext2D, image: CanvasImageSource, at: { leftMm: number; bottomMm: number; widthMm: number; heightMm: number }): void {
  context.save();
  context.translate(at.leftMm, at.bottomMm + at.heightMm);
  context.scale(1, -1);
  context.drawImage(image, 0, 0, at.widthMm, at.heightMm);
  context.restore();
}
