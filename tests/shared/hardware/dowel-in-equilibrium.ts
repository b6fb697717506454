import type { Highs } from 'highs';
import type { ByMode, YieldJoint } from '../../../shared/hardware/yield-limit.ts';

/*
 * Two other ways to the load of a dowel joint. The screw is a bar across side member, gap and main member; each member presses on it
 * with at most q per mm; the bar takes at most its plastic moment.
 */

/** Load in each mode by statics alone: the place where pressure changes sign is sought until moments balance. */
export function loadByBisection(joint: YieldJoint): ByMode {
  const qs = joint.sideMPa * joint.diameterMm;
  const qm = joint.mainMPa * joint.diameterMm;
  // Plastic modulus of a round bar is D³/6.
  const plastic = (joint.bendingYieldMPa * joint.diameterMm ** 3) / 6;

  /** Moment about the member's face of pressures +q to `turn`, −q beyond it to the end. */
  const turning = (q: number, length: number, turn: number) => (q * turn ** 2) / 2 - (q * (length ** 2 - turn ** 2)) / 2;
  /** A member in which the screw turns: where does pressure change sign when it passes on the load P? */
  const rigid = (q: number, length: number) => ({
    most: q * length,
    moment: (p: number) => turning(q, length, (p / q + length) / 2),
  });
  /** A member in which the screw bends: pressure from the face to the hinge, where shear is nil and the moment is plastic. */
  const hinged = (q: number) => ({ most: Infinity, moment: (p: number) => (q * (p / q) ** 2) / 2 - plastic });

  const balance = (side: ReturnType<typeof rigid>, main: ReturnType<typeof rigid>): number => {
    // Moments of both members about their faces and of the load across the gap add up to nothing.
    const residual = (p: number) => side.moment(p) + main.moment(p) + p * joint.gapMm;
    let low = 0;
    let high = Math.min(side.most, main.most);
    if (high === Infinity) for (high = 1; residual(high) < 0; high *= 2);
    for (let i = 0; i < 200; i++) {
      const middle = (low + high) / 2;
      if (residual(middle) < 0) low = middle;
      else high = middle;
    }
    return (low + high) / 2;
  };
  const s = rigid(qs, joint.sideMm);
  const m = rigid(qm, joint.mainMm);
  const unbounded = (r: ReturnType<typeof rigid>) => ({ ...r, most: Infinity });
  return {
    Im: m.most,
    Is: s.most,
    // The closed forms carry on past a member's own strength, where mode I governs; so does this search.
    II: balance(unbounded(s), unbounded(m)),
    IIIm: balance(hinged(qs), unbounded(m)),
    IIIs: balance(unbounded(s), hinged(qm)),
    IV: balance(hinged(qs), hinged(qm)),
  };
}

/** Largest load for which some pressures within q keep the bar in balance and its moment within the plastic one (lower-bound theorem). */
export function largestLoadByProgram(solver: Highs, joint: YieldJoint, steps: number): number {
  const qs = joint.sideMPa * joint.diameterMm;
  const qm = joint.mainMPa * joint.diameterMm;
  const plastic = (joint.bendingYieldMPa * joint.diameterMm ** 3) / 6;
  const cells = [
    ...Array.from({ length: steps }, (_, i) => ({ at: ((i + 0.5) * joint.sideMm) / steps, most: (qs * joint.sideMm) / steps })),
    ...Array.from({ length: steps }, (_, i) => ({ at: joint.sideMm + joint.gapMm + ((i + 0.5) * joint.mainMm) / steps, most: (qm * joint.mainMm) / steps })),
  ];
  // Loads are scaled by the largest cell so that the solver sees numbers near one. f_i is the push of cell i on the bar, upwards.
  const scale = Math.max(...cells.map((c) => c.most));
  const sum = (terms: { k: number; name: string }[]) => terms.filter((t) => t.k !== 0).map((t) => `${t.k < 0 ? '-' : '+'} ${Math.abs(t.k)} ${t.name}`).join(' ');
  const rows: string[] = [];
  // All pushes of the side member add up to the load; all of both to nothing; and so do moments.
  rows.push(`load: ${sum(cells.slice(0, steps).map((_, i) => ({ k: 1, name: `f${i}` })))} - P = 0`);
  rows.push(`force: ${sum(cells.map((_, i) => ({ k: 1, name: `f${i}` })))} = 0`);
  rows.push(`turn: ${sum(cells.map((c, i) => ({ k: c.at, name: `f${i}` })))} = 0`);
  // Shear and moment run along the bar as variables of their own, which keeps the rows short.
  cells.forEach((cell, i) => {
    const before = i === 0 ? '' : `- V${i - 1}`;
    rows.push(`v${i}: V${i} ${before} - f${i} = 0`);
    if (i > 0) rows.push(`m${i}: M${i} ${i > 1 ? `- M${i - 1}` : ''} - ${cell.at - (cells[i - 1]?.at ?? 0)} V${i - 1} = 0`);
  });
  const limit = plastic / scale;
  const bounds = [
    ...cells.map((c, i) => `-${c.most / scale} <= f${i} <= ${c.most / scale}`),
    ...cells.map((_, i) => `V${i} free`),
    ...cells.slice(1).map((_, i) => `-${limit} <= M${i + 1} <= ${limit}`),
  ];
  const answer = solver.solve(`Maximize\n obj: P\nSubject To\n ${rows.join('\n ')}\nBounds\n ${bounds.join('\n ')}\nEnd`);
  if (answer.Status !== 'Optimal') throw new Error(`The program ended ${answer.Status}.`);
  return answer.ObjectiveValue * scale;
}
