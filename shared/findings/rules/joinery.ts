import { bevelFigure, lipFigure, shortPointFigure } from '../../patterns/frame-figures.ts';
import { frameGeometry, type FrameGeometry } from '../../patterns/frame.ts';
import type { PatternDesign } from '../../patterns/pattern.ts';
import { formatAngle } from '../../units/angle.ts';
import { formatLength } from '../../units/length.ts';
import { tidyNumber } from '../../units/number-text.ts';
import type { PatternRule } from '../rule.ts';

const geometries = new WeakMap<PatternDesign, FrameGeometry>();

function geometryOf(design: PatternDesign): FrameGeometry {
  let geometry = geometries.get(design);
  if (!geometry) geometries.set(design, (geometry = frameGeometry(design)));
  return geometry;
}

/** A groove may take this share of the thickness without a word, and this at the most (common practice). */
export const grooveShare = { caution: 0.4, stop: 0.5 } as const;

export const grooveTooWide: PatternRule = {
  id: 'groove too wide',
  of: 'pattern',
  title: 'Groove too wide for its thickness',
  source: 'Common practice: a groove over 2/5 of the thickness weakens the lip; over half starves the hanger holes',
  check({ id, name, design }) {
    const groove = geometryOf(design).groove;
    if (!groove || groove.shareOfThickness <= grooveShare.caution + 1e-9) return [];
    const stop = groove.shareOfThickness > grooveShare.stop + 1e-9;
    const lip = lipFigure(geometryOf(design));
    return [{
      about: id, weight: stop ? 'stop' : 'caution',
      words: `The groove of ${name} takes ${tidyNumber(groove.shareOfThickness * 100, 0)} % of the thickness${stop ? '; not enough is left to hang by' : ''}.`,
      figures: lip ? [lip] : [],
    }];
  },
};

export const lipTooSmall: PatternRule = {
  id: 'lip too small',
  of: 'pattern',
  title: 'Lip too small for the bracket',
  source: 'Common practice: lip ≥ hole diameter + 2 × the wood left beside the hole',
  check({ id, name, design }, { book, limits }) {
    const lipMm = geometryOf(design).groove?.lipMm ?? design.thicknessMm;
    return design.hangers.flatMap((hanger) => {
      const bracket = book.brackets.find((b) => b.id === hanger.bracketId);
      const screw = book.screws.find((s) => s.id === bracket?.frameScrewId);
      if (!screw) return [];
      const needMm = screw.diameterMm + 2 * limits.holeEdgeMm;
      if (lipMm >= needMm - 1e-9) return [];
      return [{
        about: `${id}/${hanger.id}`, weight: 'stop' as const,
        words: `The lip of ${name} is ${formatLength(lipMm, limits.units)}; the bracket’s screw needs ${formatLength(needMm, limits.units)}.`,
        figures: [{ label: 'Lip needed', value: needMm, unit: 'mm' as const, inputs: [{ label: 'Screw diameter', value: screw.diameterMm, unit: 'mm' as const }, { label: 'Wood beside the hole', value: limits.holeEdgeMm, unit: 'mm' as const }, { label: 'Lip', value: lipMm, unit: 'mm' as const }], formula: 'diameter + 2 × wood beside the hole', source: 'Common practice' }],
      }];
    });
  },
};

export const grooveTooShallow: PatternRule = {
  id: 'groove too shallow',
  of: 'pattern',
  title: 'Groove too shallow for its panels',
  source: 'Geometry: mirror and backer must lie within the groove',
  check({ id, name, design }, { limits }) {
    const groove = geometryOf(design).groove;
    if (!groove || !design.groove || groove.spareDepthMm >= -1e-9) return [];
    return [{
      about: id, weight: 'stop',
      words: `Mirror and backer of ${name} stand ${formatLength(-groove.spareDepthMm, limits.units)} proud of the back.`,
      figures: [{ label: 'Depth to spare', value: groove.spareDepthMm, unit: 'mm', inputs: [{ label: 'Groove depth', value: groove.depthMm, unit: 'mm' }, { label: 'Mirror', value: design.groove.mirrorMm, unit: 'mm' }, { label: 'Backer', value: design.groove.backerMm, unit: 'mm' }], formula: 'groove depth − mirror − backer', source: 'Geometry' }],
    }];
  },
};

export const bevelBeyondSaw: PatternRule = {
  id: 'bevel beyond the saw',
  of: 'pattern',
  title: 'Bevel beyond the saw’s tilt',
  source: 'Common practice: most saws tilt to 45°; a steeper bevel is cut against an upright fence or a jig. Keep hands clear of the blade',
  check({ id, name, design }, { limits }) {
    const frame = geometryOf(design);
    if (frame.steepestBevelRad <= limits.sawTiltRad + 1e-9) return [];
    const corner = frame.corners.reduce((a, b) => (b.bevelRad > a.bevelRad ? b : a));
    return [{
      about: id, weight: 'caution',
      words: `${name} has a bevel of ${formatAngle(frame.steepestBevelRad)} from square; your saw tilts to ${formatAngle(limits.sawTiltRad)}.`,
      figures: [bevelFigure(frame, corner.index)],
    }];
  },
};

export const noInnerFace: PatternRule = {
  id: 'no inner face',
  of: 'pattern',
  title: 'A member has no inner face left',
  source: 'Geometry: long point less both bevels must be more than nothing',
  check({ id, name, design }) {
    const frame = geometryOf(design);
    if (frame.buildable) return [];
    const short = frame.members.reduce((a, b) => (b.shortPointMm < a.shortPointMm ? b : a));
    return [{ about: id, weight: 'stop', words: `${name} cannot be built: member ${short.index + 1} is too thick for its length.`, figures: [shortPointFigure(frame, short.index)] }];
  },
};
