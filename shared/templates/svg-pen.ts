import type { Colour, Page, Primitive, Stroke, Text } from './drawing.ts';
import { estimateWidth } from './text-fitting.ts';

/** Colours of the theme, as the sheets print them. */
export const svgInks: Record<Colour, string> = {
  ink: '#1E2B2A', grey: '#586561', chalk: '#1F5AA6', brass: '#80600F', madder: '#A8322A', 'pale madder': '#F7DFDB', rule: '#D8D0BC', white: '#FFFFFF',
};

/**
 * A page as SVG whose user unit is one millimetre, `width` and `height` in mm; y runs down in SVG, so points are turned over one by one and words
 * stay upright. Primitives of one layer that follow one another share a group named after it.
 */
export function drawSvg(page: Page, title: string): string {
  const { widthMm, heightMm } = page;
  const pen = new SvgPen(heightMm);
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${n(widthMm)}mm" height="${n(heightMm)}mm" viewBox="0 0 ${n(widthMm)} ${n(heightMm)}" font-family="'Nunito Sans', sans-serif">`,
    `<title>${escaped(title)}</title>`,
    ...pen.layers(page.items),
    '</svg>',
  ].join('\n');
}

class SvgPen {
  private clips = 0;

  constructor(private readonly heightMm: number) {}

  layers(items: readonly Primitive[]): string[] {
    const parts: string[] = [];
    let open: string | null = null;
    for (const item of items) {
      const layer = item.kind === 'clip' ? null : item.layer;
      if (layer !== open) {
        if (open !== null) parts.push('</g>');
        if (layer !== null) parts.push(`<g data-layer="${layer}">`);
        open = layer;
      }
      parts.push(...this.drawn(item));
    }
    if (open !== null) parts.push('</g>');
    return parts;
  }

  private drawn(item: Primitive): string[] {
    const y = (up: number) => n(this.heightMm - up);
    if (item.kind === 'clip') {
      const { rect } = item;
      const name = `clip${(this.clips += 1)}`;
      return [
        `<clipPath id="${name}"><rect x="${n(rect.x)}" y="${y(rect.y + rect.height)}" width="${n(rect.width)}" height="${n(rect.height)}"/></clipPath>`,
        `<g clip-path="url(#${name})">`, ...this.layers(item.items), '</g>',
      ];
    }
    if (item.kind === 'text') return this.words(item);
    if (item.kind === 'line') return [`<path d="M${n(item.from.x)} ${y(item.from.y)}L${n(item.to.x)} ${y(item.to.y)}"${look(item.stroke, null)}/>`];
    if (item.kind === 'circle') return [`<circle cx="${n(item.centre.x)}" cy="${y(item.centre.y)}" r="${n(item.radiusMm)}"${look(item.stroke, item.fill)}/>`];
    const path = item.points.map((p, i) => `${i === 0 ? 'M' : 'L'}${n(p.x)} ${y(p.y)}`).join('');
    return [`<path d="${path}${item.closed ? 'Z' : ''}"${look(item.stroke, item.fill)}/>`];
  }

  private words({ at, text, sizeMm, anchor, turnRad, colour, weight, maxWidthMm }: Text): string[] {
    const turn = turnRad === 0 ? '' : ` transform="rotate(${n((-turnRad * 180) / Math.PI)} ${n(at.x)} ${n(this.heightMm - at.y)})"`;
    const place = `x="${n(at.x)}" y="${n(this.heightMm - at.y)}" font-size="${n(sizeMm)}"`;
    // Readers without the type set another, often wider; what must fit is held to the width it has in print.
    const width = maxWidthMm === undefined ? 0 : Math.min(estimateWidth(text, sizeMm, weight), maxWidthMm);
    const held = maxWidthMm !== undefined && width > 0.8 * maxWidthMm ? ` textLength="${n(width)}" lengthAdjust="spacingAndGlyphs"` : '';
    return [`<text ${place}${held}${anchor === 'start' ? '' : ` text-anchor="${anchor}"`}${weight === 'bold' ? ' font-weight="700"' : ''} fill="${svgInks[colour]}"${turn}>${escaped(text)}</text>`];
  }
}

function look(pen: Stroke | null, inside: Colour | null): string {
  const fill = ` fill="${inside ? svgInks[inside] : 'none'}"`;
  if (!pen) return fill;
  return `${fill} stroke="${svgInks[pen.colour]}" stroke-width="${n(pen.widthMm)}"${pen.dashMm ? ` stroke-dasharray="${pen.dashMm.map(n).join(' ')}"` : ''}`;
}

const n = (value: number): string => String(Math.round(value * 1e4) / 1e4);

/** Words as XML may hold them: signs that it has no place for are left out. */
function escaped(words: string): string {
  return [...words]
    .filter((sign) => /[\t\n\r\u0020-\ud7ff\ue000-\ufffd]/u.test(sign) || sign.codePointAt(0)! > 0xffff)
    .join('')
    .replace(/[&<>"]/g, (sign) => ({ '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' })[sign]!);
}
