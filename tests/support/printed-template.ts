import { execFileSync } from 'node:child_process';
import { dotsPerMm, PrintedPage } from './printed-page.ts';

/** What a reader program says of a file, and the size of every box of every page, in 1/72 in. */
export function pdfFacts(pdf: string): { sizesPt: [number, number][]; text: string } {
  const text = execFileSync('pdfinfo', ['-l', '999', '-box', pdf], { encoding: 'utf8' });
  const boxes = [...text.matchAll(/Page +\d+ (MediaBox|CropBox): +([\d.]+) +([\d.]+) +([\d.]+) +([\d.]+)/g)];
  return { text, sizesPt: boxes.map((b) => [Number(b[4]) - Number(b[2]), Number(b[5]) - Number(b[3])]) };
}

/** `17 7/8"` or `452 mm`, in mm, by its own reading. */
function read(words: string): number {
  const metric = /^([\d.]+) mm$/.exec(words);
  if (metric) return Number(metric[1]);
  const inches = /^(?:(\d+) ?)??(?:(\d+)\/(\d+))?"$/.exec(words)!;
  return 25.4 * (Number(inches[1] ?? 0) + (inches[2] ? Number(inches[2]) / Number(inches[3]) : 0));
}

const length = '([\\d./ ]+(?: mm|"))';

export interface PrintedSheet {
  page: number;
  bars: { axis: 'across' | 'up'; statedMm: number; printedMm: number }[];
  screws: { x: number; y: number }[];
}

/** Reads every sheet as the hanger does: where its cut edges say they are, how long its bars are, and where its cross-hairs stand. */
export async function readSheets(pdf: string, correction = { x: 1, y: 1 }): Promise<PrintedSheet[]> {
  const pages = Number(/Pages: +(\d+)/.exec(pdfFacts(pdf).text)![1]);
  const sheets: PrintedSheet[] = [];
  for (let page = 1; page <= pages; page += 1) {
    const printed = await PrintedPage.read(pdf, page);
    const bars = (['across', 'up'] as const).map((axis) => {
      const stated = new RegExp(`is ${length} ${axis}\\b`).exec(printed.words);
      return { axis, statedMm: read(stated![1]!), printedMm: printed.barLength(axis) };
    });
    const fromLeft = new RegExp(`this edge is ${length} from the wall’s left edge`).exec(printed.words);
    const aboveFloor = new RegExp(`this edge is ${length} above the floor`).exec(printed.words);
    const screws = [];
    if (fromLeft && aboveFloor) {
      const edges = printed.cutEdges();
      for (const dot of printed.crossHairs()) {
        screws.push({
          x: read(fromLeft[1]!) + (dot.x - edges.x) / dotsPerMm / correction.x,
          y: read(aboveFloor[1]!) + (edges.y - dot.y) / dotsPerMm / correction.y,
        });
      }
    }
    sheets.push({ page, bars, screws });
  }
  return sheets;
}
