import { readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import path from 'node:path';
import fontkit from '@pdf-lib/fontkit';
import type { PDFDocument, PDFFont } from 'pdf-lib';
import type { Weight } from '../../shared/templates/drawing.ts';

const weights: Record<Weight, number> = { regular: 400, bold: 700 };
/** Scripts that the type's files are cut into, the likeliest first. */
const scripts = ['latin', 'latin-ext', 'cyrillic', 'cyrillic-ext', 'vietnamese'];
/** Signs that people type and the type lacks, written with ones it has. */
const plain: Record<string, string> = {
  '−': '–', '‐': '-', '‑': '-', '→': '>', '←': '<', '≤': '<=', '≥': '>=', '⅛': '1/8', '⅜': '3/8', '⅝': '5/8', '⅞': '7/8', '⅓': '1/3', '⅔': '2/3',
  '″': '"', '′': "'", '✓': 'x', '☐': '[ ]', '\u00a0': ' ', '\u202f': ' ', '\u2009': ' ', '\t': ' ', '\n': ' ', '\r': ' ',
};

/** A stretch of text in one font, or a sign that no font has, to be drawn as an empty box. */
export type Run = { font: PDFFont; hex: string; widthEm: number } | { font: null; widthEm: number };

interface Face {
  has: (codePoint: number) => boolean;
  bytes: Uint8Array;
  embedded: Promise<PDFFont> | null;
  font: PDFFont | null;
}

const boxEm = 0.7;

/** The document's type: loads and embeds only the files that the text asks for. */
export class TemplateFonts {
  private readonly faces = new Map<string, Promise<Face>>();
  /** A template says the same things on every sheet. */
  private readonly chosen = new Map<string, Face | null>();
  private readonly known = new Map<string, Run[]>();
  private readonly signs = new Map<PDFFont, Map<string, { hex: string; widthEm: number }>>();

  constructor(private readonly document: PDFDocument) {
    document.registerFontkit(fontkit);
  }

  /** Runs of a text that was split before, without a wait. */
  settled(text: string, weight: Weight): Run[] | undefined {
    return this.known.get(`${weight} ${text}`);
  }

  /** Splits a text into runs that can be drawn; signs without a glyph anywhere become boxes, invisible ones are dropped. */
  async runs(text: string, weight: Weight): Promise<Run[]> {
    const key = `${weight} ${text}`;
    const runs = this.known.get(key) ?? (await this.split(text, weight));
    this.known.set(key, runs);
    return runs;
  }

  private async split(text: string, weight: Weight): Promise<Run[]> {
    const runs: Run[] = [];
    let pending: { face: Face; text: string } | null = null;
    const flush = async () => {
      if (pending === null) return;
      const font = pending.face.font ?? (pending.face.font = await this.embed(pending.face));
      runs.push(this.set(font, pending.text));
      pending = null;
    };
    for (const sign of [...text.normalize('NFC')].flatMap((s) => [...(plain[s] ?? s)])) {
      if (/[\p{Cc}\p{Cf}\p{Mn}\p{Cs}]/u.test(sign)) continue;
      const place = `${weight} ${sign}`;
      let face = this.chosen.get(place);
      if (face === undefined) this.chosen.set(place, (face = await this.faceFor(sign.codePointAt(0)!, weight)));
      if (face === null) {
        await flush();
        runs.push({ font: null, widthEm: boxEm });
      } else if (pending !== null && (pending as { face: Face }).face === face) {
        (pending as { text: string }).text += sign;
      } else {
        await flush();
        pending = { face, text: sign };
      }
    }
    await flush();
    return runs;
  }

  /**
   * Sign by sign, each worked out once: shaping whole strings took most of the drawing's time, and without kerning in the
   * file it places nothing otherwise.
   */
  private set(font: PDFFont, text: string): Run {
    let signs = this.signs.get(font);
    if (!signs) this.signs.set(font, (signs = new Map()));
    let hex = '';
    let widthEm = 0;
    for (const sign of text) {
      let one = signs.get(sign);
      if (!one) signs.set(sign, (one = { hex: font.encodeText(sign).asString(), widthEm: font.widthOfTextAtSize(sign, 1) }));
      hex += one.hex;
      widthEm += one.widthEm;
    }
    return { font, hex: `<${hex}>`, widthEm };
  }

  private async faceFor(codePoint: number, weight: Weight): Promise<Face | null> {
    for (const script of scripts) {
      const face = await this.face(script, weight);
      if (face.has(codePoint)) return face;
    }
    return null;
  }

  private face(script: string, weight: Weight): Promise<Face> {
    const name = `nunito-sans-${script}-${weights[weight]}-normal.woff`;
    let face = this.faces.get(name);
    if (!face) {
      face = readFace(name);
      this.faces.set(name, face);
    }
    return face;
  }

  /** Subsets of .woff are what the PDF library embeds soundly: whole fonts come out with wrong widths, .woff2 cannot be read. */
  private embed(face: Face): Promise<PDFFont> {
    face.embedded ??= this.document.embedFont(face.bytes, { subset: true });
    return face.embedded;
  }
}

async function readFace(name: string): Promise<Face> {
  const home = path.dirname(createRequire(import.meta.url).resolve('@fontsource/nunito-sans/package.json'));
  const bytes = await readFile(path.join(home, 'files', name));
  const signs = new Set(fontkit.create(bytes).characterSet);
  return { bytes, embedded: null, font: null, has: (codePoint) => signs.has(codePoint) };
}
