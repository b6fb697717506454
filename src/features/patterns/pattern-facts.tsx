import { patternChecks } from '../../../shared/findings/pattern-checks.ts';
import { usualLimits } from '../../../shared/findings/scene.ts';
import type { HardwareBook } from '../../../shared/hardware/hardware-book.ts';
import { bevelFigure, bevelFromEdgeFigure, grooveFigures, lipFigure, longPointFigure, shortPointFigure } from '../../../shared/patterns/frame-figures.ts';
import { frameGeometry } from '../../../shared/patterns/frame.ts';
import { massFigure } from '../../../shared/patterns/mass.ts';
import type { PatternDesign } from '../../../shared/patterns/pattern.ts';
import { formatFigure, type Figure } from '../../../shared/units/figure.ts';
import { FigureText } from '../../components/figure-text.tsx';
import { LengthText } from '../../components/length-text.tsx';
import { WeightMark } from '../../components/weight-mark.tsx';
import { useUnits } from '../../lib/units.ts';
import { MovementFacts } from './movement-facts.tsx';

const noBook: HardwareBook = { screws: [], brackets: [], anchors: [] };

/** What the bench needs of a pattern, as it is drawn up: bevels both ways, long and short points, groove, mass, movement, and what the checks say. */
export function PatternFacts({ design, book }: { design: PatternDesign; book: HardwareBook | null }) {
  const units = useUnits();
  const frame = frameGeometry(design);
  const lip = lipFigure(frame);
  const checks = patternChecks({ id: 'pattern', name: 'this pattern', design }, { book: book ?? noBook, limits: { ...usualLimits, units } });
  return (
    <div>
      <p className="mb-1 text-sm text-ink-700">
        <LengthText mm={frame.widthMm} /> wide, <LengthText mm={frame.heightMm} /> high over all
      </p>
      {checks.length > 0 ? (
        <ul aria-label="What the checks say" className="mb-2 grid gap-1 text-sm">
          {checks.map(({ id, weight, title, words }) => (
            <li key={id}>
              <WeightMark weight={weight} /> <span className="font-semibold">{title}.</span> {words}
            </li>
          ))}
        </ul>
      ) : null}
      <Unlike figures={frame.corners.map((_, i) => bevelFigure(frame, i))} />
      <Unlike figures={frame.corners.map((_, i) => bevelFromEdgeFigure(frame, i))} />
      <Unlike figures={frame.members.map((_, i) => longPointFigure(frame, i))} />
      <Unlike figures={frame.members.map((_, i) => shortPointFigure(frame, i))} />
      {lip ? <FigureText figure={lip} /> : null}
      {grooveFigures(frame).map((figure) => (
        <FigureText key={figure.label} figure={figure} />
      ))}
      <FigureText figure={massFigure(design)} />
      <MovementFacts design={design} />
    </div>
  );
}

/** One figure for each value that reads unlike the others. */
function Unlike({ figures }: { figures: readonly Figure[] }) {
  const units = useUnits();
  const seen = new Set<string>();
  return figures
    .filter((figure) => {
      const text = formatFigure(figure, units);
      if (seen.has(text)) return false;
      seen.add(text);
      return true;
    })
    .map((figure) => <FigureText key={figure.label} figure={figure} />);
}
