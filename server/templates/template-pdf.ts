import {
  PDFDocument, PDFName, PDFString, PrintScaling, appendBezierCurve, clip, closePath, concatTransformationMatrix, degrees, endPath, fill, fillAndStroke,
  lineTo, moveTo, popGraphicsState, pushGraphicsState, rgb, setDashPattern, setFillingColor, setLineCap, setLineJoin, setLineWidth, setStrokingColor,
  stroke, type PDFOperator, type PDFPage, LineCapStyle, LineJoinStyle,
} from 'pdf-lib';
import type { Point } from '../../shared/geometry/point.ts';
import type { Colour, Page, Primitive, Stroke, Text } from '../../shared/templates/drawing.ts';
import { TemplateFonts, type Run } from './template-fonts.ts';

const pointsPerMm = 72 / 25.4;
const pt = (mm: number) => mm * pointsPerMm;
const hex = (value: number) => rgb(((value >> 16) & 255) / 255, ((value >> 8) & 255) / 255, (value & 255) / 255);
const colours: Record<Colour, ReturnType<typeof rgb>> = {
  ink: hex(0x1e2b2a), grey: hex(0x586561), chalk: hex(0x1f5aa6), brass: hex(0x80600f), madder: hex(0xa8322a),
  'pale madder': hex(0xf7dfdb), rule: hex(0xd8d0bc), white: hex(0xffffff),
};

export interface PdfFacts {
  title: string;
  subject: string;
  author: string;
}

/** Draws pages at 1:1: one millimetre of the drawing is 72/25.4 units of the PDF, with page boxes of just the paper's size. */
export async function drawPdf(pages: Page[], facts: PdfFacts): Promise<Uint8Array> {
  const document = await PDFDocument.create();
  describe(document, facts);
  const fonts = new TemplateFonts(document);
  for (const page of pages) {
    const sheet = document.addPage([pt(page.widthMm), pt(page.heightMm)]);
    for (const box of ['MediaBox', 'CropBox', 'TrimBox'] as const) {
      sheet.node.set(PDFName.of(box), document.context.obj([0, 0, pt(page.widthMm), pt(page.heightMm)]));
    }
    await drawAll(sheet, page.items, fonts);
  }
  // In one go: this runs in a thread of its own, where nobody waits for a turn between.
  return document.save({ objectsPerTick: Infinity });
}

function describe(document: PDFDocument, facts: PdfFacts): void {
  document.setTitle(facts.title, { showInWindowTitleBar: true });
  document.setSubject(facts.subject);
  document.setAuthor(facts.author);
  document.setProducer('Combwright');
  document.setCreator('Combwright');
  document.catalog.set(PDFName.of('Lang'), PDFString.of('en'));
  document.catalog.getOrCreateViewerPreferences().setPrintScaling(PrintScaling.None);
}

async function drawAll(sheet: PDFPage, items: Primitive[], fonts: TemplateFonts): Promise<void> {
  for (const item of items) {
    if (item.kind === 'text') await drawText(sheet, item, fonts);
    else if (item.kind === 'clip') {
      const { x, y, width, height } = item.rect;
      sheet.pushOperators(pushGraphicsState(), ...trace([{ x, y }, { x: x + width, y }, { x: x + width, y: y + height }, { x, y: y + height }], true), clip(), endPath());
      await drawAll(sheet, item.items, fonts);
      sheet.pushOperators(popGraphicsState());
    } else sheet.pushOperators(...drawn(item));
  }
}

function drawn(item: Exclude<Primitive, Text | { kind: 'clip' }>): PDFOperator[] {
  if (item.kind === 'line') return painted(trace([item.from, item.to], false), item.stroke, null);
  if (item.kind === 'circle') return painted(round(item.centre, item.radiusMm), item.stroke, item.fill);
  return painted(trace(item.points, item.closed), item.stroke, item.fill);
}

function painted(path: PDFOperator[], pen: Stroke | null, inside: Colour | null): PDFOperator[] {
  if (!pen && !inside) return [];
  return [
    pushGraphicsState(),
    ...(inside ? [setFillingColor(colours[inside])] : []),
    ...(pen ? [setStrokingColor(colours[pen.colour]), setLineWidth(pt(pen.widthMm)), setLineCap(LineCapStyle.Butt), setLineJoin(LineJoinStyle.Miter), setDashPattern((pen.dashMm ?? []).map(pt), 0)] : []),
    ...path,
    pen && inside ? fillAndStroke() : pen ? stroke() : fill(),
    popGraphicsState(),
  ];
}

function trace(points: Point[], closed: boolean): PDFOperator[] {
  const steps = points.map((p, i) => (i === 0 ? moveTo(pt(p.x), pt(p.y)) : lineTo(pt(p.x), pt(p.y))));
  return closed ? [...steps, closePath()] : steps;
}

/** Four cubic curves; 0.5523 is the usual arm for a quarter circle, true to 0.03 % of the radius. */
function round(centre: Point, radiusMm: number): PDFOperator[] {
  const x = pt(centre.x);
  const y = pt(centre.y);
  const r = pt(radiusMm);
  const arm = 0.5523 * r;
  return [
    moveTo(x + r, y),
    appendBezierCurve(x + r, y + arm, x + arm, y + r, x, y + r),
    appendBezierCurve(x - arm, y + r, x - r, y + arm, x - r, y),
    appendBezierCurve(x - r, y - arm, x - arm, y - r, x, y - r),
    appendBezierCurve(x + arm, y - r, x + r, y - arm, x + r, y),
    closePath(),
  ];
}

async function drawText(sheet: PDFPage, item: Text, fonts: TemplateFonts): Promise<void> {
  const runs = await fonts.runs(item.text, item.weight);
  const widthEm = runs.reduce((sum, run) => sum + run.widthEm, 0);
  if (widthEm === 0) return;
  const sizeMm = item.maxWidthMm === undefined ? item.sizeMm : Math.min(item.sizeMm, item.maxWidthMm / widthEm);
  const cos = Math.cos(item.turnRad);
  const sin = Math.sin(item.turnRad);
  let along = -{ start: 0, middle: 0.5, end: 1 }[item.anchor] * widthEm * sizeMm;
  for (const run of runs) {
    const at = { x: item.at.x + along * cos, y: item.at.y + along * sin };
    drawRun(sheet, run, at, sizeMm, item, cos, sin);
    along += run.widthEm * sizeMm;
  }
}

function drawRun(sheet: PDFPage, run: Run, at: Point, sizeMm: number, item: Text, cos: number, sin: number): void {
  if (run.font !== null) {
    sheet.drawText(run.text, { x: pt(at.x), y: pt(at.y), size: pt(sizeMm), font: run.font, color: colours[item.colour], rotate: degrees((item.turnRad * 180) / Math.PI) });
    return;
  }
  const box = [{ x: 0.08, y: 0 }, { x: run.widthEm - 0.08, y: 0 }, { x: run.widthEm - 0.08, y: 0.7 }, { x: 0.08, y: 0.7 }];
  sheet.pushOperators(
    pushGraphicsState(),
    concatTransformationMatrix(cos, sin, -sin, cos, pt(at.x), pt(at.y)),
    ...painted(trace(box.map((p) => ({ x: p.x * sizeMm, y: p.y * sizeMm })), true), { colour: item.colour, widthMm: sizeMm * 0.06 }, null),
    popGraphicsState(),
  );
}
