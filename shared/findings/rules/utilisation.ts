import { loadFigures } from '../../hanging/statics-figures.ts';
import { tidyNumber } from '../../units/number-text.ts';
import { nameOf } from '../placed-frame.ts';
import type { BodyRule } from '../rule.ts';

const partWords = { wall: 'into the wall', bracket: 'in the bracket', frame: 'into the frame' } as const;

export const utilisation: BodyRule = {
  id: 'utilisation',
  of: 'body',
  title: 'Hanger overloaded or nearly so',
  source: 'AWC NDS-2018 with the general dowel equations of AWC TR12 for the gap; brackets and anchors by the rating entered',
  check(body) {
    return body.hangers.filter((h) => h.check.verdict !== 'good').map((h) => {
      const link = h.check.links.find((l) => l.part === h.check.worst)!;
      const why = h.check.flags.filter((f) => f.part === h.check.worst && f.id !== 'covering halves lateral' && f.id !== 'may reach a cable').map((f) => f.words);
      const used = Number.isFinite(h.check.utilisation) ? `is used to ${tidyNumber(h.check.utilisation * 100, 0)} %` : 'counts for nothing';
      return {
        about: h.key,
        weight: h.check.verdict === 'stop' ? ('stop' as const) : ('caution' as const),
        words: [`A hanger of ${nameOf(h.frame)} ${used} ${partWords[h.check.worst]}.`, ...why].join(' '),
        frameIds: [h.frame.frame.id],
        hangerIds: [h.key],
        figures: () => [...link.figures, ...loadFigures(body.body, body.hanging, h.key)],
      };
    });
  },
};

export const coveringDecides: BodyRule = {
  id: 'covering decides',
  of: 'body',
  title: 'The covering cuts the screw’s strength by more than half',
  source: 'AWC TR12, general dowel equations with a gap, beside NDS-2018 without',
  check(body) {
    return body.hangers.filter((h) => h.check.worst === 'wall' && h.check.verdict !== 'good').flatMap((h) =>
      h.check.flags.filter((f) => f.id === 'covering halves lateral').map((f) => ({
        about: h.key, weight: 'caution' as const, words: `${nameOf(h.frame)}: ${f.words}`, frameIds: [h.frame.frame.id], hangerIds: [h.key],
      })));
  },
};

export const mayReachCable: BodyRule = {
  id: 'may reach a cable',
  of: 'body',
  title: 'Screw goes deep into the stud',
  source: 'NEC 300.4(D): cables keep 1 1/4 in from the stud’s face; cables fished into finished walls are exempt, so the setback cannot be counted on',
  check: (body) =>
    body.hangers.flatMap((h) =>
      h.check.flags.filter((f) => f.id === 'may reach a cable').map((f) => ({
        about: h.key, weight: 'caution' as const, words: `${nameOf(h.frame)}: ${f.words}`, frameIds: [h.frame.frame.id], hangerIds: [h.key],
      }))),
};
