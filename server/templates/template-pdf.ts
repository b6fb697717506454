import { deflateSync } from 'node:zlib';
import { PDFDocument, PDFName, PDFString, PrintScaling } from 'pdf-lib';
import type { Page } from '../../shared/templates/drawing.ts';
import { longestPageMm } from '../../shared/templates/papers.ts';
import { PdfContent, type Palette } from './pdf-content.ts';
import { TemplateFonts } from './template-fonts.ts';

const pointsPerMm = 72 / 25.4;

export interface PdfFacts {
  title: string;
  subject: string;
  author: string;
}

export interface PdfOptions {
  palette?: Palette;
  /** Told after each page how many are drawn. */
  onPage?: (drawn: number) => void;
}

/**
 * Draws pages at 1:1: one millimetre of the drawing is 72/25.4 units of the PDF, with page boxes of just the paper's size. A page past 14,400 units
 * takes a UserUnit. Pages are drawn one by one and kept packed, so that memory grows with the file and not with the drawing.
 */
export async function drawPdf(pages: Iterable<Page>, facts: PdfFacts, { palette = 'colour', onPage }: PdfOptions = {}): Promise<Uint8Array> {
  const document = await PDFDocument.create();
  describe(document, facts);
  const fonts = new TemplateFonts(document);
  let drawn = 0;
  for (const page of pages) {
    const userUnit = Math.ceil(Math.max(page.widthMm, page.heightMm) / longestPageMm - 1e-9);
    const scale = pointsPerMm / userUnit;
    const size: [number, number] = [page.widthMm * scale, page.heightMm * scale];
    const sheet = document.addPage(size);
    for (const box of ['MediaBox', 'CropBox', 'TrimBox'] as const) sheet.node.set(PDFName.of(box), document.context.obj([0, 0, ...size]));
    if (userUnit > 1) sheet.node.set(PDFName.of('UserUnit'), document.context.obj(userUnit));
    const content = new PdfContent(fonts, scale, palette);
    await content.draw(page.items);
    for (const [font, name] of content.fonts) sheet.node.setFontDictionary(PDFName.of(name), font.ref);
    const packed = document.context.stream(deflateSync(content.text()), { Filter: 'FlateDecode' });
    sheet.node.set(PDFName.of('Contents'), document.context.register(packed));
    onPage?.((drawn += 1));
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
