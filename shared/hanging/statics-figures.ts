import { STANDARD_GRAVITY } from '../units/constants.ts';
import type { Figure } from '../units/figure.ts';
import type { HungBody, Hanging } from './statics.ts';

const elastic = 'Elastic (vector) method for fastener groups, equal stiffness (machine-design textbooks)';

/** How the load of one hanger came about, step by step; empty for a hanger that is not of the body. */
export function loadFigures(body: HungBody, hanging: Hanging, hangerId: string): Figure[] {
  const at = body.hangers.findIndex((h) => h.id === hangerId);
  const hanger = body.hangers[at];
  const load = hanging.hangers[at];
  if (!hanger || !load) return [];
  const n = body.hangers.length;
  const meanX = body.hangers.reduce((a, h) => a + h.x, 0) / n;
  const aside = body.centre.x - meanX;
  const lever = Math.max(0, hanger.y - body.bearingYMm);
  return [
    {
      label: 'Weight', value: hanging.weightN, unit: 'N', formula: 'W = m g', source: 'Standard gravity, 3rd CGPM (1901)',
      inputs: [{ label: 'mass with contents', value: body.massKg, unit: 'kg' }, { label: 'g, m/s²', value: STANDARD_GRAVITY, unit: '' }],
    },
    {
      label: 'Along the wall, V', value: load.shearN, unit: 'N', source: elastic,
      formula: 'W/n down, and of the moment W (x of centre − x of hangers’ middle) a share in proportion to the hanger’s distance from that middle',
      inputs: [
        { label: 'W', value: hanging.weightN, unit: 'N' }, { label: 'hangers', value: n, unit: '' },
        { label: 'centre beside the hangers’ middle', value: aside, unit: 'mm' },
        { label: 'V, rightwards', value: load.shear.x, unit: 'N' }, { label: 'V, upwards', value: load.shear.y, unit: 'N' },
      ],
    },
    {
      label: 'Out of the wall, T', value: load.tensionN, unit: 'N', source: elastic,
      formula: 'T = W z h / Σh², h above the lowest point that leans on the wall',
      inputs: [
        { label: 'W', value: hanging.weightN, unit: 'N' }, { label: 'centre off the wall, z', value: body.centre.z, unit: 'mm' },
        { label: 'h', value: lever, unit: 'mm' },
        { label: 'Σh²', value: body.hangers.reduce((a, h) => a + Math.max(0, h.y - body.bearingYMm) ** 2, 0), unit: 'mm²' },
      ],
    },
    {
      label: 'Together, R', value: load.resultantN, unit: 'N', formula: 'R = √(V² + T²)', source: 'Statics',
      inputs: [
        { label: 'V', value: load.shearN, unit: 'N' }, { label: 'T', value: load.tensionN, unit: 'N' },
        { label: 'angle off the wall', value: load.angleRad, unit: 'rad' },
      ],
    },
  ];
}
