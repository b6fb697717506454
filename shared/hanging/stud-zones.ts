import type { Stud } from '../walls/wall.ts';

/** Least distance of a screw from the stud's edge, in diameters: load along the grain (NDS-2018 table 12.5.1C). */
export const edgeDiameters = 1.5;
/** Distance the commentary advises for screws; nearer is a caution (NDS commentary, table C12.1.5.7, from memory). */
export const advisedEdgeDiameters = 2.5;

type StudPlace = Pick<Stud, 'id' | 'xMm' | 'widthMm' | 'uncertaintyMm'>;

/** How a screw stands to the nearest stud that could hold it. */
export interface StudMeeting {
  studId: string;
  inStud: boolean;
  /** In the stud, but nearer to its edge than advised. */
  nearEdge: boolean;
  /** What is left until the screw no longer counts, mm; negative by how far it misses. */
  marginMm: number;
}

/**
 * Half the width in which a screw's centre counts as in the stud, mm: b/2 − 1.5D − the stud's own uncertainty. Not positive: so thick
 * a screw cannot be trusted to a stud known so badly.
 */
export function zoneHalf(stud: Pick<StudPlace, 'widthMm' | 'uncertaintyMm'>, diameterMm: number, diameters: number = edgeDiameters): number {
  return stud.widthMm / 2 - diameters * diameterMm - stud.uncertaintyMm;
}

/** How a screw of nominal diameter (mm) at x meets the studs: the one with the greatest margin, or null on a wall without studs. */
export function meetStud(xMm: number, diameterMm: number, studs: readonly StudPlace[]): StudMeeting | null {
  let best: StudMeeting | null = null;
  for (const stud of studs) {
    const aside = Math.abs(xMm - stud.xMm);
    const half = zoneHalf(stud, diameterMm);
    const marginMm = half - aside;
    if (best && marginMm <= best.marginMm) continue;
    // The last billionth of a millimetre is the computer's, not the wall's.
    const inStud = half >= 0 && marginMm >= -1e-6;
    best = { studId: stud.id, inStud, nearEdge: inStud && aside > zoneHalf(stud, diameterMm, advisedEdgeDiameters) + 1e-6, marginMm };
  }
  return best;
}
