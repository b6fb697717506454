import { studSpecies } from '../../../shared/hardware/stud-species.ts';
import type { Progress } from '../../../shared/walls/photo.ts';
import type { constructions, obstructionKinds, WallShape, waysFound, Zone } from '../../../shared/walls/wall.ts';
import type { Way } from './photo-draft.ts';

export const constructionWords: Record<(typeof constructions)[number], string> = {
  'wood studs': 'Wood studs',
  'steel studs': 'Steel studs',
  'plaster on lath': 'Plaster on lath',
  masonry: 'Masonry',
  'solid wood': 'Solid wood',
};

/** Whether screws can hold in this wall's wood, so that its species counts. */
export const holdsInWood = (construction: WallShape['construction']): boolean => construction === 'wood studs' || construction === 'plaster on lath' || construction === 'solid wood';

export const studSpeciesOptions = Object.entries(studSpecies).map(([value, gravity]) => ({ value, words: `${value.charAt(0).toUpperCase()}${value.slice(1)} (${gravity.toFixed(2)})` }));

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

export const zoneWords: Record<Zone['kind'], string> = { passage: 'People walk by', seat: 'A seat', bed: 'A bed' };

export const wayWords: Record<Way, string> = {
  points: 'Four or more measured points',
  rectangle: 'A rectangle, such as a door, and one length',
  lines: 'Plumb and level lines, and two lengths',
};

export const progressWords: Record<Progress['state'], string> = {
  idle: 'Straightening the photo', waiting: 'Waiting for its turn', fitting: 'Fitting the camera', reading: 'Reading the photo', drawing: 'Drawing the wall', writing: 'Writing the picture',
};

export const optionsOf = <Value extends string>(words: Record<Value, string>) =>
  (Object.entries(words) as [Value, string][]).map(([value, text]) => ({ value, words: text }));
