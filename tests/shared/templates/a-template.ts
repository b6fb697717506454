import { TemplateInput } from '../../../shared/templates/template-input.ts';

type Frame = TemplateInput['frames'][number];

/** A hexagon of side `sideMm`, flat side down, with two screws under its top side at odd places. */
export function aHexagon(label: string, x: number, y: number, sideMm: number): Frame {
  const outlineMm = Array.from({ length: 6 }, (_, i) => ({ x: x + sideMm * Math.cos((i * Math.PI) / 3), y: y + sideMm * Math.sin((i * Math.PI) / 3) }));
  const under = y + sideMm * 0.8;
  const hanger = (letter: string, dx: number) => ({ id: `${label}${letter}`, label: `${label}${letter}`, x: x + dx, y: under, drillMm: 2.4, hardware: 'plate and #8 screw' });
  return { id: label, label, outlineMm, hangers: [hanger('a', -sideMm * 0.31), hanger('b', sideMm * 0.37)] };
}

interface Wishes {
  paper?: TemplateInput['paper'];
  units?: TemplateInput['units'];
  state?: TemplateInput['title']['state'];
  correction?: TemplateInput['correction'];
}

/** Four frames that spread over several sheets, on a wall with three studs, one of them only guessed. */
export function aTemplate({ paper = 'letter', units = 'mm', state = 'signed', correction = { x: 1, y: 1 } }: Wishes): TemplateInput {
  return TemplateInput.parse({
    title: { shop: 'Test shop', job: 'Reading corner', wall: 'North wall', layout: 'Drift', letter: 'B', state, sha256: '0123456789abcdef' },
    wall: { widthMm: 2800, heightMm: 2400, studs: [406.4, 812.8, 1219.2].map((xMm, i) => ({ xMm, widthMm: 38.1, confirmed: i !== 1 })) },
    frames: [aHexagon('1', 611.3, 1002.7, 140), aHexagon('2', 824.9, 1127.4, 140), aHexagon('3', 611.3, 1252.1, 140), aHexagon('4', 1180.6, 1411.8, 95)],
    units, paper, correction,
    drawnAt: 'drawn 1 December 2026, 10:04',
  });
}
