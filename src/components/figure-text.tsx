import { type Figure, formatFigure } from '../../shared/units/figure.ts';
import { useUnits } from '../lib/units.ts';

/** A figure that can be opened to show what went into it, by which formula, and where that stands. */
export function FigureText({ figure }: { figure: Figure }) {
  const units = useUnits();
  return (
    <details className="border-b border-plaster-200">
      <summary className="flex min-h-8 cursor-pointer items-center justify-between gap-3 py-1 hover:text-chalk-700">
        <span className="underline decoration-dotted underline-offset-4">{figure.label}</span>
        <span className="font-semibold tabular-nums">{formatFigure(figure, units)}</span>
      </summary>
      <div className="mb-2 border-l-4 border-plaster-200 pl-3 text-sm text-ink-700">
        {figure.inputs.length > 0 ? (
          <dl>
            {figure.inputs.map((input) => (
              <div key={input.label} className="flex flex-wrap justify-between gap-x-3">
                <dt>{input.label}</dt>
                <dd className="tabular-nums">{formatFigure(input, units)}</dd>
                {input.note ? <dd className="basis-full text-xs text-ink-500">{input.note}</dd> : null}
              </div>
            ))}
          </dl>
        ) : null}
        <p className="mt-1">Formula: {figure.formula}</p>
        <p>Source: {figure.source}</p>
      </div>
    </details>
  );
}
