import type { Species } from '../../../shared/patterns/pattern.ts';

/** Fill of a species' planed face. Written out in full, since the style sheet is made from the names found here. */
export const speciesFill: Record<Species, string> = {
  'white ash': 'fill-wood-white-ash',
  beech: 'fill-wood-beech',
  'yellow birch': 'fill-wood-yellow-birch',
  cherry: 'fill-wood-cherry',
  'hard maple': 'fill-wood-hard-maple',
  'red maple': 'fill-wood-red-maple',
  'red oak': 'fill-wood-red-oak',
  'white oak': 'fill-wood-white-oak',
  walnut: 'fill-wood-walnut',
  'yellow-poplar': 'fill-wood-yellow-poplar',
};
