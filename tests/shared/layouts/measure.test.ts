import { expect, it } from 'vitest';
import { measured, pickPoint } from '../../../shared/layouts/measure.ts';

const square = (x: number, y: number) => [{ x, y }, { x: x + 100, y }, { x: x + 100, y: y + 100 }, { x, y: y + 100 }];

it('a corner in reach is measured from, before an edge that is nearer', () => {
  expect(pickPoint([square(0, 0)], { x: 98, y: 7 }, 10)).toMatchObject({ at: { x: 100, y: 0 }, on: 'corner' });
  expect(pickPoint([square(0, 0)], { x: 98, y: 50 }, 10)).toMatchObject({ at: { x: 100, y: 50 }, on: 'edge' });
  expect(pickPoint([square(0, 0)], { x: 150, y: 50 }, 10)).toMatchObject({ at: { x: 150, y: 50 }, on: 'free' });
});

it('between parallel edges the measure is square, however askew the ends were pressed', () => {
  const frames = [square(0, 0), square(140, 30)];
  const gap = measured(pickPoint(frames, { x: 101, y: 50 }, 10), pickPoint(frames, { x: 139, y: 90 }, 10));
  expect(gap).toMatchObject({ mm: 40, acrossMm: 40, upMm: 0, square: true });
});

it('from corner to corner it is the straight way: 3, 4, 5', () => {
  const corners = measured(pickPoint([square(0, 0)], { x: 100, y: 100 }, 5), pickPoint([square(400, 500)], { x: 400, y: 500 }, 5));
  expect(corners).toMatchObject({ mm: 500, acrossMm: 300, upMm: 400, square: false });
});
