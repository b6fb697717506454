import { boxOf } from '../geometry/polygon.ts';
import { rectangle, text, type Page, type Rect } from './drawing.ts';
import { chooseDatums } from './hang-order.ts';
import { wallPart } from './sheet-page.ts';
import { revisionWords, signature } from './sheet-title.ts';
import type { TemplateInput } from './template-input.ts';
import type { View } from './wall-drawing.ts';

const roomMm = 60;
const titleMm = 30;

/**
 * All that the sheets show, on one page as large as it takes, at 1:1 and uncorrected: for a cutter or a plotter, which has no sheets. Its lower left
 * corner stands `originMm` from the wall's.
 */
export function wholeWall(input: TemplateInput): { page: Page; originMm: { x: number; y: number } } {
  const box = boxOf([...input.frames.flatMap((f) => f.outlineMm), ...input.frames.flatMap((f) => f.hangers)]);
  const window: Rect = { x: Math.floor(box.left - roomMm), y: Math.floor(box.bottom - roomMm), width: Math.ceil(box.right - box.left + 2 * roomMm), height: Math.ceil(box.top - box.bottom + 2 * roomMm) };
  const live: Rect = { x: 0, y: 0, width: window.width, height: window.height };
  const view: View = { live, window, toPage: (p) => ({ x: p.x - window.x, y: p.y - window.y }), seen: live };
  const { title } = input;
  const words = [
    [title.shop, title.job, title.wall, title.layout].filter(Boolean).join(' · '),
    `${revisionWords(title)} · ${input.drawnAt}${signature(title).signed ? '' : ' · DO NOT DRILL FROM IT'}`,
    '1:1. The frame round this drawing must measure just as wide as it says: check before cutting. Look for cables and pipes before drilling.',
    `Frame ${window.width} mm wide, ${window.height} mm high; its lower left corner is ${window.x} mm from the wall’s left edge and ${window.y} mm above the floor`,
  ];
  return {
    originMm: { x: window.x, y: window.y },
    page: {
      name: 'Whole wall', widthMm: window.width, heightMm: window.height + titleMm,
      items: [
        { kind: 'clip', rect: live, items: wallPart({ ...input, kind: 'full' }, view, chooseDatums(input)) },
        rectangle('title', live, { colour: 'ink', widthMm: 0.25 }),
        ...words.map((row, i) => text('title', { x: 4, y: window.height + titleMm - 6 - i * 6 }, row, 4, { maxWidthMm: window.width - 8, weight: i === 0 ? 'bold' : 'regular' })),
      ],
    },
  };
}
