import { formatLength } from '../../units/length.ts';
import type { AssessedBody, HungHanger } from '../hung-body.ts';
import { hasStuds } from '../hung-body.ts';
import { nameOf } from '../placed-frame.ts';
import type { BodyRule } from '../rule.ts';

const zone = 'in a stud where |x − stud| ≤ b/2 − 1.5 D − the stud’s own uncertainty';
const edgeSource = 'NDS-2018, table 12.5.1C (edge distance 1.5 D for load along the grain)';

const each = (body: AssessedBody, when: (h: HungHanger) => boolean) => body.hangers.filter(when);

export const notInStud: BodyRule = {
  id: 'not in a stud',
  of: 'body',
  title: 'Hanger not in a stud: an anchor is needed',
  source: edgeSource,
  check(body, around) {
    if (!hasStuds(around)) return [];
    return each(body, (h) => !h.meeting?.inStud).map((h) => ({
      about: h.key,
      weight: 'caution' as const,
      words: h.meeting
        ? `A hanger of ${nameOf(h.frame)} misses the nearest stud by ${formatLength(-h.meeting.marginMm, around.limits.units)}. Slide it, seek studs, or choose a rated anchor.`
        : `No stud of this wall is known yet, so the hanger of ${nameOf(h.frame)} counts as held by an anchor alone.`,
      frameIds: [h.frame.frame.id],
      hangerIds: [h.key],
      figures: h.meeting ? [{ label: 'Margin to the nearest stud', value: h.meeting.marginMm, unit: 'mm' as const, inputs: [{ label: 'x of the screw', value: h.x, unit: 'mm' as const }], formula: zone, source: edgeSource }] : [],
    }));
  },
};

export const nearStudEdge: BodyRule = {
  id: 'near a stud edge',
  of: 'body',
  title: 'Screw near the edge of its stud',
  source: 'NDS commentary, table C12.1.5.7 (2.5 D advised), from memory',
  check: (body, { limits }) =>
    each(body, (h) => h.meeting?.nearEdge === true).map((h) => ({
      about: h.key,
      weight: 'caution' as const,
      words: `A screw of ${nameOf(h.frame)} is in its stud by ${formatLength(h.meeting!.marginMm, limits.units)}, nearer to the edge than 2.5 times its diameter. Drill a lead hole, or slide it inwards.`,
      frameIds: [h.frame.frame.id],
      hangerIds: [h.key],
      figures: [{ label: 'Margin', value: h.meeting!.marginMm, unit: 'mm' as const, inputs: [{ label: 'x of the screw', value: h.x, unit: 'mm' as const }], formula: zone, source: edgeSource }],
    })),
};

export const studUnconfirmed: BodyRule = {
  id: 'stud unconfirmed',
  of: 'body',
  title: 'Stud not confirmed',
  source: 'Common practice: a finder can miss or mislead; a probe, a magnet or the eye confirms',
  check(body, { wall }) {
    return each(body, (h) => {
      const stud = h.meeting?.inStud ? wall.studs.find((s) => s.id === h.meeting!.studId) : undefined;
      return stud !== undefined && (stud.foundBy === 'finder' || stud.foundBy === 'spacing');
    }).map((h) => ({
      about: h.key,
      weight: 'caution' as const,
      words: `A hanger of ${nameOf(h.frame)} counts on a stud that only ${wall.studs.find((s) => s.id === h.meeting!.studId)!.foundBy === 'spacing' ? 'the spacing promises' : 'a finder has shown'}. Probe it before hang day.`,
      frameIds: [h.frame.frame.id],
      hangerIds: [h.key],
    }));
  },
};
