import { MM_PER_INCH } from '../units/constants.ts';

/** Heights of the middle of what hangs above the floor, mm: 57 and 60 in. (Common practice where people stand to look; no standard.) */
export const pictureHeightsMm = [57 * MM_PER_INCH, 60 * MM_PER_INCH] as const;
