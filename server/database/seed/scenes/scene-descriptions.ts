/**
 * The invented rooms of the demo photographs: walls, cameras, marks and what stands on or against each wall.
 * Lengths in mm in the wall frame (origin lower left at finished floor, x right, y up).
 */
import type { CameraDescription, PhotoSize, Point2 } from './scene-camera.ts';

export type WallObjectKind = 'door' | 'window' | 'outlet' | 'switch' | 'vent' | 'trim' | 'furniture';

export interface WallObject {
  /** Also the prefix of the names the scene file uses: `bench` gives Bench_Left, Bench_Right and so on. */
  readonly id: string;
  readonly kind: WallObjectKind;
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
  /** How far it stands out from the wall. */
  readonly depth: number;
}

export interface ScenePhoto extends PhotoSize {
  /** EXIF orientation of the stored photo; width and height above are those of the upright photo. */
  readonly orientation: 1 | 6;
  /** Camera make, model and place to write into the stored photo. */
  readonly taggedAs?: { make: string; model: string; latitude: string; longitude: string };
}

export interface SceneDescription {
  readonly name: string;
  readonly title: string;
  readonly wall: { readonly width: number; readonly height: number };
  readonly photo: ScenePhoto;
  readonly camera: CameraDescription;
  /** The rectangle a measurer taped on the wall. */
  readonly tape: { x: number; y: number; width: number; height: number };
  /** Centres of checker targets, for proving the straightening. */
  readonly targets: readonly Point2[];
  readonly objects: readonly WallObject[];
  readonly studs: { spacing: number; width: number; first: number };
}

const LANDSCAPE: ScenePhoto = { width: 4000, height: 3000, orientation: 1 };
/** A wide phone lens, the equivalent of about 27 mm on a 36 mm frame. */
const PHONE_FIELD = 67;
/** 16 in on centre, 2x lumber (1 1/2 in thick). */
const SIXTEEN_INCH = { spacing: 406.4, width: 38.1 };

const ROW_OFFSETS = [0, 23, -31, 17, -12] as const;
const CALIBRATION_TARGETS: Point2[] = ROW_OFFSETS.flatMap((offset, row) =>
  [0, 1, 2, 3, 4].map((column): Point2 => [100 + 700 * column + offset, 200 + 500 * row + 9 * column]),
);

export const SCENES: readonly SceneDescription[] = [
  {
    name: 'stairwell-hall',
    title: 'Hall at the foot of a stair',
    wall: { width: 3600, height: 2600 },
    photo: LANDSCAPE,
    camera: { at: [1250, 1480, 3650], lookAt: [2060, 1270, 0], rollDegrees: 1.1, fieldDegrees: PHONE_FIELD },
    tape: { x: 1400, y: 900, width: 1900, height: 1300 },
    targets: [],
    objects: [
      { id: 'door', kind: 'door', x: 180, y: 0, width: 900, height: 2110, depth: 18 },
      { id: 'switch', kind: 'switch', x: 1150, y: 1090, width: 70, height: 114, depth: 6 },
      { id: 'outlet', kind: 'outlet', x: 3252, y: 248, width: 70, height: 114, depth: 6 },
      { id: 'skirting', kind: 'trim', x: 1080, y: 0, width: 2520, height: 120, depth: 15 },
      { id: 'bench', kind: 'furniture', x: 1560, y: 0, width: 1200, height: 450, depth: 380 },
    ],
    studs: { ...SIXTEEN_INCH, first: 387.4 },
  },
  {
    name: 'reading-room',
    title: 'Reading room with a sideboard',
    wall: { width: 4200, height: 2700 },
    photo: LANDSCAPE,
    camera: { at: [3230, 1530, 3950], lookAt: [2130, 1310, 0], rollDegrees: -1.6, fieldDegrees: PHONE_FIELD },
    tape: { x: 1500, y: 1150, width: 2200, height: 1200 },
    targets: [],
    objects: [
      { id: 'window', kind: 'window', x: 260, y: 820, width: 960, height: 1420, depth: 60 },
      { id: 'outlet', kind: 'outlet', x: 3677, y: 255, width: 70, height: 114, depth: 6 },
      { id: 'skirting', kind: 'trim', x: 0, y: 0, width: 4200, height: 140, depth: 16 },
      { id: 'sideboard', kind: 'furniture', x: 1640, y: 0, width: 1800, height: 760, depth: 450 },
    ],
    studs: { ...SIXTEEN_INCH, first: 406.4 },
  },
  {
    name: 'cafe-counter',
    title: 'Counter along a café wall',
    wall: { width: 5000, height: 2800 },
    photo: {
      ...LANDSCAPE,
      orientation: 6,
      taggedAs: {
        make: 'Invented Camera',
        model: 'Plumb One',
        latitude: '41/1 30/1 0/1',
        longitude: '32/1 15/1 0/1',
      },
    },
    camera: { at: [1230, 1560, 4550], lookAt: [2560, 1400, 0], rollDegrees: 0.8, fieldDegrees: PHONE_FIELD },
    tape: { x: 550, y: 1420, width: 2800, height: 1050 },
    targets: [],
    objects: [
      { id: 'door', kind: 'door', x: 3990, y: 0, width: 900, height: 2110, depth: 18 },
      { id: 'switch', kind: 'switch', x: 3840, y: 1090, width: 70, height: 114, depth: 6 },
      { id: 'outlet', kind: 'outlet', x: 1093, y: 1080, width: 114, height: 70, depth: 12 },
      { id: 'second-outlet', kind: 'outlet', x: 2857, y: 1080, width: 114, height: 70, depth: 12 },
      { id: 'vent', kind: 'vent', x: 4280, y: 2460, width: 360, height: 160, depth: 10 },
      { id: 'tiles', kind: 'trim', x: 300, y: 950, width: 3300, height: 310, depth: 6 },
      { id: 'skirting', kind: 'trim', x: 0, y: 0, width: 3990, height: 120, depth: 15 },
      { id: 'counter', kind: 'furniture', x: 300, y: 0, width: 3300, height: 950, depth: 600 },
    ],
    studs: { ...SIXTEEN_INCH, first: 406.4 },
  },
  {
    name: 'calibration-wall',
    title: 'Bare wall with checker targets',
    wall: { width: 3000, height: 2400 },
    photo: LANDSCAPE,
    camera: { at: [2550, 1450, 2780], lookAt: [1540, 1200, 0], rollDegrees: 1.4, fieldDegrees: PHONE_FIELD },
    tape: { x: 300, y: 450, width: 2400, height: 1500 },
    targets: CALIBRATION_TARGETS,
    objects: [
      { id: 'skirting', kind: 'trim', x: 0, y: 0, width: 3000, height: 90, depth: 12 },
      { id: 'outlet', kind: 'outlet', x: 1130, y: 258, width: 70, height: 114, depth: 6 },
    ],
    studs: { ...SIXTEEN_INCH, first: 406.4 },
  },
];

/** The scene of the given name. Throws when there is none. */
export function sceneNamed(name: string | undefined): SceneDescription {
  const scene = SCENES.find((candidate) => candidate.name === name);
  if (!scene) throw new Error(`No scene named "${name}". Known: ${SCENES.map((s) => s.name).join(', ')}.`);
  return scene;
}
