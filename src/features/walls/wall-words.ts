import type { constructions, obstructionKinds, waysFound } from '../../../shared/walls/wall.ts';

export const constructionWords: Record<(typeof constructions)[number], string> = {
  'wood studs': 'Wood studs',
  'steel studs': 'Steel studs',
  'plaster on lath': 'Plaster on lath',
  masonry: 'Masonry',
  'solid wood': 'Solid wood',
};

export const foundByWords: Record<(typeof waysFound)[number], string> = {
  spacing: 'By spacing only',
  finder: 'Stud finder',
  probe: 'Probed',
  magnet: 'Magnet on screws',
  seen: 'Seen',
};

export const obstructionWords: Record<(typeof obstructionKinds)[number], string> = {
  opening: 'Door or window', switch: 'Switch', outlet: 'Outlet', thermostat: 'Thermostat', vent: 'Vent',
  radiator: 'Radiator', trim: 'Trim', furniture: 'Furniture', pipe: 'Pipe', cable: 'Cable',
};

export const optionsOf = <Value extends string>(words: Record<Value, string>) =>
  (Object.entries(words) as [Value, string][]).map(([value, text]) => ({ value, words: text }));
