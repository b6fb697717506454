const inch = 25.4;

/** Sheet sizes in mm, upright. Sources: ANSI/ASME Y14.1 (inch sizes), ISO 216 (A sizes). */
export const paperSizes = {
  letter: { name: 'Letter', widthMm: 8.5 * inch, heightMm: 11 * inch },
  a4: { name: 'A4', widthMm: 210, heightMm: 297 },
} as const;

export type Paper = keyof typeof paperSizes;
export const papers = Object.keys(paperSizes) as [Paper, ...Paper[]];

export type Orientation = 'portrait' | 'landscape';
export const orientations = ['portrait', 'landscape'] as const;

/** Width and height of a paper as it is turned. */
export function paperSize(paper: Paper, orientation: Orientation): { widthMm: number; heightMm: number } {
  const { widthMm, heightMm } = paperSizes[paper];
  return orientation === 'portrait' ? { widthMm, heightMm } : { widthMm: heightMm, heightMm: widthMm };
}
