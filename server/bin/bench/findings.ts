import { createLedger } from '../../../shared/findings/ledger.ts';
import { usualLimits, type Scene } from '../../../shared/findings/scene.ts';
import { standardWoodScrew } from '../../../shared/hardware/screws.ts';
import type { Frame, LayoutPattern } from '../../../shared/layouts/layout.ts';
import { studsBySpacing } from '../../../shared/walls/studs.ts';

const id = (n: number) => `00000000-0000-4000-8000-${String(n).padStart(12, '0')}`;
const side = 120;
const reveal = 4;

/** 200 hexagons, packed as a comb on a wall of 6 × 2.6 m with studs at 16 in. */
function scene(count: number): Scene {
  const screw = { id: id(1), name: '#10 × 3', ...standardWoodScrew('#10', 76.2) };
  const pattern: LayoutPattern = {
    id: id(9), name: 'Comb',
    design: {
      shape: { kind: 'regular', sides: 6, sideMm: side }, thicknessMm: 15, depthMm: 120, species: 'walnut', moisturePercent: 8, contentsKg: null,
      groove: { widthMm: 5, depthMm: 6, clearanceMm: 1, mirrorMm: 3, backerMm: 3 },
      hangers: [-30, 30].map((alongMm, i) => ({ id: `h${i}`, member: 3, alongMm, insetMm: 5, allowanceMm: [-15, 15], bracketId: id(2), wallScrewId: id(1), anchorId: null })),
    },
  };
  const pitchX = side * 1.5 + reveal * Math.cos(Math.PI / 6);
  const pitchY = side * Math.sqrt(3) + reveal;
  const frames = Array.from({ length: count }, (_, i): Frame => {
    const column = i % 25;
    return { id: id(1000 + i), patternId: id(9), xMm: 200 + column * pitchX, yMm: 250 + Math.floor(i / 25) * pitchY + (column % 2) * (pitchY / 2), turnRad: 0, flipped: false, locked: false, label: String(i + 1), contentsKg: null, hungGroup: null };
  });
  return {
    wall: {
      name: 'Bench', widthMm: 6000, heightMm: 2600, construction: 'wood studs', coveringMm: 12.7, studSpecies: 'spruce-pine-fir', zones: [],
      studs: studsBySpacing(200, 406.4, 6000).map((xMm, i) => ({ id: id(100 + i), xMm, widthMm: 38.1, foundBy: 'finder', uncertaintyMm: 6 })),
      obstructions: [{ id: id(50), kind: 'outlet', name: '', clearanceMm: 50, outlineMm: [[3000, 300], [3080, 300], [3080, 380], [3000, 380]] }],
    },
    sheet: { name: 'Bench', revealMm: reveal }, frames, patterns: [pattern], limits: usualLimits, changedSinceSigned: false,
    book: { screws: [screw], brackets: [{ id: id(2), name: 'Plate', steelMm: 2, holeMm: 5.5, wallScrews: 1, frameScrews: 2, frameScrewId: id(1), ratingN: 500, offsetMm: 20 }], anchors: [] },
  };
}

const median = (list: number[]) => [...list].sort((a, b) => a - b)[Math.floor(list.length / 2)] ?? 0;
const worst = (list: number[]) => [...list].sort((a, b) => a - b)[Math.floor(list.length * 0.95)] ?? 0;

/** Processor time since a reading, ms. */
function cpuMs(since: NodeJS.CpuUsage): number {
  const { user, system } = process.cpuUsage(since);
  return (user + system) / 1000;
}

export async function run(): Promise<string[]> {
  const whole = scene(200);
  const startedCold = performance.now();
  createLedger()(whole);
  const cold = performance.now() - startedCold;
  for (let i = 0; i < 10; i++) createLedger()(whole);
  const full: number[] = [];
  const beforeFull = process.cpuUsage();
  for (let i = 0; i < 31; i++) {
    const started = performance.now();
    createLedger()(whole);
    full.push(performance.now() - started);
  }
  const fullCpu = cpuMs(beforeFull) / full.length;
  const ledger = createLedger();
  let found = ledger(whole).findings.length;
  const moves: number[] = [];
  const beforeMoves = process.cpuUsage();
  let frames = whole.frames;
  for (let i = 0; i < 200; i++) {
    const at = (i * 37) % frames.length;
    frames = frames.map((f, j) => (j === at ? { ...f, xMm: f.xMm + (i % 2 ? 1 : -1) } : f));
    const started = performance.now();
    found = ledger({ ...whole, frames }).findings.length;
    moves.push(performance.now() - started);
  }
  const moveCpu = cpuMs(beforeMoves) / moves.length;
  const ratio = median(full) / median(moves);
  return [
    `200 frames, ${found} findings`,
    `after moving one frame: median ${median(moves).toFixed(2)} ms, at best ${Math.min(...moves).toFixed(2)}, p95 ${worst(moves).toFixed(2)} ms (goal 4 ms)`,
    `full pass: median ${median(full).toFixed(1)} ms, at best ${Math.min(...full).toFixed(1)}, the first of all ${cold.toFixed(1)} ms (goal 60 ms); a full pass takes ${ratio.toFixed(1)} times a move`,
    `processor time, mean with garbage collection: ${moveCpu.toFixed(2)} ms a move, ${fullCpu.toFixed(1)} ms a full pass (on a busy machine nearer the work itself than the clock)`,
  ];
}
