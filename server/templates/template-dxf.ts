import { DxfWriter, LWPolylineFlags, point2d, point3d, TextHorizontalAlignment, Units } from '@tarikjabiri/dxf';
import type { Point } from '../../shared/geometry/point.ts';
import type { Colour, Layer, Page, Primitive } from '../../shared/templates/drawing.ts';

/** The nearest of the seven colours that every program numbers alike (1 red, 5 blue, 7 black or white, 8 grey, 30 a brass). */
const numbers: Record<Colour, number> = { ink: 7, grey: 8, chalk: 5, brass: 30, madder: 1, 'pale madder': 1, rule: 8, white: 7 };
/** The size of a capital to that of the type; DXF knows only capitals. */
const capital = 0.7;

/**
 * A page as DXF in millimetres, in layers named after what they hold, so that a cutter can leave out words and joins. `originMm` is added to every
 * point: coordinates are then the wall's own, from its lower left corner.
 */
export function drawDxf(page: Page, originMm: Point): string {
  const dxf = new DxfWriter();
  dxf.setUnits(Units.Millimeters);
  const layers = new Set<Layer>();
  const at = (p: Point) => point3d(round(p.x + originMm.x), round(p.y + originMm.y), 0);
  const on = (layer: Layer, colour: Colour) => {
    const name = layer.toUpperCase();
    if (!layers.has(layer)) dxf.addLayer(name, numbers[colour], 'Continuous');
    layers.add(layer);
    return { layerName: name, colorNumber: numbers[colour] };
  };
  const draw = (items: readonly Primitive[]): void => {
    for (const item of items) {
      if (item.kind === 'clip') draw(item.items);
      else if (item.kind === 'line') dxf.addLine(at(item.from), at(item.to), on(item.layer, item.stroke.colour));
      else if (item.kind === 'text') {
        const place = at(item.at);
        const alignment = { start: TextHorizontalAlignment.Left, middle: TextHorizontalAlignment.Center, end: TextHorizontalAlignment.Right }[item.anchor];
        dxf.addText(place, round(item.sizeMm * capital), plain(item.text), {
          ...on(item.layer, item.colour), rotation: round((item.turnRad * 180) / Math.PI), horizontalAlignment: alignment,
          ...(item.anchor === 'start' ? {} : { secondAlignmentPoint: place }),
        });
      } else if (item.kind === 'circle') dxf.addCircle(at(item.centre), round(item.radiusMm), on(item.layer, item.stroke?.colour ?? item.fill ?? 'ink'));
      else if (item.stroke) {
        const points = item.points.map((p) => ({ point: point2d(round(p.x + originMm.x), round(p.y + originMm.y)) }));
        dxf.addLWPolyline(points, { ...on(item.layer, item.stroke.colour), flags: item.closed ? LWPolylineFlags.Closed : LWPolylineFlags.None });
      }
    }
  };
  draw(page.items);
  return dxf.stringify();
}

const round = (mm: number): number => Math.round(mm * 1e4) / 1e4;

/** Words on one line, with signs past ASCII as DXF writes them in every version. */
function plain(words: string): string {
  return [...words.replace(/\p{Cc}/gu, ' ')].map((sign) => (sign > '~' ? [...Array(sign.length).keys()].map((i) => `\\U+${sign.charCodeAt(i).toString(16).toUpperCase().padStart(4, '0')}`).join('') : sign)).join('');
}
