/**
 * Writes, for every scene, `<scene>.inc` (camera and positions for the ray tracer) and `<scene>.json`
 * (the exact geometry of the photo) from the one description, so that picture and figures cannot disagree.
 *
 * Run from this folder: npx tsx project-marks.ts
 */
import { writeFileSync } from 'node:fs';
import {
  obliquityDegrees,
  pinholeOf,
  projectPoint,
  type Pinhole,
  type Point2,
  type Point3,
} from './scene-camera.ts';
import { SCENES, type SceneDescription, type WallObject } from './scene-descriptions.ts';

interface Mark {
  readonly id: string;
  readonly kind: 'tape' | 'target';
  readonly wallMm: Point2;
  readonly pixel: Point2;
}

const round = (value: number, places: number): number => Number(value.toFixed(places));

/** All marks of a scene, tape first (lower left, lower right, upper right, upper left), with their exact pixels. */
function marksOf(scene: SceneDescription): Mark[] {
  const camera = pinholeOf(scene.camera, scene.photo);
  const { x, y, width, height } = scene.tape;
  const tape: [string, Point2][] = [
    ['tape-lower-left', [x, y]],
    ['tape-lower-right', [x + width, y]],
    ['tape-upper-right', [x + width, y + height]],
    ['tape-upper-left', [x, y + height]],
  ];
  const targets = scene.targets.map((at, i): [string, Point2] => [
    `target-${String(i + 1).padStart(2, '0')}`,
    at,
  ]);
  return [...tape, ...targets].map(([id, wallMm]) => {
    const [u, v] = projectPoint(camera, [...wallMm, 0]);
    if (u < 0 || v < 0 || u > scene.photo.width || v > scene.photo.height)
      throw new RangeError(`${scene.name}: ${id} falls outside the photo.`);
    return { id, kind: id.startsWith('tape') ? 'tape' : 'target', wallMm, pixel: [round(u, 3), round(v, 3)] };
  });
}

/**
 * Studs of the wall, by centre (mm from the left): a stud at each end, common studs on centre, and a king and
 * a jack stud each side of an opening. An invented but ordinary framing.
 */
function studsOf(scene: SceneDescription): { xMm: number; role: 'end' | 'common' | 'king' | 'jack' }[] {
  const { spacing, width, first } = scene.studs;
  const casing = 50;
  const openings = scene.objects
    .filter((object) => object.kind === 'door' || object.kind === 'window')
    .map((object) => [object.x + casing, object.x + object.width - casing] as const);
  const studs: { xMm: number; role: 'end' | 'common' | 'king' | 'jack' }[] = [
    { xMm: width / 2, role: 'end' },
    { xMm: scene.wall.width - width / 2, role: 'end' },
  ];
  for (const [left, right] of openings) {
    studs.push({ xMm: left - width / 2, role: 'jack' }, { xMm: right + width / 2, role: 'jack' });
    studs.push({ xMm: left - 1.5 * width, role: 'king' }, { xMm: right + 1.5 * width, role: 'king' });
  }
  for (let x = first; x < scene.wall.width; x += spacing) {
    const inOpening = openings.some(([left, right]) => x > left - width && x < right + width);
    const onAnother = studs.some((stud) => Math.abs(stud.xMm - x) < width);
    if (!inOpening && !onAnother) studs.push({ xMm: x, role: 'common' });
  }
  return studs.map((stud) => ({ ...stud, xMm: round(stud.xMm, 2) })).sort((a, b) => a.xMm - b.xMm);
}

/** A wall-frame vector in the ray tracer's left-handed frame (z into the wall). */
const traced = (v: Point3, scale = 1): string =>
  `<${[v[0] * scale, v[1] * scale, -v[2] * scale].map((n) => n.toFixed(15)).join(', ')}>`;

const declaredName = (id: string): string =>
  id.replace(/(^|-)([a-z])/g, (_, dash: string, letter: string) => (dash ? '_' : '') + letter.toUpperCase());

function objectLines({ id, x, y, width, height, depth }: WallObject): string[] {
  const name = declaredName(id);
  const edges = { Left: x, Right: x + width, Bottom: y, Top: y + height, Depth: depth };
  return Object.entries(edges).map(([edge, value]) => `#declare ${name}_${edge} = ${value};`);
}

/** The include file for the ray tracer. */
function includeFile(scene: SceneDescription, camera: Pinhole): string {
  const marks = marksOf(scene);
  const placed = (kind: Mark['kind'], macro: string): string[] =>
    marks.filter((mark) => mark.kind === kind).map((mark) => `  ${macro}(${mark.wallMm.join(', ')})`);
  return [
    '// Written by project-marks.ts from scene-descriptions.ts; change those, not this.',
    `#declare Wall_Width = ${scene.wall.width};`,
    `#declare Wall_Height = ${scene.wall.height};`,
    'camera {',
    '  perspective',
    `  location ${traced(camera.at)}`,
    `  direction ${traced(camera.forward)}`,
    `  right ${traced(camera.right, camera.photo.width / camera.focal)}`,
    `  up ${traced(camera.up, camera.photo.height / camera.focal)}`,
    '}',
    ...scene.objects.flatMap(objectLines),
    '#macro All_Marks()',
    ...placed('tape', 'Tape_Cross'),
    ...placed('target', 'Checker_Target'),
    '#end',
    '',
  ].join('\n');
}

/** The geometry that goes beside the photo. */
function geometryOf(scene: SceneDescription, camera: Pinhole): object {
  const { width, height, orientation } = scene.photo;
  const stored = orientation === 6 ? { width: height, height: width } : { width, height };
  return {
    scene: scene.name,
    title: scene.title,
    invented: true,
    wallMm: scene.wall,
    frames: {
      wall: 'mm; origin at the lower left corner at finished floor, x right, y up',
      pixel:
        'u right, v down in the upright photo (EXIF orientation applied); (0, 0) is the outer corner of the top left pixel, whose centre is (0.5, 0.5)',
    },
    photo: { file: `${scene.name}.jpg`, width, height, orientation, stored },
    camera: {
      atMm: camera.at,
      lookAtMm: scene.camera.lookAt,
      rollDegrees: scene.camera.rollDegrees,
      fieldDegrees: scene.camera.fieldDegrees,
      focalPx: round(camera.focal, 4),
      obliquityDegrees: round(obliquityDegrees(camera), 2),
      lensDistortion: 'none',
    },
    tapeRectangleMm: scene.tape,
    marks: marksOf(scene),
    objects: scene.objects.map(({ id, kind, x, y, width: w, height: h, depth }) => ({
      id,
      kind,
      rectMm: { x, y, width: w, height: h },
      depthMm: depth,
    })),
    studs: { spacingMm: scene.studs.spacing, widthMm: scene.studs.width, at: studsOf(scene) },
  };
}

for (const scene of SCENES) {
  const camera = pinholeOf(scene.camera, scene.photo);
  const beside = (ending: string): URL => new URL(`${scene.name}.${ending}`, import.meta.url);
  writeFileSync(beside('inc'), includeFile(scene, camera));
  writeFileSync(beside('json'), `${JSON.stringify(geometryOf(scene, camera), null, 2)}\n`);
}
