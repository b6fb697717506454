import { formatLength } from '../units/length.ts';
import { hardwareCounts, type Datums, type longestSpan } from './hang-order.ts';
import { signature } from './sheet-title.ts';
import type { TemplateInput } from './template-input.ts';

export interface Words {
  heading: string;
  paragraphs: string[];
  numbered: boolean;
  warns?: boolean;
}

/** A bar more than 0.2 % off makes 2 mm in a metre: common practice for paper templates. */
export function proveScale(units: 'in' | 'mm', span: ReturnType<typeof longestSpan>): Words {
  const limit = units === 'mm' ? '0.3 mm in 150 mm' : '1/64" in 8"';
  return {
    heading: 'Prove the scale first',
    numbered: true,
    paragraphs: [
      'Print at 100 %, or “actual size”. Switch off fit-to-page, shrinking and borderless printing.',
      `Lay a steel rule on both bars of this page, and of one sheet from the middle of the pile. A bar more than 0.2 % off (${limit}) means: do not use the print.`,
      'Then write here what you measured: across ____________ up ____________ and enter both where the template is made; the next print is corrected for this printer.',
      ...(span ? [`When all is taped, check the whole with a tape: from screw ${span.from.label} to screw ${span.to.label} must be ${formatLength(span.mm, units)} in a straight line.`] : []),
    ],
  };
}

export function tapeUp(datums: Datums, { units, join, kind }: Pick<TemplateInput, 'units' | 'join' | 'kind'>): Words {
  if (kind === 'story stick') return holdStick(datums, units);
  const lay = join === 'butt' ? 'Cut each sheet along all its lines. Set the cut edges against one another, so that ticks and outlines meet; tape.' : 'Cut each sheet along its left and bottom lines. Lay the cut edge on the dashed line of the sheet it names, so that ticks and outlines meet; tape.';
  return {
    heading: 'Tape up and hang',
    numbered: true,
    paragraphs: [
      `${lay} Let paper lie in the room for an hour first: it grows and shrinks with damp.`,
      `Mark the level datum ${formatLength(datums.levelMm, units)} above the floor and the plumb datum ${formatLength(datums.plumbMm, units)} from the wall’s left edge. Carry both with a level or a laser: floors and corners are seldom true.`,
      'Tape the template to the wall on both datums. A sheet that stands alone is set by the distances on its cut edges.',
      'Prick every cross-hair through the paper, take the paper down, and hang from the bottom up in the order of the next page.',
    ],
  };
}

function holdStick(datums: Datums, units: 'in' | 'mm'): Words {
  return {
    heading: 'Make the stick and hang',
    numbered: true,
    paragraphs: [
      'Cut the strips out along their lines, join them from S1 upwards, and tape them to a straight batten. Let paper lie in the room for an hour first: it grows and shrinks with damp.',
      `Mark the level datum ${formatLength(datums.levelMm, units)} above the floor right across the wall, with a level or a laser: floors are seldom true.`,
      'Mark each screw’s distance from the left edge, as the next page lists it. Stand the stick plumb at each mark with its level datum on yours, and carry the height over.',
      'The stick gives heights alone. Check one frame with its own hangers before drilling the rest.',
    ],
  };
}

/** What is usually said before holes are drilled in a wall; shops add what their place asks for. */
export function cautions(input: TemplateInput): Words {
  const open = input.wall.studs.filter((s) => !s.confirmed).length;
  const state = signature(input.title);
  return {
    heading: 'Before you drill',
    numbered: false,
    warns: true,
    paragraphs: [
      ...(state.signed ? [] : [`This layout is ${state.words}. Do not drill from it until it is signed.`]),
      ...(open > 0 ? [`${open} ${open === 1 ? 'stud is' : 'studs are'} marked “?”: not confirmed. Find both edges of each and probe before trusting a screw to it.`] : []),
      'Cables and pipes hide behind the wall: above, below and beside switches and outlets, near corners, ceilings, taps and radiators. Confirm with a detector, and switch the circuit off before drilling near one. If in doubt, stop and ask a licensed electrician or plumber.',
      'No deeper than the covering and the screw need. Wear eye protection; keep drilling dust down. Paint in houses built before 1978 may hold lead: follow the local rules.',
      'Ladder: on firm ground, three points of contact, do not reach past its rails; have a second person for any frame you cannot hold in one hand.',
      'Glass and mirrors: gloves, edges protected, two people for large ones. Never hang glass by the glass.',
      'Screws and anchors carry what their makers state in this wall, not more. Makers’ instructions, local codes and licensed practice come before anything on this paper.',
      'The paper places the screws. It cannot see what is in the wall.',
    ],
  };
}

const kindsShown = 24;

/** What hangs it all, counted; the tools that the template itself asks for. */
export function toBring(input: TemplateInput): Words {
  const counts = hardwareCounts(input.frames);
  const more = counts.length - kindsShown;
  return {
    heading: 'To bring',
    numbered: false,
    paragraphs: [
      ...counts.slice(0, kindsShown).map(({ hardware, count }) => `${count} × ${hardware}`),
      ...(more > 0 ? [`and ${more} more ${more === 1 ? 'kind' : 'kinds'}: see the hang order`] : []),
      'Steel rule, tape, level or laser, stud and cable detector, awl, masking tape, scissors or knife with straight-edge, drill and the bits of the hang order.',
    ],
  };
}
