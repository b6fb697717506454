import { describe, expect, it } from 'vitest';
import { findingsOf } from '../../../shared/findings/ledger.ts';
import { rules } from '../../../shared/findings/rules.ts';
import type { Scene } from '../../../shared/findings/scene.ts';
import { aFrame, aStud } from '../../support/builders.ts';
import { aBook, anchorId, anObstruction, aPattern, aScene, bracketId, heldHangers, patternId, wallScrewId } from '../../support/a-scene.ts';

const inch = 25.4;
/** Weight of each finding, by rule. */
const found = (scene: Scene) => Object.fromEntries(findingsOf(scene).map((f) => [f.rule, f.weight]));
const only = (scene: Scene, rule: string) => findingsOf(scene).filter((f) => f.rule === rule);

describe('a frame that is well hung', () => {
  it('gives no finding but the depth of its long screws', () => {
    expect(Object.keys(found(aScene()))).toEqual(['may reach a cable']);
  });
});

describe('frames on the wall', () => {
  const side = 177.8;
  const flats = side * Math.sqrt(3); // Regular hexagon: across flats = √3 s (CRC Standard Mathematical Tables).
  const above = (gap: number) => aScene({ frames: [aFrame(patternId, { id: 'a' }), aFrame(patternId, { id: 'b', yMm: 1450 + flats + gap })] });

  it('may touch at the chosen reveal, and no nearer than 3 mm otherwise', () => {
    expect(found(above(6))['nearly touching']).toBeUndefined();
    expect(found(above(2.5))['nearly touching']).toBe('caution');
    expect(found(above(3))['nearly touching']).toBeUndefined();
    expect(found(above(0))['overlapping']).toBeUndefined();
  });

  it('cannot be in one another: the finding tells by how much', () => {
    const [finding] = only(above(-4), 'overlapping');
    expect(finding).toMatchObject({ weight: 'stop', frameIds: ['a', 'b'] });
    expect(finding!.figures[0]!.value).toBeCloseTo(4, 6);
  });

  it('cannot reach past an edge of the wall', () => {
    expect(found(aScene({ frames: [aFrame(patternId, { xMm: side - 1 })] }))['off the wall']).toBe('stop');
    expect(found(aScene({ frames: [aFrame(patternId, { xMm: side })] }))['off the wall']).toBeUndefined();
    expect(found(aScene({ frames: [aFrame(patternId, { yMm: 2600 - flats / 2 + 1 })] }))['off the wall']).toBe('stop');
  });

  it('cannot reach past a sloped ceiling, though within the wall’s width and height', () => {
    // A roof of 45° from a knee wall of 1000 mm at the left: at x it is 1000 + x high. The hexagon's upper left corner stands at
    // (x − s/2, y + √3/2·s), so its distance to the slope is (1000 + x − s/2 − y − √3/2·s) / √2.
    const sloped = { ...aScene().wall, outlineMm: [[0, 0], [4000, 0], [4000, 2600], [1600, 2600], [0, 1000]] as [number, number][] };
    const at = (roomMm: number) => ({ ...aScene({ frames: [aFrame(patternId, { xMm: 800, yMm: 1800 - side / 2 - flats / 2 - roomMm * Math.SQRT2 })] }), wall: sloped });
    const [finding] = only(at(-10), 'off the wall');
    expect(finding).toMatchObject({ weight: 'stop', words: expect.stringMatching(/outline/) as string });
    expect(finding!.figures[0]!.value).toBeCloseTo(10, 6);
    expect(found(at(10))['off the wall']).toBeUndefined();
  });

  it('may not cover an obstruction, nor come nearer than its clearance', () => {
    const at = (left: number) => found(aScene({ wall: { obstructions: [anObstruction('vent', left, 1400, 100, 100, 50)] } }))['over an obstruction'];
    expect(at(1900)).toBe('stop');
    expect(at(1800 + side + 40)).toBe('caution');
    expect(at(1800 + side + 51)).toBeUndefined();
  });
});

describe('protruding objects (2010 ADA Standards, section 307.2)', () => {
  const flats = 177.8 * Math.sqrt(3);
  const walked = { zones: [{ id: 'z', kind: 'passage' as const, fromMm: 0, toMm: 3600 }] };
  const at = (bottomIn: number, depthIn: number) =>
    found(aScene({ wall: walked, patterns: [aPattern({ depthMm: depthIn * inch })], frames: [aFrame(patternId, { yMm: bottomIn * inch + flats / 2 })] })).protruding;

  it.each([[27, 8, undefined], [27.1, 8, 'caution'], [79.9, 8, 'caution'], [27.1, 4, undefined], [50, 4.1, 'caution']])('lower edge %s in, depth %s in: %s', (bottom, depth, weight) => {
    expect(at(bottom, depth)).toBe(weight);
  });

  it('speak of paths only', () => {
    const scene = aScene({ patterns: [aPattern({ depthMm: 8 * inch })], wall: { zones: [{ id: 'z', kind: 'seat', fromMm: 0, toMm: 3600 }] } });
    expect(found(scene).protruding).toBeUndefined();
  });
});

describe('cables (BS 7671:2018, 522.6.202: within 150 mm of ceiling and corners, and in line with an accessory)', () => {
  const at = (xMm: number, yMm: number, outlet = anObstruction('outlet', 3000, 300, 80, 80)) =>
    only(aScene({ frames: [aFrame(patternId, { xMm, yMm })], wall: { obstructions: [outlet] } }), 'cable run').length;

  it('are expected straight above and beside an outlet', () => {
    expect(at(1800, 1450)).toBe(0);
    expect(at(3040 - 50, 1450)).toBe(1);
    expect(at(1800, 340 - 177.8 * Math.sqrt(3) / 2 + 9)).toBe(2);
  });

  it('are expected near a corner and near the ceiling', () => {
    expect(at(199, 1450)).toBe(1);
    expect(at(202, 1450)).toBe(0);
    expect(at(1800, 2600 - 177.8 * Math.sqrt(3) / 2)).toBe(2);
  });
});

describe('studs', () => {
  it('count where the screw’s centre is within b/2 − 1.5 D − uncertainty of the stud (NDS-2018, 12.5.1)', () => {
    // 38.1 / 2 − 1.5 × 4.826 − 1.5875 = 10.2235 mm.
    const at = (off: number) => only(aScene({ wall: { studs: [aStud(1750 + off), aStud(1850 + off)] } }), 'not in a stud').length;
    expect(at(10.2)).toBe(0);
    expect(at(10.25)).toBe(2);
  });

  it('are a caution nearer the edge than 2.5 D (NDS commentary, from memory)', () => {
    // 38.1 / 2 − 2.5 × 4.826 − 1.5875 = 5.3975 mm.
    const at = (off: number) => only(aScene({ wall: { studs: [aStud(1750 + off), aStud(1850 + off)] } }), 'near a stud edge').length;
    expect(at(5.3)).toBe(0);
    expect(at(5.5)).toBe(2);
  });

  it('that only a finder or the spacing shows must be confirmed', () => {
    const by = (foundBy: 'finder' | 'spacing' | 'probe') => found(aScene({ wall: { studs: [aStud(1750, { foundBy, uncertaintyMm: 3 }), aStud(1850, { foundBy, uncertaintyMm: 3 })] } }))['stud unconfirmed'];
    expect(by('finder')).toBe('caution');
    expect(by('spacing')).toBe('caution');
    expect(by('probe')).toBeUndefined();
  });

  it('do not matter to masonry, which wants a masonry anchor', () => {
    const scene = aScene({ wall: { construction: 'masonry', studs: [] } });
    expect(found(scene)['not in a stud']).toBeUndefined();
    expect(found(scene).utilisation).toBe('stop');
  });
});

describe('what holds a hanger', () => {
  it('counts for nothing where an anchor bears no rating, and says so', () => {
    const [finding] = only(aScene({ wall: { studs: [] } }), 'utilisation');
    expect(finding).toMatchObject({ weight: 'stop' });
    expect(finding!.words).toMatch(/packet/);
  });

  it('is a stop when overloaded, a caution over four fifths, and opens to formula and source', () => {
    const holding = (contentsKg: number) => only(aScene({ patterns: [aPattern({ contentsKg })] }), 'utilisation');
    expect(holding(3)).toEqual([]);
    const stop = holding(60);
    expect(stop.map((f) => f.weight)).toEqual(['stop', 'stop']);
    expect(stop[0]!.figures.length).toBeGreaterThan(3);
    for (const figure of stop[0]!.figures) expect(figure.formula && figure.source).toBeTruthy();
  });

  it('takes an anchor by its packet: ultimate divided by 4, V/Va + T/Ta', () => {
    const book = { ...aBook(), anchors: [{ id: anchorId, name: 'Rated', kind: 'hollow wall' as const, ratedAs: 'ultimate' as const, shearN: 4000, tensionN: 4000 }] };
    expect(only(aScene({ wall: { studs: [] }, book }), 'utilisation')).toEqual([]);
    const weak = { ...book, anchors: [{ ...book.anchors[0]!, shearN: 80, tensionN: 80 }] };
    expect(only(aScene({ wall: { studs: [] }, book: weak }), 'utilisation').map((f) => f.weight)).toEqual(['stop', 'stop']);
  });
});

describe('balance', () => {
  it('on one hanger off plumb turns: the angle follows from hanger and centre', () => {
    const [finding] = only(aScene({ patterns: [aPattern({ hangers: heldHangers([40]) })] }), 'out of level');
    expect(finding).toMatchObject({ weight: 'caution' });
    // The hanger is 9 mm in from the top face: 177.8 √3/2 − 9 = 144.98 mm above the centre and 40 mm aside; the bracket's own mass is small.
    expect(Math.abs(finding!.figures[0]!.value)).toBeCloseTo(Math.atan2(40, 177.8 * Math.sqrt(3) / 2 - 9), 2);
  });

  it('on one hanger below the middle tips over', () => {
    const below = heldHangers([0]).map((h) => ({ ...h, member: 0 }));
    expect(found(aScene({ patterns: [aPattern({ hangers: below })] }))['out of level']).toBe('stop');
  });

  it('of frames screwed together is that of one body', () => {
    const flats = 177.8 * Math.sqrt(3);
    const noHanger = { ...aPattern({ hangers: [] }), id: '00000000-0000-4000-8000-000000000006' };
    const frames = [aFrame(patternId, { id: 'a', hungGroup: 'pair' }), aFrame(noHanger.id, { id: 'b', yMm: 1450 - flats, hungGroup: 'pair' })];
    const grouped = aScene({ frames, patterns: [aPattern(), noHanger] });
    expect(found(grouped)['out of level']).toBeUndefined();
    const apart = { ...grouped, frames: frames.map((f) => ({ ...f, hungGroup: null })) };
    expect(only(apart, 'out of level').map((f) => f.frameIds)).toEqual([['b']]);
  });
});

describe('joinery (common practice)', () => {
  const groove = (change: object) => ({ widthMm: 6.35, depthMm: 6.35, clearanceMm: 1, mirrorMm: 3, backerMm: 3, ...change });
  const joinery = (change: object, rest: object = {}) => found(aScene({ patterns: [aPattern({ thicknessMm: 19.05, groove: groove(change), ...rest })] }));

  it('lets a groove take 2/5 of the thickness, and never more than half', () => {
    expect(joinery({ widthMm: 7.62 })['groove too wide']).toBeUndefined();
    expect(joinery({ widthMm: 7.7 })['groove too wide']).toBe('caution');
    expect(joinery({ widthMm: 9.6 })['groove too wide']).toBe('stop');
  });

  it('wants a groove as deep as mirror and backer together (1/8 + 1/8 = 1/4 in)', () => {
    expect(joinery({ depthMm: 6.35, mirrorMm: 3.175, backerMm: 3.175 })['groove too shallow']).toBeUndefined();
    expect(joinery({ depthMm: 6.3, mirrorMm: 3.175, backerMm: 3.175 })['groove too shallow']).toBe('stop');
  });

  it('wants a lip of the hole and 1/8 in on either side', () => {
    // #8: 4.1656 + 2 × 3.175 = 10.5156 mm.
    expect(joinery({ widthMm: 19.05 - 10.6 })['lip too small']).toBeUndefined();
    expect(joinery({ widthMm: 19.05 - 10.4 })['lip too small']).toBe('stop');
  });

  it('cautions of a bevel that no ordinary saw tilts to: a triangle’s 60°', () => {
    const shape = (sides: number) => found(aScene({ patterns: [aPattern({ shape: { kind: 'regular', sides, sideMm: 300 }, hangers: [] })] }))['bevel beyond the saw'];
    expect([3, 4, 6].map(shape)).toEqual(['caution', undefined, undefined]);
  });

  it('cautions of a mirror above a bed, and not of one above the floor', () => {
    const zones = [{ id: 'z', kind: 'bed' as const, fromMm: 1000, toMm: 2600 }];
    const patterns = [aPattern({ groove: groove({}) })];
    expect(found(aScene({ patterns, wall: { zones } }))['glass overhead']).toBe('caution');
    expect(found(aScene({ patterns }))['glass overhead']).toBeUndefined();
  });
});

describe('the rules', () => {
  it('each bear a title, words and a source of their own', () => {
    expect(new Set(rules.map((r) => r.id)).size).toBe(rules.length);
    for (const rule of rules) expect(rule.title.length * rule.source.length).toBeGreaterThan(0);
    expect(found(aScene({ changedSinceSigned: true }))['changed since signed']).toBe('caution');
  });

  it('know the hardware by the shop’s own book', () => {
    const hangers = heldHangers().map((h) => ({ ...h, bracketId: null }));
    expect(only(aScene({ patterns: [aPattern({ hangers })] }), 'utilisation').every((f) => f.weight === 'stop')).toBe(true);
    expect([bracketId, wallScrewId]).toHaveLength(2);
  });
});
