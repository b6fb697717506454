import { describe, expect, it } from 'vitest';
import { createLedger } from '../../../shared/findings/ledger.ts';
import { wholeFigures, wholeLoad } from '../../../shared/findings/loads.ts';
import { aFrame, aStud } from '../../support/builders.ts';
import { aPattern, aScene, patternId } from '../../support/a-scene.ts';

describe('the loads of a whole layout', () => {
  it('add up, and balance where a lever of two unequal loads would', () => {
    const frames = [aFrame(patternId, { id: 'a', xMm: 1000, yMm: 1200, contentsKg: 2 }), aFrame(patternId, { id: 'b', xMm: 2200, yMm: 1800, contentsKg: 8 })];
    const { bodies } = createLedger()(aScene({ frames, patterns: [aPattern()], wall: { studs: [950, 1050, 2150, 2250].map((x) => aStud(x)) } }));
    const load = wholeLoad(bodies);
    expect(load.contentsKg).toBe(10);
    expect(load.weightN).toBeCloseTo(load.kg * 9.80665, 9); // Standard gravity, 3rd CGPM (1901).
    const [a, b] = bodies.map(({ body }) => body);
    // Moments about the balance point cancel: m1 d1 = m2 d2.
    expect(a!.massKg * (load.balance!.x - a!.centre.x)).toBeCloseTo(b!.massKg * (b!.centre.x - load.balance!.x), 6);
    expect(a!.massKg * (load.balance!.y - a!.centre.y)).toBeCloseTo(b!.massKg * (b!.centre.y - load.balance!.y), 6);
    for (const figure of wholeFigures(load)) expect(figure.formula && figure.source && figure.inputs.length).toBeTruthy();
    expect(load.worst!.body.id).toBe('frame b');
  });

  it('of an empty wall are nothing, with no point to balance on', () => {
    expect(wholeLoad([])).toMatchObject({ kg: 0, balance: null, worst: null });
    expect(wholeFigures(wholeLoad([]))).toHaveLength(2);
  });
});
