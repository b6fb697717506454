import { plainSigns, settleComma, tidyNumber } from './number-text.ts';

export const radians = (degrees: number): number => (degrees * Math.PI) / 180;
export const degrees = (rad: number): number => (rad * 180) / Math.PI;

/** `22.5°`: to the nearest 0.05° unless told otherwise, which is finer than a saw's scale is read. */
export function formatAngle(rad: number, stepDegrees = 0.05): string {
  const rounded = Math.round(degrees(rad) / stepDegrees) * stepDegrees;
  return `${tidyNumber(rounded, 2)}°`;
}

/** Reads an angle in degrees as typed (`30`, `22.5°`, `22,5 deg`), in radians. */
export function parseAngle(text: string): { rad: number } | { error: string } {
  const example = 'Write an angle in degrees, such as 22.5°.';
  const match = /^(-?) ?([\d.,]+) ?(°|deg|degrees?)?$/.exec(plainSigns(text));
  const number = match ? settleComma(match[2] ?? '') : null;
  if (!match || number === null || !/^(\d+\.?\d*|\.\d+)$/.test(number)) return { error: example };
  return { rad: radians(match[1] === '-' ? -Number(number) : Number(number)) };
}
