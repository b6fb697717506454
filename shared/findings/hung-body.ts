import { checkHanger, type FrameFixing, type HangerCheck, type HangerFixing, type WallFixing } from '../hanging/capacity.ts';
import { hang, joinBodies, type Hanging, type HungBody } from '../hanging/statics.ts';
import { meetStud, type StudMeeting } from '../hanging/stud-zones.ts';
import { loadDuration } from '../hardware/load-duration.ts';
import { studSpecies } from '../hardware/stud-species.ts';
import { connectionGravity } from '../hardware/timber.ts';
import { placedInclination } from '../patterns/hangers.ts';
import { membersOfDesign } from '../patterns/members.ts';
import type { Hanger } from '../patterns/pattern.ts';
import { hangerKey, type PlacedFrame } from './placed-frame.ts';
import type { Surroundings } from './scene.ts';

/** One hanger of a body with its load, what holds it, and how it meets the studs. */
export interface HungHanger {
  key: string;
  frame: PlacedFrame;
  hanger: Hanger;
  x: number;
  y: number;
  /** null where the wall has no studs to meet. */
  meeting: StudMeeting | null;
  fixing: HangerFixing;
  check: HangerCheck;
}

/** What hangs as one: a frame, or frames screwed to one another. */
export interface AssessedBody {
  id: string;
  frames: readonly PlacedFrame[];
  body: HungBody;
  hanging: Hanging;
  hangers: HungHanger[];
}

/** A #10 wood screw, until one is chosen (common practice). */
export const usualDiameterMm = 4.826;

/** Whether a screw can find wood behind the covering at the studs. */
export const hasWoodStuds = ({ wall }: Surroundings): boolean => wall.construction === 'wood studs' || wall.construction === 'plaster on lath';
export const hasStuds = (around: Surroundings): boolean => hasWoodStuds(around) || around.wall.construction === 'steel studs';

/** Loads and capacities of one hanging body. */
export function assessBody(id: string, frames: readonly PlacedFrame[], around: Surroundings): AssessedBody {
  const body = joinBodies(frames.map(bodyOf));
  const hanging = hang(body);
  const loads = new Map(hanging.hangers.map((load) => [load.id, load]));
  const hangers = frames.flatMap((frame) =>
    frame.hangers.map((at, i): HungHanger => {
      const hanger = frame.pattern.design.hangers[i]!;
      const key = hangerKey(frame.frame, hanger);
      const screw = around.book.screws.find((s) => s.id === hanger.wallScrewId);
      const meeting = hasStuds(around) ? meetStud(at.x, screw?.diameterMm ?? usualDiameterMm, around.wall.studs) : null;
      const fixing = fixingOf(frame, hanger, meeting, around);
      return { key, frame, hanger, x: at.x, y: at.y, meeting, fixing, check: checkHanger(loads.get(key)!, fixing) };
    }),
  );
  return { id, frames, body, hanging, hangers };
}

function bodyOf({ frame, outline, hangers, mass, contents, centre }: PlacedFrame): HungBody {
  return {
    massKg: mass.kg + contents.kg,
    centre,
    bearingYMm: Math.min(...outline.map((p) => p.y)),
    hangers: hangers.map((h) => ({ id: hangerKey(frame, h), x: h.x, y: h.y })),
  };
}

/** What holds a hanger where it is: its screw in wood, else its anchor, else nothing. */
function fixingOf(frame: PlacedFrame, hanger: Hanger, meeting: StudMeeting | null, around: Surroundings): HangerFixing {
  const { book } = around;
  const bracket = book.brackets.find((b) => b.id === hanger.bracketId) ?? null;
  return { bracket, wall: wallFixing(hanger, meeting, around), frame: frameFixing(frame, hanger, bracket?.frameScrewId ?? null, around), loadDuration: loadDuration.permanent };
}

function wallFixing(hanger: Hanger, meeting: StudMeeting | null, around: Surroundings): WallFixing {
  const { wall, book } = around;
  const screw = book.screws.find((s) => s.id === hanger.wallScrewId);
  const inWood = wall.construction === 'solid wood' || (hasWoodStuds(around) && meeting?.inStud);
  if (inWood && screw) return { kind: 'wood', screw, gravity: studSpecies[wall.studSpecies], coveringMm: wall.coveringMm, woodMm: null };
  const anchor = inWood ? undefined : book.anchors.find((a) => a.id === hanger.anchorId);
  // An anchor's packet rates it for one kind of wall; in the other it counts for nothing.
  if (anchor && (anchor.kind === 'masonry') === (wall.construction === 'masonry')) return { kind: 'anchor', anchor };
  return { kind: 'none' };
}

function frameFixing({ frame, pattern: { design } }: PlacedFrame, hanger: Hanger, screwId: string | null, { book }: Surroundings): FrameFixing | null {
  const screw = book.screws.find((s) => s.id === screwId);
  if (!screw) return null;
  const lipMm = design.thicknessMm - (design.groove?.widthMm ?? 0);
  const member = membersOfDesign(design)[hanger.member];
  const overGroove = design.groove !== null && hanger.insetMm > lipMm;
  return {
    screw,
    gravity: connectionGravity(design.species).value,
    // Beside the groove the lip is as deep as the frame; over it, only what the groove leaves.
    woodMm: design.depthMm - (overGroove ? design.groove!.depthMm : 0),
    grainRad: member ? placedInclination(frame, member) : null,
  };
}
