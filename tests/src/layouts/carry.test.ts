import { describe, expect, it } from 'vitest';
import type { Bench } from '../../../shared/layouts/edits.ts';
import type { Frame } from '../../../shared/layouts/layout.ts';
import type { Pattern } from '../../../shared/patterns/pattern.ts';
import { carried, frameAt, takeUp, turnedTo } from '../../../src/features/layouts/editor/gestures/carry.ts';
import { nudgeMm } from '../../../src/features/layouts/editor/gestures/keys.ts';
import { readyDesigns } from '../../../src/features/layouts/editor/state/designs.ts';
import { fitted, toScreen, toWall, zoomed } from '../../../src/features/layouts/editor/stage/view.ts';

const hexagon = {
  id: 'p', name: 'Comb', version: 1, archived: false,
  design: { shape: { kind: 'regular', sides: 6, sideMm: 200 }, thicknessMm: 18, depthMm: 100, species: 'cherry', moisturePercent: 8, groove: null, hangers: [], contentsKg: null },
} as unknown as Pattern;
const designs = readyDesigns([hexagon]);
const frame = (id: string, xMm: number, yMm: number, over: Partial<Frame> = {}): Frame => ({ id, patternId: 'p', xMm, yMm, turnRad: 0, flipped: false, locked: false, label: id, contentsKg: null, hungGroup: null, ...over });
const bench = (...frames: Frame[]): Bench => ({ frames, sheet: { name: 'x', revealMm: 6 } });
const how = { revealMm: 6, reachMm: 40, snapping: true };
const across = 200 * Math.sqrt(3);

describe('a frame carried by hand', () => {
  it('lands at the reveal from its neighbour: across flats s√3 and the reveal between centres', () => {
    const b = bench(frame('1', 1000, 1000), frame('2', 2000, 1000));
    const carry = takeUp(b, designs, '2', ['2'], { x: 2010, y: 1005 })!;
    const { placements, snap } = carried(carry, { x: 1010 + 8, y: 1005 + across + 20 }, how);
    expect(placements.get('2')!.xMm).toBeCloseTo(1000, 6);
    expect(placements.get('2')!.yMm).toBeCloseTo(1000 + across + 6, 6);
    expect(snap?.frameId).toBe('1');
  });

  it('goes exactly where the hand does when snapping is off, and takes the others chosen along', () => {
    const b = bench(frame('1', 1000, 1000), frame('2', 2000, 1000), frame('3', 3000, 1000));
    const carry = takeUp(b, designs, '2', ['2', '3'], { x: 2000, y: 1000 })!;
    const { placements } = carried(carry, { x: 1500, y: 1100 }, { ...how, snapping: false });
    expect(placements.get('2')).toMatchObject({ xMm: 1500, yMm: 1100 });
    expect(placements.get('3')).toMatchObject({ xMm: 2500, yMm: 1100 });
  });

  it('does not move when it is locked, and is left behind when others are carried', () => {
    const b = bench(frame('1', 1000, 1000, { locked: true }), frame('2', 2000, 1000));
    expect(takeUp(b, designs, '1', ['1'], { x: 1000, y: 1000 })).toBeNull();
    expect([...takeUp(b, designs, '2', ['1', '2'], { x: 2000, y: 1000 })!.start.keys()]).toEqual(['2']);
  });

  it('is taken by its opening as well as by its members, and not beyond its corners', () => {
    const b = bench(frame('1', 1000, 1000));
    expect(frameAt(b.frames, designs, { x: 1000, y: 1000 })?.id).toBe('1');
    expect(frameAt(b.frames, designs, { x: 1199, y: 1000 })?.id).toBe('1');
    expect(frameAt(b.frames, designs, { x: 1190, y: 1100 })).toBeNull();
  });

  it('turned by its handle looks to the hand, and takes hold at whole steps', () => {
    const f = frame('1', 1000, 1000);
    const at = (degrees: number) => ({ x: 1000 + 500 * Math.cos(((90 + degrees) * Math.PI) / 180), y: 1000 + 500 * Math.sin(((90 + degrees) * Math.PI) / 180) });
    const turned = (degrees: number, snapping = true) => (turnedTo(f, designs, at(degrees), snapping).turnRad * 180) / Math.PI;
    expect(turned(28)).toBeCloseTo(30, 9);
    expect(turned(28, false)).toBeCloseTo(28, 9);
    expect(turned(15)).toBeCloseTo(15, 9);
    expect(turned(-61)).toBeCloseTo(-60, 9);
  });
});

describe('arrow keys', () => {
  it('move by 1 and 10 mm, in inch shops by 1/16 and 1/2 in', () => {
    expect([nudgeMm('mm', false), nudgeMm('mm', true)]).toEqual([1, 10]);
    expect([nudgeMm('in', false) / 25.4, nudgeMm('in', true) / 25.4]).toEqual([1 / 16, 1 / 2]);
  });
});

describe('the view', () => {
  const wall = { widthMm: 4000, heightMm: 2500 };
  it('has the floor at the foot of the screen, and finds the wall point under the pointer again', () => {
    const view = fitted(wall, { width: 900, height: 600 });
    expect(toScreen(view, { x: 0, y: 0 }).y).toBeGreaterThan(toScreen(view, { x: 0, y: 2500 }).y);
    const back = toWall(view, toScreen(view, { x: 1234, y: 567 }));
    expect(back.x).toBeCloseTo(1234, 9);
    expect(back.y).toBeCloseTo(567, 9);
  });
  it('zooms about the pointer: what is under it stays', () => {
    const view = fitted(wall, { width: 900, height: 600 });
    const under = toWall(view, { x: 300, y: 200 });
    const near = zoomed(view, 3, { x: 300, y: 200 });
    expect(near.scale).toBeCloseTo(view.scale * 3, 12);
    expect(toScreen(near, under).x).toBeCloseTo(300, 9);
    expect(toScreen(near, under).y).toBeCloseTo(200, 9);
  });
});
