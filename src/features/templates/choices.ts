import { isRoll, type Orientation, type Paper } from '../../../shared/templates/papers.ts';
import type { TemplateKind } from '../../../shared/templates/template-options.ts';
import type { TemplateWish } from './templates.queries.ts';

/** What is chosen in the dialog; lengths are null while their field is empty and not a number while it cannot be read. */
export interface Choices {
  kind: TemplateKind;
  paper: Paper;
  rollWidthMm: number | null;
  marginMm: number | null;
  join: 'overlap' | 'butt';
  overlapMm: number | null;
  colours: 'colour' | 'black';
  longPages: 'split' | 'user unit';
  orientation: 'fewest' | Orientation;
  firstFrameId: string;
  printerId: string;
}

export function usualChoices(units: 'in' | 'mm'): Choices {
  return {
    kind: 'full', paper: units === 'in' ? 'letter' : 'a4', rollWidthMm: 610, marginMm: 12.7, join: 'overlap', overlapMm: 12, colours: 'colour',
    longPages: 'split', orientation: 'fewest', firstFrameId: '', printerId: '',
  };
}

/** The choices as the server is asked; null while a length cannot be read. */
export function wishOf(c: Choices): TemplateWish | null {
  const lengths = [c.marginMm, c.overlapMm, ...(c.paper === 'roll' ? [c.rollWidthMm] : [])];
  if (lengths.some((mm) => mm === null || Number.isNaN(mm))) return null;
  return {
    kind: c.kind, paper: c.paper, marginMm: c.marginMm!, join: c.join, overlapMm: c.overlapMm!, colours: c.colours, orientation: c.orientation,
    ...(c.paper === 'roll' ? { rollWidthMm: c.rollWidthMm! } : {}),
    ...(isRoll(c.paper) ? { longPages: c.longPages } : {}),
    ...(c.firstFrameId ? { firstFrameId: c.firstFrameId } : {}),
    ...(c.printerId ? { printerId: c.printerId } : {}),
  };
}
