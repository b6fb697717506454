import { bevelFigure, longPointFigure, shortPointFigure, lipFigure } from '../../../shared/patterns/frame-figures.ts';
import { frameGeometry } from '../../../shared/patterns/frame.ts';
import { massFigure } from '../../../shared/patterns/mass.ts';
import type { PatternDesign } from '../../../shared/patterns/pattern.ts';
import { formatFigure, type Figure } from '../../../shared/units/figure.ts';
import { FigureText } from '../../components/figure-text.tsx';
import { LengthText } from '../../components/length-text.tsx';
import { WeightMark } from '../../components/weight-mark.tsx';
import { useUnits } from '../../lib/units.ts';

/** Beyond this tilt most table and miter saws do not go (common practice). */
const usualTiltRad = Math.PI / 4;

/** What the bench needs of a pattern: bevels, long and short points, mass. Each can be opened. */
export function PatternFacts({ design }: { design: PatternDesign }) {
  const units = useUnits();
  const frame = frameGeometry(design);
  const lip = lipFigure(frame);
  const steep = frame.steepestBevelRad > usualTiltRad + 1e-9;
  return (
    <div>
      <p className="mb-1 text-sm text-ink-700">
        <LengthText mm={frame.widthMm} /> wide, <LengthText mm={frame.heightMm} /> high over all
      </p>
      {unlike(frame.corners.map((_, i) => bevelFigure(frame, i)), units).map((figure) => (
        <FigureText key={figure.label} figure={figure} />
      ))}
      {unlike(frame.members.map((_, i) => longPointFigure(frame, i)), units).map((figure) => (
        <FigureText key={figure.label} figure={figure} />
      ))}
      {unlike(frame.members.map((_, i) => shortPointFigure(frame, i)), units).map((figure) => (
        <FigureText key={figure.label} figure={figure} />
      ))}
      {lip ? <FigureText figure={lip} /> : null}
      <FigureText figure={massFigure(design)} />
      {steep ? (
        <p className="mt-2 text-sm">
          <WeightMark weight="caution" /> A bevel of more than 45° is beyond the tilt of most saws. Cut it against a jig made for it, with the guard in place.
        </p>
      ) : null}
    </div>
  );
}

/** One figure for each value that reads unlike the others. */
function unlike(figures: readonly Figure[], units: 'in' | 'mm'): Figure[] {
  const seen = new Set<string>();
  return figures.filter((figure) => {
    const text = formatFigure(figure, units);
    if (seen.has(text)) return false;
    seen.add(text);
    return true;
  });
}
