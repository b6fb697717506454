import { studSpecies } from '../hardware/stud-species.ts';
import type { constructions, WallShape } from './wall.ts';

/** How a wall's construction is told on a page. */
export const constructionWords: Record<(typeof constructions)[number], string> = {
  'wood studs': 'Wood studs',
  'steel studs': 'Steel studs',
  'plaster on lath': 'Plaster on lath',
  masonry: 'Masonry',
  'solid wood': 'Solid wood',
};

/** Whether screws can hold in this wall's wood, so that its species counts. */
export const holdsInWood = (construction: WallShape['construction']): boolean => construction === 'wood studs' || construction === 'plaster on lath' || construction === 'solid wood';

/** The species groups to choose from, each with its specific gravity. */
export const studSpeciesOptions = Object.entries(studSpecies).map(([value, gravity]) => ({ value, words: `${value.charAt(0).toUpperCase()}${value.slice(1)} (${gravity.toFixed(2)})` }));
