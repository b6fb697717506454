import { formatAngle } from '../../units/angle.ts';
import { nameOf } from '../placed-frame.ts';
import type { BodyRule } from '../rule.ts';

export const outOfLevel: BodyRule = {
  id: 'out of level',
  of: 'body',
  title: 'Hangs out of level, or not at all',
  source: 'Statics: one hanger holds no moment, so what hangs on it turns until its centre of mass is below it',
  check({ id, frames, hanging, body }) {
    const who = frames.length === 1 ? nameOf(frames[0]!) : `The group ${frames[0]!.frame.hungGroup}`;
    const words = {
      held: null,
      turns: `${who} hangs on one point and turns by ${formatAngle(Math.abs(hanging.outOfLevelRad))} until its middle is below it. Move the hanger, or give it two.`,
      unstable: `${who} hangs on one point below its middle: it will tip over. Give it a hanger above.`,
      tips: `${who} has no hanger above the edge it leans on: it tips off the wall.`,
      'not held': `${who} has no hanger.`,
    }[hanging.state];
    if (!words) return [];
    return [{
      about: id,
      weight: hanging.state === 'turns' ? ('caution' as const) : ('stop' as const),
      words,
      frameIds: frames.map((f) => f.frame.id),
      figures: [{
        label: 'Out of level', value: hanging.outOfLevelRad, unit: 'rad' as const, formula: 'angle between plumb and the line from hanger to centre of mass', source: 'Statics',
        inputs: [
          { label: 'Centre of mass, x', value: body.centre.x, unit: 'mm' as const }, { label: 'Centre of mass, y', value: body.centre.y, unit: 'mm' as const },
          ...body.hangers.flatMap((h) => [{ label: 'Hanger, x', value: h.x, unit: 'mm' as const }, { label: 'Hanger, y', value: h.y, unit: 'mm' as const }]),
        ],
      }],
    }];
  },
};
