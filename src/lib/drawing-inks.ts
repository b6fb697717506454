import type { Ink } from '../../shared/layouts/drawing.ts';
import { colours, timber } from '../../tailwind.config.ts';

/** How one ink looks on screen: its colour and, for lines, its weight in CSS pixels whatever the zoom. */
export interface InkLook {
  colour: string;
  linePx: number;
}

const drawn: Record<Exclude<Ink, keyof typeof timber>, InkLook> = {
  wall: { colour: colours.white, linePx: 0 },
  'wall rim': { colour: colours.ink[900], linePx: 1.5 },
  stud: { colour: colours.chalk[600], linePx: 1 },
  'stud unconfirmed': { colour: colours.chalk[600], linePx: 1 },
  obstruction: { colour: colours.ink[500], linePx: 1 },
  shadow: { colour: colours.ink[900], linePx: 0 },
  rim: { colour: colours.ink[900], linePx: 1 },
  joint: { colour: colours.ink[900], linePx: 1.2 },
  grain: { colour: `${colours.ink[900]}38`, linePx: 0.75 },
  glint: { colour: colours.white, linePx: 2 },
  hanger: { colour: colours.brass[600], linePx: 1 },
  'hanger rim': { colour: colours.brass[200], linePx: 1 },
  words: { colour: colours.ink[900], linePx: 0 },
};

/** The look of an ink on screen; the timber tones are areas only. */
export function inkLook(ink: Ink): InkLook {
  return ink in timber ? { colour: timber[ink as keyof typeof timber], linePx: 1 } : drawn[ink as keyof typeof drawn];
}
