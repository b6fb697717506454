/** Side of the squares that are looked at one by one, px. */
const tilePx = 64;

/**
 * How sharp a grey picture (8 bits, row by row) is where it shows the most detail: the variance of its Laplacian
 * (the 4-neighbour kernel; Pech-Pacheco and others 2000) over squares of 64 px, of which the upper twentieth is taken, so that
 * a wall mostly bare is judged by its edges. Nought where the picture is smaller than one square.
 */
export function sharpnessOf(grey: Uint8Array, width: number, height: number): number {
  const found: number[] = [];
  for (let top = 1; top + tilePx < height; top += tilePx) {
    for (let left = 1; left + tilePx < width; left += tilePx) {
      let sum = 0;
      let squares = 0;
      for (let y = top; y < top + tilePx; y++) {
        for (let x = left; x < left + tilePx; x++) {
          const i = y * width + x;
          const v = grey[i - 1]! + grey[i + 1]! + grey[i - width]! + grey[i + width]! - 4 * grey[i]!;
          sum += v;
          squares += v * v;
        }
      }
      const count = tilePx * tilePx;
      found.push(squares / count - (sum / count) ** 2);
    }
  }
  found.sort((a, b) => a - b);
  return found[Math.floor(found.length * 0.95)] ?? 0;
}
