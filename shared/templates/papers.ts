const inch = 25.4;

interface SheetSize {
  name: string;
  widthMm: number;
  heightMm: number;
}

/** Sheet sizes in mm, upright. Sources: ANSI/ASME Y14.1 (Letter is its A, Tabloid its B), ISO 216 (A sizes); Legal is 8 1/2 by 14 in by common practice. */
export const paperSizes = {
  letter: { name: 'Letter', widthMm: 8.5 * inch, heightMm: 11 * inch },
  legal: { name: 'Legal', widthMm: 8.5 * inch, heightMm: 14 * inch },
  tabloid: { name: 'Tabloid', widthMm: 11 * inch, heightMm: 17 * inch },
  a4: { name: 'A4', widthMm: 210, heightMm: 297 },
  a3: { name: 'A3', widthMm: 297, heightMm: 420 },
  a2: { name: 'A2', widthMm: 420, heightMm: 594 },
  a1: { name: 'A1', widthMm: 594, heightMm: 841 },
  a0: { name: 'A0', widthMm: 841, heightMm: 1189 },
} as const satisfies Record<string, SheetSize>;

/** Rolls by their width, mm; `roll` is as wide as the reader says. */
export const rollWidths = {
  'roll-24in': { name: 'Roll 24 in', widthMm: 24 * inch },
  'roll-36in': { name: 'Roll 36 in', widthMm: 36 * inch },
  'roll-42in': { name: 'Roll 42 in', widthMm: 42 * inch },
  'roll-610': { name: 'Roll 610 mm', widthMm: 610 },
  'roll-914': { name: 'Roll 914 mm', widthMm: 914 },
  roll: { name: 'Roll of another width', widthMm: null },
} as const;

export type SheetPaper = keyof typeof paperSizes;
export type RollPaper = keyof typeof rollWidths;
export type Paper = SheetPaper | RollPaper;
export const papers = [...Object.keys(paperSizes), ...Object.keys(rollWidths)] as [Paper, ...Paper[]];

export type Orientation = 'portrait' | 'landscape';
export const orientations = ['portrait', 'landscape'] as const;

/** The longest page readers of PDF must take without UserUnit, 14,400 units of 1/72 in (ISO 32000-1, annex C). */
export const longestPageMm = (14_400 / 72) * inch;

export function isRoll(paper: Paper): paper is RollPaper {
  return paper in rollWidths;
}

export function paperName(paper: Paper, rollWidthMm: number | null = null): string {
  if (!isRoll(paper)) return paperSizes[paper].name;
  return paper === 'roll' && rollWidthMm !== null ? `Roll ${Math.round(rollWidthMm * 10) / 10} mm` : rollWidths[paper].name;
}

/** Width of a roll, mm; `given` counts for rolls of another width. */
export function rollWidth(paper: RollPaper, given: number | null): number {
  return rollWidths[paper].widthMm ?? given ?? 610;
}

/** Width and height of a sheet as it is turned. */
export function paperSize(paper: SheetPaper, orientation: Orientation): { widthMm: number; heightMm: number } {
  const { widthMm, heightMm } = paperSizes[paper];
  return orientation === 'portrait' ? { widthMm, heightMm } : { widthMm: heightMm, heightMm: widthMm };
}
