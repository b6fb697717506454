import { describe, expect, it } from 'vitest';
import { begunWith, closed, pressed, unpressed, type Drawing, type Tool } from '../../../src/features/walls/wall-tools.ts';

const nearMm = 40;
const press = (drawing: Drawing, ...points: [number, number][]) =>
  points.reduce<ReturnType<typeof pressed>>((so, [x, y]) => pressed(so.drawing, { x, y }, nearMm), { drawing, drawn: null });
const begin = (tool: Tool) => begunWith(tool, { x: 0, y: 0 });

describe('drawing on the wall', () => {
  it('sets a stud where it is pressed, to the millimetre, and is ready for the next', () => {
    const one = press(begin('stud'), [812.4, 900]);
    expect(one.drawn).toEqual({ kind: 'stud', xMm: 812 });
    expect(press(one.drawing, [1218.6, 30]).drawn).toEqual({ kind: 'stud', xMm: 1219 });
  });

  it('makes a rectangle of any two opposite corners', () => {
    expect(press(begin('box'), [1200, 372], [1130, 258]).drawn).toEqual({ kind: 'box', leftMm: 1130, bottomMm: 258, widthMm: 70, heightMm: 114 });
  });

  it('takes a second press on the same spot for a slip, and waits', () => {
    const slip = press(begin('box'), [1200, 372], [1201, 371]);
    expect(slip.drawn).toBeNull();
    expect(press(slip.drawing, [1300, 500]).drawn).toMatchObject({ leftMm: 1200, widthMm: 100 });
  });

  it('closes a polygon on its first corner, or when told to, but not with two corners', () => {
    const three = press(begin('polygon'), [0, 0], [900, 0], [0, 700]);
    expect(three.drawn).toBeNull();
    const corners = [[0, 0], [900, 0], [0, 700]];
    expect(press(three.drawing, [20, 10]).drawn).toEqual({ kind: 'polygon', corners });
    expect(closed(three.drawing).drawn).toEqual({ kind: 'polygon', corners });
    expect(closed(unpressed(three.drawing)).drawn).toBeNull();
  });

  it('reads a stretch of the foot from left to right', () => {
    expect(press(begin('zone'), [2400, 0], [900, 40]).drawn).toEqual({ kind: 'zone', fromMm: 900, toMm: 2400 });
  });
});
