import type { ReactNode } from 'react';
import { bevelWords } from './pattern-words.ts';
import { shapeWords } from '../../../shared/patterns/shape-words.ts';
import type { Pattern } from '../../../shared/patterns/pattern.ts';
import { Button } from '../../components/button.tsx';
import { LengthText } from '../../components/length-text.tsx';
import { useUnits } from '../../lib/units.ts';

interface Props {
  patterns: readonly Pattern[];
  draw: (pattern: Pattern) => ReactNode;
  /** Null where the reader may not change patterns. */
  onChange: ((pattern: Pattern) => void) | null;
  onArchive: ((pattern: Pattern) => void) | null;
}

/** The pattern book: each design with its drawing. */
export function PatternList({ patterns, draw, onChange, onArchive }: Props) {
  const units = useUnits();
  return (
    <ul className="grid gap-4 sm:grid-cols-2 lg:grid-cols-3 xl:grid-cols-4">
      {patterns.map((pattern) => (
        <li key={pattern.id} className="flex flex-col border border-plaster-200 bg-white">
          <div className="flex h-52 items-center justify-center border-b border-plaster-200 bg-plaster-50 p-4">{draw(pattern)}</div>
          <div className="flex grow flex-col px-4 py-3">
            <h2 className="font-bold break-words">{pattern.name}</h2>
            <p className="text-sm text-ink-700 first-letter:uppercase">{shapeWords(pattern.design.shape, units)}</p>
            <p className="text-sm text-ink-700 first-letter:uppercase">
              {pattern.design.species}, <LengthText mm={pattern.design.thicknessMm} /> thick, <LengthText mm={pattern.design.depthMm} /> deep
            </p>
            <p className="text-sm text-ink-700">
              {bevelWords(pattern.design)}, {pattern.design.hangers.length === 1 ? '1 hanger' : `${pattern.design.hangers.length} hangers`}
            </p>
            {onChange && onArchive ? (
              <div className="mt-auto flex gap-2 pt-3">
                <Button small aria-label={`Change ${pattern.name}`} onClick={() => onChange(pattern)}>
                  Change
                </Button>
                <Button small weight="quiet" aria-label={pattern.archived ? `Put ${pattern.name} back in the book` : `Put ${pattern.name} away`} onClick={() => onArchive(pattern)}>
                  {pattern.archived ? 'Put back' : 'Put away'}
                </Button>
              </div>
            ) : null}
          </div>
        </li>
      ))}
    </ul>
  );
}
