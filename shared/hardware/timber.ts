import type { Figure, FigureInput } from '../units/figure.ts';

/** Species of the timber table. */
export const speciesIds = ['white ash', 'beech', 'yellow birch', 'cherry', 'hard maple', 'red maple', 'red oak', 'white oak', 'walnut', 'yellow-poplar'] as const;
export type SpeciesId = (typeof speciesIds)[number];

/** Published values of one species. */
export interface Timber {
  name: string;
  /** Oven-dry mass over volume at 12 % moisture. */
  specificGravity12: number;
  /** Oven-dry mass over green volume. */
  specificGravityGreen: number;
  /** Shrinkage green to oven-dry, %: radial, tangential. */
  shrinkageRadial: number;
  shrinkageTangential: number;
  /** Change coefficients for 6 to 14 % moisture, per %: radial, tangential. */
  changeRadial: number;
  changeTangential: number;
  sources: { gravity: string; shrinkage: string; change: string };
}

const handbook = 'USDA Forest Products Laboratory, Wood Handbook (GTR-190)';
const gravityChecked = `${handbook}, table 5-3, from memory; the 12 % value checked against a copy of the same data`;
const gravityFromMemory = `${handbook}, table 5-3, from memory`;
const shrinkageRead = `${handbook}, table 4-3`;
const shrinkageFromMemory = `${handbook}, table 4-3, from memory; agrees with table 13-5`;
const changeRead = `${handbook}, table 13-5`;

function timber(name: string, gravity: [green: number, at12: number], shrinkage: [radial: number, tangential: number], change: [radial: number, tangential: number], sources: Partial<Timber['sources']> = {}): Timber {
  return {
    name,
    specificGravityGreen: gravity[0],
    specificGravity12: gravity[1],
    shrinkageRadial: shrinkage[0],
    shrinkageTangential: shrinkage[1],
    changeRadial: change[0],
    changeTangential: change[1],
    sources: { gravity: gravityChecked, shrinkage: shrinkageRead, change: changeRead, ...sources },
  };
}

/** Values at hand for every species of the table, with where each was taken from. */
export const timbers: Record<SpeciesId, Timber> = {
  'white ash': timber('White ash', [0.55, 0.6], [4.9, 7.8], [0.00169, 0.00274]),
  beech: timber('American beech', [0.56, 0.64], [5.5, 11.9], [0.0019, 0.00431]),
  'yellow birch': timber('Yellow birch', [0.55, 0.62], [7.3, 9.5], [0.00256, 0.00338]),
  cherry: timber('Black cherry', [0.47, 0.5], [3.7, 7.1], [0.00126, 0.00248]),
  'hard maple': timber('Hard (sugar) maple', [0.56, 0.63], [4.8, 9.9], [0.00165, 0.00353], { shrinkage: shrinkageFromMemory }),
  'red maple': timber('Red maple', [0.49, 0.54], [4.0, 8.2], [0.00137, 0.00289], { gravity: gravityFromMemory, shrinkage: shrinkageFromMemory }),
  'red oak': timber('Northern red oak', [0.56, 0.63], [4.0, 8.6], [0.00158, 0.00369], { shrinkage: `${handbook}, table 4-3, from memory`, change: `${changeRead}, group “red oak, commercial”` }),
  'white oak': timber('White oak', [0.6, 0.68], [5.6, 10.5], [0.0018, 0.00365], { change: `${changeRead}, group “white oak, commercial”` }),
  walnut: timber('Black walnut', [0.51, 0.55], [5.5, 7.8], [0.0019, 0.00274], { gravity: gravityFromMemory }),
  'yellow-poplar': timber('Yellow-poplar', [0.4, 0.42], [4.6, 8.2], [0.00158, 0.00289], { gravity: gravityFromMemory, change: `${changeRead}, from memory; agrees with table 4-3` }),
};

/** The row of a species; throws a RangeError that names it when the table has none. */
export function timberOf(species: string): Timber {
  const row = Object.hasOwn(timbers, species) ? timbers[species as SpeciesId] : undefined;
  if (!row) throw new RangeError(`species: “${species}” is not in the timber table.`);
  return row;
}

const fibreSaturation = 30;
const relation = `${handbook}, chapter 4 (density from specific gravity and moisture), from memory`;

/**
 * Specific gravity with volume at a moisture content, %: G_M = G_b / (1 − 0.265 (1 − M/30) G_b) below 30 %, G_b from there on.
 * G_b is taken back from the table's value at 12 %, so that seasoned wood meets the table exactly; M = 0 gives the oven-dry value.
 * Source: Wood Handbook, chapter 4, from memory.
 */
export function specificGravityAt(species: string, moisturePercent: number): number {
  const { specificGravity12 } = timberOf(species);
  const basic = specificGravity12 / (1 + 0.265 * (1 - 12 / fibreSaturation) * specificGravity12);
  if (moisturePercent >= fibreSaturation) return basic;
  return basic / (1 - 0.265 * (1 - moisturePercent / fibreSaturation) * basic);
}

/** Density of wood with its water, kg/m³, at a moisture content in %: ρ = 1000 G_M (1 + M/100). Source: Wood Handbook, chapter 4, from memory. */
export function densityOf(species: string, moisturePercent: number): number {
  if (!(moisturePercent >= 0 && moisturePercent <= 200)) throw new RangeError(`moisture content: ${moisturePercent} % is not possible in wood.`);
  return 1000 * specificGravityAt(species, moisturePercent) * (1 + moisturePercent / 100);
}

/** The density with its inputs, formula and source. */
export function densityFigure(species: string, moisturePercent: number): Figure {
  const row = timberOf(species);
  const inputs: FigureInput[] = [
    { label: `Specific gravity of ${row.name.toLowerCase()} at 12 %`, value: row.specificGravity12, unit: '', note: row.sources.gravity },
    { label: 'Moisture content', value: moisturePercent, unit: '%' },
    { label: 'Specific gravity at this moisture', value: specificGravityAt(species, moisturePercent), unit: '' },
  ];
  return { label: `Density of ${row.name.toLowerCase()}`, value: densityOf(species, moisturePercent), unit: 'kg/m³', inputs, formula: 'ρ = 1000 × G × (1 + M/100)', source: relation };
}

/** Specific gravities assigned for connections, oven-dry weight and volume; species without a row have none. */
const assigned: Partial<Record<SpeciesId, [value: number, row: string]>> = {
  beech: [0.71, 'Beech-birch-hickory'],
  'yellow birch': [0.71, 'Beech-birch-hickory'],
  'red maple': [0.58, 'Red maple'],
  'red oak': [0.67, 'Red oak'],
  'white oak': [0.73, 'White oak'],
  'yellow-poplar': [0.43, 'Yellow poplar'],
};

/**
 * The G that screws in this species are reckoned with: as assigned by the NDS where its table has the species (table 12.3.3A of NDS-2018,
 * read in a secondary copy), else the Wood Handbook's value brought to oven-dry volume.
 */
export function connectionGravity(species: string): { value: number; source: string } {
  const row = timberOf(species);
  const nds = assigned[species as SpeciesId];
  if (nds) return { value: nds[0], source: `AWC NDS-2018, table 12.3.3A, ${nds[1]}` };
  return { value: specificGravityAt(species, 0), source: `${row.sources.gravity}; brought to oven-dry volume` };
}
