import { findingsOf } from '../../shared/findings/ledger.ts';
import { assessBody } from '../../shared/findings/hung-body.ts';
import { placeFrame } from '../../shared/findings/placed-frame.ts';
import { usualLimits } from '../../shared/findings/scene.ts';
import type { HardwareBook } from '../../shared/hardware/hardware-book.ts';
import { leadHole } from '../../shared/hardware/lead-hole.ts';
import { studSpecies, type StudSpecies } from '../../shared/hardware/stud-species.ts';
import type { PatternDesign } from '../../shared/patterns/pattern.ts';
import type { TemplateInput } from '../../shared/templates/template-input.ts';
import type { Content } from '../layouts/layouts.service.ts';

/** Frames with outline and screws in wall coordinates; a screw is named by its frame's label and a small letter. */
export function templateFrames({ frames, patterns, wall }: Content, book: HardwareBook): TemplateInput['frames'] {
  const byId = new Map(patterns.map((p) => [p.id, p]));
  return frames.flatMap((frame) => {
    const pattern = byId.get(frame.patternId);
    if (!pattern) return [];
    const placed = placeFrame(frame, pattern);
    const { hangers } = assessBody(frame.id, [placed], { wall, book, limits: usualLimits });
    return [{
      id: frame.id,
      label: frame.label,
      outlineMm: placed.outline,
      hangers: hangers.map(({ hanger, x, y, meeting }, i) => ({
        id: hanger.id, label: `${frame.label}${String.fromCharCode(97 + (i % 26))}`, x, y, ...fastener(hanger, meeting?.inStud === true || wall.construction === 'solid wood' ? wall.studSpecies : null, book),
      })),
    }];
  });
}

/** What the ledger says of the layout, the heaviest first, as many as a few pages hold. */
export function openFindings(content: Content, book: HardwareBook, units: 'in' | 'mm', changedSinceSigned: boolean): TemplateInput['findings'] {
  const { wall, sheet, frames, patterns } = content;
  const found = findingsOf({ wall, sheet, frames, patterns, book, limits: { ...usualLimits, units }, changedSinceSigned });
  return found.slice(0, 200).map(({ weight, words }) => ({ weight, words: words.slice(0, 1000) }));
}

/** What is drilled and driven for one hanger: its screw in wood of a species, else its anchor, whose hole its packet states. */
function fastener(hanger: PatternDesign['hangers'][number], wood: StudSpecies | null, book: HardwareBook): { drillMm: number | null; hardware: string } {
  const bracket = book.brackets.find((b) => b.id === hanger.bracketId)?.name ?? 'bracket not chosen';
  const screw = book.screws.find((s) => s.id === hanger.wallScrewId);
  const anchor = book.anchors.find((a) => a.id === hanger.anchorId);
  if (wood) return { drillMm: screw ? leadHole(screw, studSpecies[wood]) : null, hardware: `${bracket}; ${screw?.name ?? 'screw not chosen'}` };
  return { drillMm: null, hardware: `${bracket}; ${anchor ? `${anchor.name}, hole as its packet says` : 'anchor not chosen'}` };
}
