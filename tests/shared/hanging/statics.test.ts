import fc from 'fast-check';
import { Matrix, solve } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import { hang, joinBodies, type HungBody } from '../../../shared/hanging/statics.ts';
import { loadFigures } from '../../../shared/hanging/statics-figures.ts';

const g = 9.80665;
const kgOf = (newton: number) => newton / g;
const loadOf = (body: HungBody, id: string) => {
  const load = hang(body).hangers.find((h) => h.id === id);
  if (!load) throw new Error(`no hanger ${id}`);
  return load;
};
const tilt = (body: HungBody) => (hang(body).outOfLevelRad * 180) / Math.PI;

describe('a load beside a group of fasteners', () => {
  // Bhandari, Design of Machine Elements, example 7.3 (fig. 7.16): 10 kN, 500 mm beside the middle of four bolts 200 × 150 mm.
  const body: HungBody = {
    massKg: kgOf(10_000), centre: { x: 500, y: 0, z: 0 }, bearingYMm: -500,
    hangers: [{ id: 'near high', x: 100, y: 75 }, { id: 'near low', x: 100, y: -75 }, { id: 'far high', x: -100, y: 75 }, { id: 'far low', x: -100, y: -75 }],
  };
  it('gives the near bolts 12,093.39 N and the far ones 8,139.41 N', () => {
    expect(loadOf(body, 'near high').shearN).toBeCloseTo(12_093.39, 2);
    expect(loadOf(body, 'near low').shearN).toBeCloseTo(12_093.39, 2);
    expect(loadOf(body, 'far high').shearN).toBeCloseTo(8_139.41, 2);
    expect(loadOf(body, 'far low').shearN).toBeCloseTo(8_139.41, 2);
  });
  it('has a direct share of 2,500 N and a turning share of 10,000 N', () => {
    // The same example's steps: the turning share is at right angles to the bolt's radius, of 125 mm.
    const { shear } = loadOf(body, 'near high');
    expect(Math.hypot(shear.x, shear.y + 2500)).toBeCloseTo(10_000, 6);
    expect(shear.x * 100 + (shear.y + 2500) * 75).toBeCloseTo(0, 6);
  });
});

describe('a load that pries a bracket off its wall', () => {
  // Bhandari, example 7.5 (fig. 7.20): 25 kN at 100 mm, two bolts 150 mm and two 25 mm above the edge it tips about.
  const body: HungBody = {
    massKg: kgOf(25_000), centre: { x: 0, y: 80, z: 100 }, bearingYMm: 0,
    hangers: [{ id: 'high left', x: -40, y: 150 }, { id: 'high right', x: 40, y: 150 }, { id: 'low left', x: -40, y: 25 }, { id: 'low right', x: 40, y: 25 }],
  };
  it('pulls 8,108.11 N on each upper bolt, beside 6,250 N along the wall', () => {
    const { tensionN, shearN, resultantN, angleRad } = loadOf(body, 'high left');
    expect(tensionN).toBeCloseTo(8_108.11, 2);
    expect(shearN).toBeCloseTo(6_250, 6);
    // The book's greatest shear force, √((T/2)² + V²) = 7,449.69 N.
    expect(Math.hypot(tensionN / 2, shearN)).toBeCloseTo(7_449.69, 2);
    expect(resultantN).toBeCloseTo(Math.hypot(8_108.108, 6_250), 2);
    expect(Math.tan(angleRad)).toBeCloseTo(8_108.108 / 6_250, 5);
  });
  it('pulls a sixth of that on the lower ones, and leans on the wall with the sum', () => {
    expect(loadOf(body, 'low right').tensionN).toBeCloseTo(8_108.108 / 6, 2);
    expect(hang(body).bearing).toEqual({ forceN: expect.closeTo(2 * 8_108.108 * (7 / 6), 1), xMm: expect.closeTo(0, 9), yMm: 0 });
  });
});

describe('a frame on one hanger', () => {
  const on = (x: number, y: number): HungBody => ({ massKg: 4, centre: { x: 0, y: 0, z: 60 }, bearingYMm: -150, hangers: [{ id: 'a', x, y }] });
  it('hangs level when it is plumb above the centre, give or take 3 mm', () => {
    expect(hang(on(0, 100))).toMatchObject({ state: 'held', outOfLevelRad: expect.closeTo(0, 12) });
    expect(hang(on(3, 100)).state).toBe('held');
    expect(hang(on(3.01, 100)).state).toBe('turns');
  });
  it('turns until the centre is below: 45° for as far beside as above', () => {
    // The centre lies left of its hanger: its weight turns the frame counter-clockwise.
    expect(tilt(on(100, 100))).toBeCloseTo(45, 9);
    expect(tilt(on(-100, 100))).toBeCloseTo(-45, 9);
    expect(tilt(on(-50, 50 * Math.sqrt(3)))).toBeCloseTo(-30, 9);
  });
  it('would fall over when the hanger is not above the centre', () => {
    expect(hang(on(0, -10)).state).toBe('unstable');
    expect(hang(on(20, 0)).state).toBe('unstable');
  });
  it('carries all its weight there', () => {
    expect(loadOf(on(20, 100), 'a')).toMatchObject({ shear: { x: 0, y: expect.closeTo(-4 * g, 9) } });
  });
  it('is no better off with two hangers in the same place', () => {
    const body = { ...on(50, 100), hangers: [{ id: 'a', x: 50, y: 100 }, { id: 'b', x: 50, y: 100 }] };
    expect(hang(body)).toMatchObject({ state: 'turns', hangers: [{ shearN: expect.closeTo(2 * g, 9) }, { shearN: expect.closeTo(2 * g, 9) }] });
  });
});

describe('odd bodies', () => {
  it('without a hanger are not held, and without one above the bearing line tip off the wall', () => {
    const body: HungBody = { massKg: 4, centre: { x: 0, y: 0, z: 60 }, bearingYMm: -150, hangers: [] };
    expect(hang(body).state).toBe('not held');
    expect(hang({ ...body, hangers: [{ id: 'a', x: -50, y: -150 }, { id: 'b', x: 50, y: -150 }] }).state).toBe('tips');
  });
});

const coordinate = fc.double({ min: -2000, max: 2000, noNaN: true });
const bodies = fc
  .record({
    massKg: fc.double({ min: 0.1, max: 300, noNaN: true }),
    centre: fc.record({ x: coordinate, y: coordinate, z: fc.double({ min: 1, max: 400, noNaN: true }) }),
    hangers: fc.array(fc.record({ x: coordinate, y: coordinate }), { minLength: 1, maxLength: 8 }),
    below: fc.double({ min: 1, max: 500, noNaN: true }),
  })
  .map(({ massKg, centre, hangers, below }): HungBody => ({
    massKg, centre, bearingYMm: Math.min(...hangers.map((h) => h.y)) - below, hangers: hangers.map((h, i) => ({ id: `${i}`, ...h })),
  }))
  .filter(({ hangers }) => hangers.every((a, i) => hangers.every((b, j) => i === j || Math.hypot(a.x - b.x, a.y - b.y) > 5)));

describe('every hung body', () => {
  it('is in balance: forces and moments to one part in 10⁹', () => {
    fc.assert(
      fc.property(bodies, (body) => {
        const { hangers, weightN, bearing, residual } = hang(body);
        expect(residual).toBeLessThan(1e-9);
        // The same once more from outside, about a point of our own and with the wall's push.
        const about = { x: body.centre.x + 37, y: body.centre.y - 91 };
        // Of all the forces at work, the weight among them.
        const close = (parts: number[]) =>
          expect(Math.abs(parts.reduce((a, b) => a + b, 0))).toBeLessThanOrEqual(1e-9 * parts.reduce((a, b) => a + Math.abs(b), weightN));
        close(hangers.map((h) => h.shear.x));
        close([...hangers.map((h) => h.shear.y), weightN]);
        if (hangers.length > 1) {
          close([
            ...hangers.flatMap((h, i) => {
              const at = body.hangers[i] ?? about;
              return [(at.x - about.x) * h.shear.y, -(at.y - about.y) * h.shear.x];
            }),
            weightN * (body.centre.x - about.x),
          ]);
        }
        close([...hangers.map((h) => h.tensionN), -bearing.forceN]);
        // About the x axis and the y axis, with the wall's push where it acts.
        close([...hangers.map((h, i) => h.tensionN * ((body.hangers[i]?.y ?? 0) - body.bearingYMm)), -weightN * body.centre.z]);
        close([...hangers.map((h, i) => h.tensionN * (body.hangers[i]?.x ?? 0)), -bearing.forceN * bearing.xMm]);
      }),
    );
  });

  it('loads its hangers as a rigid plate on equal springs does, solved as linear equations', () => {
    fc.assert(
      fc.property(bodies, (body) => {
        const { hangers, weightN } = hang(body);
        if (hangers.length < 2) return;
        // Unknown: how far the plate moves and turns, (u, v, θ) about its centre of mass; springs of stiffness 1.
        const arms = body.hangers.map((h) => ({ x: (h.x - body.centre.x) / 1000, y: (h.y - body.centre.y) / 1000 }));
        const stiffness = Matrix.zeros(3, 3);
        for (const a of arms) {
          const rows = new Matrix([[1, 0, -a.y], [0, 1, a.x]]);
          stiffness.add(rows.transpose().mmul(rows));
        }
        const [u = 0, v = 0, turn = 0] = solve(stiffness, Matrix.columnVector([0, -weightN, 0]), true).to1DArray();
        const scale = Math.max(...hangers.map((h) => h.shearN));
        arms.forEach((a, i) => {
          expect(Math.abs((hangers[i]?.shear.x ?? 0) - (u - turn * a.y)) / scale).toBeLessThan(1e-5);
          expect(Math.abs((hangers[i]?.shear.y ?? 0) - (v + turn * a.x)) / scale).toBeLessThan(1e-5);
        });
        // Out of the wall: stretch = lever × lean; the pulls and the lean are all unknown at once.
        const levers = body.hangers.map((h) => (h.y - body.bearingYMm) / 1000);
        const n = levers.length;
        const equations = Matrix.zeros(n + 1, n + 1);
        levers.forEach((h, i) => {
          equations.set(i, i, 1);
          equations.set(i, n, -h);
          equations.set(n, i, h);
        });
        const pulls = solve(equations, Matrix.columnVector([...levers.map(() => 0), (weightN * body.centre.z) / 1000])).to1DArray();
        hangers.forEach((h, i) => expect(h.tensionN).toBeCloseTo(pulls[i] ?? NaN, 5));
      }),
    );
  });

  it('feels nothing of where on the wall it hangs', () => {
    fc.assert(
      fc.property(bodies, coordinate, coordinate, (body, dx, dy) => {
        const moved = hang({
          ...body, centre: { ...body.centre, x: body.centre.x + dx, y: body.centre.y + dy }, bearingYMm: body.bearingYMm + dy,
          hangers: body.hangers.map((h) => ({ ...h, x: h.x + dx, y: h.y + dy })),
        });
        hang(body).hangers.forEach((h, i) => {
          expect(Math.abs((moved.hangers[i]?.resultantN ?? NaN) - h.resultantN)).toBeLessThan(1e-6 * (1 + h.resultantN));
        });
      }),
    );
  });

  it('loads mirrored hangers alike when it is mirrored', () => {
    fc.assert(
      fc.property(bodies, (body) => {
        const mirrored = hang({ ...body, centre: { ...body.centre, x: -body.centre.x }, hangers: body.hangers.map((h) => ({ ...h, x: -h.x })) });
        hang(body).hangers.forEach((h, i) => {
          const other = mirrored.hangers[i];
          expect(other?.shear.y).toBeCloseTo(h.shear.y, 6);
          expect(other?.shear.x).toBeCloseTo(-h.shear.x, 6);
          expect(other?.tensionN).toBeCloseTo(h.tensionN, 6);
        });
      }),
    );
  });

  it('loads its hangers in proportion to its mass', () => {
    fc.assert(
      fc.property(bodies, fc.double({ min: 1, max: 10, noNaN: true }), (body, times) => {
        const heavier = hang({ ...body, massKg: body.massKg * times });
        hang(body).hangers.forEach((h, i) => expect(heavier.hangers[i]?.resultantN).toBeCloseTo(h.resultantN * times, 5));
      }),
    );
  });
});

describe('a hung group', () => {
  const left: HungBody = { massKg: 6, centre: { x: 0, y: 0, z: 50 }, bearingYMm: -100, hangers: [{ id: 'l', x: -40, y: 90 }] };
  const right: HungBody = { massKg: 2, centre: { x: 400, y: 20, z: 90 }, bearingYMm: -130, hangers: [{ id: 'r', x: 440, y: 60 }] };
  it('is one body: masses add, the centre is their mean by mass, the lowest point of all leans', () => {
    expect(joinBodies([left, right])).toEqual({
      massKg: 8, centre: { x: 100, y: 5, z: 60 }, bearingYMm: -130, hangers: [...left.hangers, ...right.hangers],
    });
    expect(hang(joinBodies([left, right])).state).toBe('held');
  });
  it('of one frame is that frame', () => {
    expect(joinBodies([left])).toEqual(left);
    expect(() => joinBodies([])).toThrow('at least one frame');
  });
});

describe('the figures of a load', () => {
  it('show the steps from mass to resultant', () => {
    const body: HungBody = { massKg: 5, centre: { x: 10, y: 0, z: 70 }, bearingYMm: -100, hangers: [{ id: 'a', x: -50, y: 80 }, { id: 'b', x: 50, y: 80 }] };
    const figures = loadFigures(body, hang(body), 'b');
    expect(figures.map((f) => f.label)).toEqual(['Weight', 'Along the wall, V', 'Out of the wall, T', 'Together, R']);
    // By hand: V = 49.03 × (60/100), T = 49.03 × 70 / 2 / 180.
    expect(figures.map((f) => f.value)).toEqual([49.03325, 29.41995, 9.534243, Math.hypot(29.41995, 9.534243)].map((v) => expect.closeTo(v, 5)));
    expect(figures.every((f) => f.source !== '' && f.inputs.length > 1)).toBe(true);
    expect(loadFigures(body, hang(body), 'elsewhere')).toEqual([]);
  });
});
