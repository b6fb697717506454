import type { AssessedBody, HungHanger } from '../../../../../shared/findings/hung-body.ts';
import type { Surroundings } from '../../../../../shared/findings/scene.ts';
import type { HangerPart } from '../../../../../shared/hanging/capacity.ts';
import { formatLength } from '../../../../../shared/units/length.ts';
import { tidyNumber } from '../../../../../shared/units/number-text.ts';
import { isConfirmed } from '../../../../../shared/walls/wall.ts';

/** `frame 3`, or `group of frames 1, 2 and 5`. */
export function bodyName({ frames }: Pick<AssessedBody, 'frames'>): string {
  const labels = frames.map(({ frame, pattern }) => frame.label || pattern.name);
  return labels.length === 1 ? `frame ${labels[0]}` : `group of frames ${labels.slice(0, -1).join(', ')} and ${labels.at(-1)}`;
}

/** The small letter that papers know a hanger by: `7a`. */
export function hangerLetter({ frame, hanger }: Pick<HungHanger, 'frame' | 'hanger'>): string {
  const index = frame.pattern.design.hangers.findIndex((h) => h.id === hanger.id);
  return `${frame.frame.label}${String.fromCharCode(97 + (Math.max(0, index) % 26))}`;
}

export function usedWords(utilisation: number): string {
  return Number.isFinite(utilisation) ? `used ${tidyNumber(utilisation * 100, 0)} %` : 'held by nothing';
}

export const linkWords: Record<HangerPart, string> = { wall: 'Into the wall', bracket: 'Bracket', frame: 'Into the frame' };

/** What holds a hanger in the wall, and by which bracket. */
export function holderWords({ hanger, fixing, meeting }: Pick<HungHanger, 'hanger' | 'fixing' | 'meeting'>, { wall, book }: Surroundings, units: 'in' | 'mm'): string {
  const bracket = fixing.bracket ? fixing.bracket.name : 'no bracket chosen';
  const screw = book.screws.find((s) => s.id === hanger.wallScrewId);
  switch (fixing.wall.kind) {
    case 'wood': {
      const stud = meeting?.inStud ? wall.studs.find((s) => s.id === meeting.studId) : undefined;
      const where = stud ? `In the stud at ${formatLength(stud.xMm, units)}${isConfirmed(stud) ? '' : ' (not confirmed)'}` : 'In the wall’s wood';
      return `${where}: ${screw?.name ?? 'screw'}; ${bracket}.`;
    }
    case 'anchor':
      return `By an anchor, in no stud: ${book.anchors.find((a) => a.id === hanger.anchorId)?.name ?? 'anchor'}; ${bracket}.`;
    case 'none':
      return meeting?.inStud ? `In a stud, but no screw is chosen; ${bracket}.` : `In no stud, and no anchor for this wall is chosen; ${bracket}.`;
  }
}
