import { execFile } from 'node:child_process';
import { readFile } from 'node:fs/promises';
import { promisify } from 'node:util';

const run = promisify(execFile);
export const dotsPerMm = 300 / 25.4;

/** One page as a printer would lay it down at 300 dpi, read by a program that knows nothing of how it was made. */
export class PrintedPage {
  private constructor(
    readonly words: string,
    private readonly width: number,
    private readonly height: number,
    private readonly pixels: Uint8Array,
  ) {}

  static async read(pdf: string, page: number): Promise<PrintedPage> {
    const [words, image] = await Promise.all([
      run('pdftotext', ['-f', String(page), '-l', String(page), pdf, '-']),
      run('pdftoppm', ['-r', '300', '-f', String(page), '-l', String(page), '-singlefile', pdf, `${pdf}-${page}`]).then(() => readFile(`${pdf}-${page}.ppm`)),
    ]);
    const head = /^P6\s+(\d+)\s+(\d+)\s+255\s/.exec(image.subarray(0, 40).toString('latin1'));
    if (!head) throw new Error('pdftoppm gave no picture');
    return new PrintedPage(words.stdout.replace(/\s+/g, ' '), Number(head[1]), Number(head[2]), image.subarray(head[0].length));
  }

  private darkness(x: number, y: number): number {
    const i = 3 * (y * this.width + x);
    return 255 - (this.pixels[i]! + this.pixels[i + 1]! + this.pixels[i + 2]!) / 3;
  }

  /** Longest run of dark dots in a row or a column. */
  private longestRun(axis: 'row' | 'column', index: number): { from: number; to: number } {
    const size = axis === 'row' ? this.width : this.height;
    let best = { from: 0, to: -1 };
    let from = -1;
    for (let i = 0; i <= size; i += 1) {
      const dark = i < size && (axis === 'row' ? this.darkness(i, index) : this.darkness(index, i)) > 110;
      if (dark && from < 0) from = i;
      if (!dark && from >= 0) {
        if (i - from > best.to - best.from + 1) best = { from, to: i - 1 };
        from = -1;
      }
    }
    return best;
  }

  /** First row from the top, or column from the left or right, or row from the foot, that holds a solid line of at least `mm`; its middle in dots. */
  private firstLine(from: 'top' | 'foot' | 'left' | 'right', mm: number): { middle: number; run: { from: number; to: number } } {
    const axis = from === 'top' || from === 'foot' ? 'row' : 'column';
    const size = axis === 'row' ? this.height : this.width;
    const order = from === 'top' || from === 'left' ? (i: number) => i : (i: number) => size - 1 - i;
    for (let i = 0; i < size; i += 1) {
      const run = this.longestRun(axis, order(i));
      if ((run.to - run.from + 1) / dotsPerMm < mm) continue;
      // The line's own darkness weighs its rows, read where no tick stands.
      const beside = run.from + 40;
      let sum = 0;
      let weighed = 0;
      for (let k = order(i) - 6; k <= order(i) + 6; k += 1) {
        const dark = axis === 'row' ? this.darkness(beside, k) : this.darkness(k, beside);
        sum += dark;
        weighed += dark * (k + 0.5);
      }
      return { middle: weighed / sum, run };
    }
    throw new Error(`No line of ${mm} mm from the ${from}`);
  }

  /** Cut edges at left and foot: where they stand on paper, in dots from the left and from the top. */
  cutEdges(): { x: number; y: number } {
    return { x: this.firstLine('left', 120).middle, y: this.firstLine('foot', 120).middle };
  }

  /** Distance between the end ticks of the bar across or the bar up, mm on paper. */
  barLength(axis: 'across' | 'up'): number {
    const bar = this.firstLine(axis === 'across' ? 'top' : 'right', 90);
    const aside = Math.round(bar.middle - 3 * dotsPerMm);
    const dark = (along: number) => (axis === 'across' ? this.darkness(along, aside) : this.darkness(aside, along));
    const tick = (near: number) => {
      let sum = 0;
      let weighed = 0;
      for (let k = near - 6; k <= near + 6; k += 1) {
        sum += dark(k);
        weighed += dark(k) * (k + 0.5);
      }
      if (sum < 200) throw new Error(`No end tick near dot ${near}`);
      return weighed / sum;
    };
    return (tick(bar.run.to) - tick(bar.run.from)) / dotsPerMm;
  }

  /** Centres of cross-hairs, in dots from the left and from the top: the only marks printed in brass. */
  crossHairs(): { x: number; y: number }[] {
    return this.brassMarks().flatMap((dots) => {
      const x = thickest(dots.map((d) => d.x));
      const y = thickest(dots.map((d) => d.y));
      return x !== null && y !== null ? [{ x, y }] : [];
    });
  }

  /** How much of the page is printed in pale red. */
  paleRedShare(): number {
    let count = 0;
    for (let i = 0; i < this.pixels.length; i += 3) {
      const r = this.pixels[i]!;
      if (r > 235 && r - this.pixels[i + 1]! > 12 && r - this.pixels[i + 2]! > 12) count += 1;
    }
    return count / (this.width * this.height);
  }

  /** Dots of brass, gathered where they are within some 8 dots of each other. */
  private brassMarks(): { x: number; y: number }[][] {
    const cell = 4;
    const columns = Math.ceil(this.width / cell);
    const cells = new Map<number, { x: number; y: number }[]>();
    for (let y = 0; y < this.height; y += 1) {
      for (let x = 0; x < this.width; x += 1) {
        const i = 3 * (y * this.width + x);
        const r = this.pixels[i]!;
        if (r - this.pixels[i + 2]! <= 40 || r - this.pixels[i + 1]! >= 60) continue;
        const key = Math.floor(y / cell) * columns + Math.floor(x / cell);
        const dots = cells.get(key);
        if (dots) dots.push({ x, y });
        else cells.set(key, [{ x, y }]);
      }
    }
    const marks: { x: number; y: number }[][] = [];
    for (const start of [...cells.keys()]) {
      if (!cells.has(start)) continue;
      const mark: { x: number; y: number }[] = [];
      const open = [start];
      while (open.length > 0) {
        const key = open.pop()!;
        const dots = cells.get(key);
        if (!dots) continue;
        cells.delete(key);
        mark.push(...dots);
        for (const dy of [-1, 0, 1]) for (const dx of [-1, 0, 1]) open.push(key + dy * columns + dx);
      }
      marks.push(mark);
    }
    return marks;
  }
}

/** Middle of the columns (or rows) that an arm fills: those with most dots, at least 7.5 mm of them. */
function thickest(values: number[]): number | null {
  const counts = new Map<number, number>();
  for (const v of values) counts.set(v, (counts.get(v) ?? 0) + 1);
  const most = Math.max(...counts.values());
  if (most < 7.5 * dotsPerMm) return null;
  const arm = [...counts].filter(([, n]) => n > 0.6 * most).map(([v]) => v + 0.5);
  return arm.reduce((sum, v) => sum + v, 0) / arm.length;
}
