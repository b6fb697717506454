import type { PDFFont } from 'pdf-lib';
import type { Point } from '../../shared/geometry/point.ts';
import type { Colour, Primitive, Stroke, Text } from '../../shared/templates/drawing.ts';
import type { Run, TemplateFonts } from './template-fonts.ts';

/** `black` is for printers with black alone: all that carries meaning is black, what lies under it a light grey. */
export type Palette = 'colour' | 'black';

const inks: Record<Palette, Record<Colour, string>> = {
  colour: {
    ink: rgb(0x1e2b2a), grey: rgb(0x586561), chalk: rgb(0x1f5aa6), brass: rgb(0x80600f), madder: rgb(0xa8322a),
    'pale madder': rgb(0xf7dfdb), rule: rgb(0xd8d0bc), white: '1',
  },
  black: { ink: '0', grey: '0', chalk: '0', brass: '0', madder: '0', 'pale madder': '0.88', rule: '0.6', white: '1' },
};

/** The operators of one page's content, in PDF's own small language (ISO 32000-1, 8.4 and 8.5): pens are told only when they change. */
export class PdfContent {
  /** Fonts in use, with the names they go by on this page. */
  readonly fonts = new Map<PDFFont, string>();
  private readonly parts: string[] = [];
  private pen = { stroke: '', fill: '', width: '', dash: '' };

  constructor(
    private readonly type: TemplateFonts,
    private readonly scale: number,
    private readonly palette: Palette,
  ) {}

  async draw(items: readonly Primitive[]): Promise<void> {
    for (const item of items) {
      if (item.kind === 'text') this.write(item, this.type.settled(item.text, item.weight) ?? (await this.type.runs(item.text, item.weight)));
      else if (item.kind === 'clip') {
        const { x, y, width, height } = item.rect;
        const before = { ...this.pen };
        this.parts.push(`q ${this.n(x)} ${this.n(y)} ${this.n(width)} ${this.n(height)} re W n`);
        await this.draw(item.items);
        this.parts.push('Q');
        this.pen = before;
      } else if (item.kind === 'line') this.paint(this.trace([item.from, item.to], false), item.stroke, null);
      else if (item.kind === 'circle') this.paint(this.round(item.centre, item.radiusMm), item.stroke, item.fill);
      else this.paint(this.trace(item.points, item.closed), item.stroke, item.fill);
    }
  }

  /** The content as it stands in the file, before packing. */
  text(): string {
    return this.parts.join('\n');
  }

  /** A length in units of the page, to a thousandth: 0.4 micrometres. */
  private n(mm: number): string {
    return tidy(mm * this.scale);
  }

  private tell(key: keyof PdfContent['pen'], value: string, operator: string): void {
    if (this.pen[key] === value) return;
    this.pen[key] = value;
    this.parts.push(`${value} ${operator}`);
  }

  private tellFill(colour: Colour): void {
    const ink = inks[this.palette][colour];
    this.tell('fill', ink, ink.includes(' ') ? 'rg' : 'g');
  }

  private tellStroke({ colour, widthMm, dashMm }: Stroke): void {
    const ink = inks[this.palette][colour];
    this.tell('stroke', ink, ink.includes(' ') ? 'RG' : 'G');
    this.tell('width', this.n(widthMm), 'w');
    this.tell('dash', `[${(dashMm ?? []).map((mm) => this.n(mm)).join(' ')}] 0`, 'd');
  }

  private paint(path: string, pen: Stroke | null, inside: Colour | null): void {
    if (inside) this.tellFill(inside);
    if (pen) this.tellStroke(pen);
    if (pen || inside) this.parts.push(`${path} ${pen && inside ? 'B' : pen ? 'S' : 'f'}`);
  }

  private trace(points: readonly Point[], closed: boolean): string {
    const steps = points.map((p, i) => `${this.n(p.x)} ${this.n(p.y)} ${i === 0 ? 'm' : 'l'}`).join(' ');
    return closed ? `${steps} h` : steps;
  }

  /** Four cubic curves; 0.5523 is the usual arm for a quarter circle, true to 0.03 % of the radius. */
  private round({ x, y }: Point, r: number): string {
    const arm = 0.5523 * r;
    const at = (...mm: number[]) => mm.map((v) => this.n(v)).join(' ');
    return [
      `${at(x + r, y)} m`,
      `${at(x + r, y + arm, x + arm, y + r, x, y + r)} c`,
      `${at(x - arm, y + r, x - r, y + arm, x - r, y)} c`,
      `${at(x - r, y - arm, x - arm, y - r, x, y - r)} c`,
      `${at(x + arm, y - r, x + r, y - arm, x + r, y)} c h`,
    ].join(' ');
  }

  private write(item: Text, runs: readonly Run[]): void {
    const widthEm = runs.reduce((sum, run) => sum + run.widthEm, 0);
    if (widthEm === 0) return;
    const sizeMm = item.maxWidthMm === undefined ? item.sizeMm : Math.min(item.sizeMm, item.maxWidthMm / widthEm);
    const cos = Math.cos(item.turnRad);
    const sin = Math.sin(item.turnRad);
    let along = -{ start: 0, middle: 0.5, end: 1 }[item.anchor] * widthEm * sizeMm;
    for (const run of runs) {
      this.run(run, { x: item.at.x + along * cos, y: item.at.y + along * sin }, sizeMm, item.colour, cos, sin);
      along += run.widthEm * sizeMm;
    }
  }

  private run(run: Run, at: Point, sizeMm: number, colour: Colour, cos: number, sin: number): void {
    if (run.font === null) {
      // A sign that no font has: an empty box in its place.
      const place = (x: number, y: number): Point => ({ x: at.x + (x * cos - y * sin) * sizeMm, y: at.y + (x * sin + y * cos) * sizeMm });
      const right = run.widthEm - 0.08;
      this.paint(this.trace([place(0.08, 0), place(right, 0), place(right, 0.7), place(0.08, 0.7)], true), { colour, widthMm: sizeMm * 0.06 }, null);
      return;
    }
    const name = this.fonts.get(run.font) ?? `F${this.fonts.size + 1}`;
    this.fonts.set(run.font, name);
    this.tellFill(colour);
    this.parts.push(`BT /${name} ${this.n(sizeMm)} Tf ${tidy(cos)} ${tidy(sin)} ${tidy(-sin)} ${tidy(cos)} ${this.n(at.x)} ${this.n(at.y)} Tm ${run.hex} Tj ET`);
  }
}

function rgb(value: number): string {
  return [(value >> 16) & 255, (value >> 8) & 255, value & 255].map((part) => tidy(part / 255)).join(' ');
}

/** To three decimals at most, without idle noughts. */
function tidy(value: number): string {
  const thousandths = Math.round(value * 1000);
  return Object.is(thousandths, -0) ? '0' : String(thousandths / 1000);
}
