import { z } from 'zod';
import { id } from '../api/endpoint.ts';
import { speciesIds } from '../hardware/timber.ts';
import { membersOf } from './members.ts';
import { outlineOf, ShapeError } from './outline.ts';
import { Shape } from './shape.ts';

export { Shape } from './shape.ts';
export { speciesIds };
export const Species = z.enum(speciesIds, { error: 'This species is not in the timber table.' });
export type Species = z.infer<typeof Species>;

/** A finite number that says its own name when it is none. */
const measure = (name: string) => z.number({ error: `${name} must be a number.` });

/** One hanger of a frame: where its wall screw meets the wall, told along a member. */
export const Hanger = z.object({
  id: z.string().min(1).max(40),
  /** Member by number, 0 first, counter-clockwise from the pattern's lowest side. */
  member: z.number().int().min(0).max(11),
  /** Along the member from the middle of its outer side, mm, counter-clockwise positive. */
  alongMm: measure('The place along the member').min(-3000).max(3000),
  /** In from the outer face, square to it, mm. */
  insetMm: measure('The inset from the outer face').min(0, 'The inset cannot be less than zero.').max(500),
  /** How far it may slide along the member either way, mm: [lowest, highest] offset. */
  allowanceMm: z.tuple([
    measure('The lower allowance').max(0, 'The lower allowance is zero or less.'),
    measure('The upper allowance').min(0, 'The upper allowance is zero or more.'),
  ]),
  bracketId: id.nullable(),
  /** Screw into a stud. */
  wallScrewId: id.nullable(),
  /** Anchor where there is no stud. */
  anchorId: id.nullable().default(null),
});
export type Hanger = z.infer<typeof Hanger>;

export const Groove = z.object({
  /** From the inner face outwards, mm. */
  widthMm: measure('The width of the groove').positive('The width of the groove must be more than zero.').max(100),
  /** From the back edge, mm. */
  depthMm: measure('The depth of the groove').positive('The depth of the groove must be more than zero.').max(100),
  /** Play left all round the panel, mm. */
  clearanceMm: measure('The clearance').min(0, 'The clearance cannot be less than zero.').max(10, 'The clearance is at most 10 mm.'),
  mirrorMm: measure('The thickness of the mirror').min(0, 'A mirror cannot be thinner than nothing.').max(20),
  backerMm: measure('The thickness of the backer').min(0, 'A backer cannot be thinner than nothing.').max(30),
});
export type Groove = z.infer<typeof Groove>;

const designFields = z.object({
  shape: Shape,
  thicknessMm: measure('The thickness of the members').min(3, 'Members are at least 3 mm thick.').max(100, 'Members are at most 100 mm thick.'),
  /** Off the wall, mm. */
  depthMm: measure('The depth').min(10, 'A frame is at least 10 mm deep.').max(600, 'A frame is at most 600 mm deep.'),
  species: Species,
  moisturePercent: measure('The moisture content').min(4, 'Wood indoors holds at least 4 % of water.').max(25, 'Wood above 25 % is too wet to work.').default(8),
  groove: Groove.nullable().default(null),
  hangers: z.array(Hanger).max(12),
  /** What a frame of this pattern is to carry, kg; null takes the default rule. */
  contentsKg: measure('What the frame carries').min(0, 'A frame cannot carry less than nothing.').max(500, 'No frame here carries more than 500 kg.').nullable().default(null),
});

/** A frame design, as the pattern book keeps it and a signed revision freezes it. Refuses what cannot be made a ring at all. */
export const PatternDesign = designFields.superRefine((design, context) => {
  for (const { path, words } of flawsOf(design)) context.addIssue({ code: 'custom', path, message: words });
});
export type PatternDesign = z.infer<typeof PatternDesign>;

interface Flaw {
  path: (string | number)[];
  words: string;
}

/** What no ring of members can be made of, whatever the wood. What can be made but should not be is for the findings to say. */
function flawsOf(design: z.infer<typeof designFields>): Flaw[] {
  const outline = outlineOrFlaw(design.shape);
  if (!Array.isArray(outline)) return [outline];
  const members = membersOf(outline, design.thicknessMm);
  const flaws: Flaw[] = [];
  const swallowed = members.find(({ shortPointMm }) => shortPointMm <= 0);
  if (swallowed) flaws.push({ path: ['thicknessMm'], words: `At this thickness member ${swallowed.index + 1} has no inner face left: take thinner members or longer sides.` });
  return [...flaws, ...grooveFlaws(design), ...hangerFlaws(design.hangers, members.map(({ longPointMm }) => longPointMm))];
}

function outlineOrFlaw(shape: Shape): ReturnType<typeof outlineOf> | Flaw {
  try {
    return outlineOf(shape);
  } catch (error) {
    if (!(error instanceof ShapeError)) throw error;
    return { path: ['shape', ...error.path], words: error.message };
  }
}

function grooveFlaws({ groove, thicknessMm, depthMm }: Pick<z.infer<typeof designFields>, 'groove' | 'thicknessMm' | 'depthMm'>): Flaw[] {
  if (!groove) return [];
  const flaws: Flaw[] = [];
  if (groove.widthMm >= thicknessMm) flaws.push({ path: ['groove', 'widthMm'], words: 'A groove as wide as the member is thick cuts it through.' });
  if (groove.depthMm >= depthMm) flaws.push({ path: ['groove', 'depthMm'], words: 'A groove as deep as the frame cuts it through.' });
  if (groove.clearanceMm >= groove.widthMm) flaws.push({ path: ['groove', 'clearanceMm'], words: 'A clearance as large as the groove is wide leaves the panel nothing to rest on.' });
  return flaws;
}

function hangerFlaws(hangers: Hanger[], longPointsMm: number[]): Flaw[] {
  return hangers.flatMap((hanger, i): Flaw[] => {
    const length = longPointsMm[hanger.member];
    if (hangers.findIndex((other) => other.id === hanger.id) < i) return [{ path: ['hangers', i, 'id'], words: 'Two hangers bear the same name.' }];
    if (length === undefined) return [{ path: ['hangers', i, 'member'], words: `This frame has no member ${hanger.member + 1}.` }];
    if (Math.abs(hanger.alongMm) > length / 2) return [{ path: ['hangers', i, 'alongMm'], words: 'This place lies beyond the end of the member.' }];
    return [];
  });
}

export const Pattern = z.object({ id, name: z.string(), design: PatternDesign, version: z.number().int(), archived: z.boolean() });
export type Pattern = z.infer<typeof Pattern>;
