import type { FitReport } from './fit-report.ts';

/** What became of the lens, in words. */
export function lensWords(lens: FitReport['lens']): string {
  if (lens.state === 'left out') {
    const why = lens.why === 'too unsure' ? 'The marks do not tell the lens surely enough, so none was taken out' : 'Four marks alone do not tell the lens, so none was taken out';
    return `${why}. The stated error supposes a lens that hardly bends, as in most phones: if straight things look bent in the photo, mark points along one of them.`;
  }
  const percent = Math.abs(lens.cornerPercent);
  if (percent < Math.max(0.05, 2 * lens.spreadPercent)) return `The lens bends straight lines by no more than can be told (${percent.toFixed(2)} % at the corners, give or take ${(2 * lens.spreadPercent).toFixed(2)}).`;
  return `The lens bends straight lines ${lens.cornerPercent < 0 ? 'outwards like a barrel' : 'inwards like a pincushion'}: the corners are out by ${percent.toFixed(1)} %, give or take ${(2 * lens.spreadPercent).toFixed(1)}. That is taken out.`;
}
