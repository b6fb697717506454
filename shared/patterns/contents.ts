import type { Placement } from '../geometry/point.ts';
import { KG_PER_POUND, MM_PER_FOOT, STANDARD_GRAVITY } from '../units/constants.ts';
import type { Figure } from '../units/figure.ts';
import { nearLevelRad, placedInclination } from './hangers.ts';
import { membersOfDesign, type Member } from './members.ts';
import type { PatternDesign } from './pattern.ts';

/** 15 lb/ft² in kg/m² (0.72 kPa): the shelf test load of ANSI/KCMA A161.1, section 5.1, read in a secondary page. */
export const shelfLoadKgPerM2 = (15 * KG_PER_POUND) / (MM_PER_FOOT / 1000) ** 2;
/** Never less than this on a frame. */
export const leastContentsKg = 2.5;

/** What a frame is to carry, and who says so: the frame itself, its pattern, or the default rule. */
export interface Contents {
  kg: number;
  from: 'frame' | 'pattern' | 'default';
  figure: Figure;
}

type ContentsForm = Pick<PatternDesign, 'shape' | 'thicknessMm' | 'depthMm' | 'contentsKg'>;

/** Members of a frame as it hangs whose inner faces look up and lie within 35° of level: its floor. */
export function floorMembers(frame: Placement, design: Pick<PatternDesign, 'shape' | 'thicknessMm'>): Pick<Member, 'index' | 'shortPointMm'>[] {
  return membersOfDesign(design).filter((member) => Math.abs(placedInclination(frame, member)) <= nearLevelRad + 1e-9 && member.shortPointMm > 0);
}

/**
 * Contents of a frame as it hangs, kg. What is entered for the frame wins over what is entered for its pattern; else the default: 15 lb/ft²
 * (0.72 kPa) on inner length × depth of the members within 35° of level, and not less than 2.5 kg.
 */
export function contentsOf(design: ContentsForm, frame: Placement & { contentsKg: number | null }): Contents {
  const label = 'Contents';
  const entered = 'As entered by the shop';
  if (frame.contentsKg !== null) return { kg: frame.contentsKg, from: 'frame', figure: { label, value: frame.contentsKg, unit: 'kg', inputs: [], formula: 'entered for this frame', source: entered } };
  if (design.contentsKg !== null) return { kg: design.contentsKg, from: 'pattern', figure: { label, value: design.contentsKg, unit: 'kg', inputs: [], formula: 'entered for this pattern', source: entered } };
  const floors = floorMembers(frame, design);
  const areaMm2 = floors.reduce((sum, { shortPointMm }) => sum + shortPointMm * design.depthMm, 0);
  const byArea = (areaMm2 / 1e6) * shelfLoadKgPerM2;
  const kg = Math.max(leastContentsKg, byArea);
  const figure: Figure = {
    label,
    value: kg,
    unit: 'kg',
    inputs: [
      ...floors.map((member) => ({ label: `Inner length of member ${member.index + 1}`, value: member.shortPointMm, unit: 'mm' as const })),
      { label: 'Depth', value: design.depthMm, unit: 'mm' },
      { label: 'Floor within 35° of level', value: areaMm2, unit: 'mm²' },
      { label: 'Shelf load', value: shelfLoadKgPerM2 * STANDARD_GRAVITY, unit: 'Pa' },
      { label: 'Least contents', value: leastContentsKg, unit: 'kg' },
    ],
    formula: 'the larger of shelf load × floor ÷ g, and the least contents',
    source: 'ANSI/KCMA A161.1, section 5.1 (15 lb/ft² on shelves and bottoms), read in a secondary page; the least value is common practice',
  };
  return { kg, from: 'default', figure };
}
