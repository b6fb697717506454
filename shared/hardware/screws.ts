import { z } from 'zod';
import { id } from '../api/endpoint.ts';
import { MM_PER_INCH } from '../units/constants.ts';
import { MPA_PER_PSI } from './bearing.ts';

const positiveMm = (most: number) => z.number({ error: 'Please give a length.' }).finite().positive('This must be more than zero.').max(most);

/** What the strength of a screw depends on; mm and N/mm². */
export const ScrewBody = z
  .object({
    kind: z.enum(['wood screw', 'lag screw']),
    /** As the trade calls it: `#10`, `5/16`. */
    size: z.string().trim().min(1).max(20),
    /** Nominal (outer) and root diameter. */
    diameterMm: positiveMm(25),
    rootDiameterMm: positiveMm(25),
    lengthMm: positiveMm(400),
    /** From the point up. */
    threadLengthMm: positiveMm(400),
    headDiameterMm: positiveMm(60),
    /** Bending yield strength, N/mm². Hardened screws: from the maker's evaluation report. */
    bendingYieldMPa: z.number().finite().min(100).max(2000),
  })
  .refine((s) => s.rootDiameterMm < s.diameterMm, { path: ['rootDiameterMm'], error: 'The root is thinner than the thread.' })
  .refine((s) => s.threadLengthMm <= s.lengthMm, { path: ['threadLengthMm'], error: 'The thread is no longer than the screw.' })
  .refine((s) => s.headDiameterMm > s.diameterMm, { path: ['headDiameterMm'], error: 'The head is wider than the thread.' });
export type ScrewBody = z.infer<typeof ScrewBody>;

/** A screw of the shop's hardware book. */
export const Screw = z.intersection(
  z.object({ id, name: z.string().trim().min(1, 'Please name the screw.').max(80) }),
  ScrewBody,
);
export type Screw = z.infer<typeof Screw>;

const inch = (x: number) => x * MM_PER_INCH;

/**
 * Wood screw sizes, in: nominal, root and head diameter. Source: NDS-2018 table L3 (after ASME B18.6.1); #10 read in a published
 * example, the others from memory, #14's head least sure. The nominal diameters obey 0.060 + 0.013 n.
 */
const woodScrewsIn = {
  '#6': [0.138, 0.113, 0.262],
  '#7': [0.151, 0.122, 0.287],
  '#8': [0.164, 0.131, 0.312],
  '#9': [0.177, 0.142, 0.337],
  '#10': [0.19, 0.152, 0.363],
  '#12': [0.216, 0.171, 0.413],
  '#14': [0.242, 0.196, 0.48],
} as const;

/** Lag screw sizes, in: nominal, root, head across flats, tip. Source: NDS-2018 table L2 (after ASME B18.2.1), from memory. */
const lagScrewsIn = {
  '1/4': [0.25, 0.173, 7 / 16, 5 / 32],
  '5/16': [0.3125, 0.227, 1 / 2, 3 / 16],
  '3/8': [0.375, 0.265, 9 / 16, 7 / 32],
  '1/2': [0.5, 0.371, 3 / 4, 5 / 16],
} as const;

export type WoodScrewSize = keyof typeof woodScrewsIn;
export type LagScrewSize = keyof typeof lagScrewsIn;
export const woodScrewSizes = Object.keys(woodScrewsIn) as WoodScrewSize[];
export const lagScrewSizes = Object.keys(lagScrewsIn) as LagScrewSize[];

/**
 * Bending yield strength of common screws by nominal diameter, N/mm². Source: notes to NDS-2018 tables 12K to 12M (#10 read in a
 * published example; the rest from memory). Thicker than 0.273 in, wood screws are taken as the like lag.
 */
export function bendingYield(kind: ScrewBody['kind'], diameterMm: number): number {
  const d = diameterMm / MM_PER_INCH + 1e-9;
  const lag = d < 0.25 + 1e-6 ? 70_000 : d < 0.3125 + 1e-6 ? 60_000 : 45_000;
  const wood = d < 0.142 + 1e-6 ? 100_000 : d < 0.177 + 1e-6 ? 90_000 : d < 0.236 + 1e-6 ? 80_000 : d < 0.273 + 1e-6 ? 70_000 : lag;
  return (kind === 'lag screw' ? lag : wood) * MPA_PER_PSI;
}

/**
 * A wood screw of standard size and given length (mm). Thread two thirds of the length, as cut threads have it (rolled threads run
 * further, never less); bending yield as for common steel.
 */
export function standardWoodScrew(size: WoodScrewSize, lengthMm: number): ScrewBody {
  const [d, root, head] = woodScrewsIn[size];
  return {
    kind: 'wood screw', size, diameterMm: inch(d), rootDiameterMm: inch(root), headDiameterMm: inch(head),
    lengthMm, threadLengthMm: (lengthMm * 2) / 3, bendingYieldMPa: bendingYield('wood screw', inch(d)),
  };
}

/** A hex lag screw of standard size and given length (mm), 1 in or more. Thread: half the length and 1/2 in more, at most 6 in (ASME B18.2.1). */
export function standardLagScrew(size: LagScrewSize, lengthMm: number): ScrewBody {
  const [d, root, head] = lagScrewsIn[size];
  const thread = Math.min(lengthMm / 2 + inch(0.5), inch(6), lengthMm - inch(0.25));
  return {
    kind: 'lag screw', size, diameterMm: inch(d), rootDiameterMm: inch(root), headDiameterMm: inch(head),
    lengthMm, threadLengthMm: thread, bendingYieldMPa: bendingYield('lag screw', inch(d)),
  };
}

/**
 * Length of the tapered tip, mm: 2D for wood screws (NDS-2018 12.3.5.3), table L2 for standard lags. A lag of another size is given
 * 5/8 D, which is what the table's tips come to or less.
 */
export function tipLength(screw: Pick<ScrewBody, 'kind' | 'diameterMm'>): number {
  if (screw.kind === 'wood screw') return 2 * screw.diameterMm;
  const known = Object.values(lagScrewsIn).find(([d]) => Math.abs(inch(d) - screw.diameterMm) < 0.05);
  return known ? inch(known[3]) : 0.625 * screw.diameterMm;
}
