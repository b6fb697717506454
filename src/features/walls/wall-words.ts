import type { Progress } from '../../../shared/walls/photo.ts';
import type { obstructionKinds, waysFound, Zone } from '../../../shared/walls/wall.ts';
import type { Way } from './photo-draft.ts';

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
