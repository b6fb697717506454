import { z } from 'zod';

/**
 * Specific gravity that NDS-2018 table 12.3.3A assigns to species groups of framing lumber (oven-dry weight over oven-dry volume).
 * Groups met in stud walls; hardwoods follow below.
 */
export const studSpecies = {
  'spruce-pine-fir': 0.42,
  'spruce-pine-fir (south)': 0.36,
  'hem-fir': 0.43,
  'hem-fir (north)': 0.46,
  'douglas fir-larch': 0.5,
  'douglas fir-larch (north)': 0.49,
  'douglas fir-south': 0.46,
  'southern pine': 0.55,
  'mixed southern pine': 0.51,
  'eastern softwoods': 0.36,
  'western woods': 0.36,
  'northern species': 0.35,
  'western cedars': 0.36,
  redwood: 0.37,
  aspen: 0.39,
} as const;
export type StudSpecies = keyof typeof studSpecies;
export const StudSpecies = z.enum(Object.keys(studSpecies) as [StudSpecies, ...StudSpecies[]], { error: 'This species group is not in the table.' });

/** Group taken unless the shop says otherwise; 0.36 (western woods, spruce-pine-fir south) is the more cautious choice. */
export const usualStudSpecies: StudSpecies = 'spruce-pine-fir';

/** Hardwood groups of the same table, for blocking or solid-wood walls made of them. */
export const hardwoodGroups = {
  'yellow poplar': 0.43,
  'red oak': 0.67,
  'northern red oak': 0.68,
  'mixed oak': 0.68,
  'white oak': 0.73,
  'red maple': 0.58,
  'mixed maple': 0.55,
  'beech-birch-hickory': 0.71,
} as const;
export type HardwoodGroup = keyof typeof hardwoodGroups;
