import type { ArrangeKind } from '../../../../../shared/findings/arrange/ask.ts';
import { mostArranged } from '../../../../../shared/findings/arrange/ask.ts';
import { Button } from '../../../../components/button.tsx';
import { CheckField } from '../../../../components/check-field.tsx';
import { LengthField } from '../../../../components/length-field.tsx';
import { NumberField } from '../../../../components/number-field.tsx';
import type { ReadyPattern } from '../state/designs.ts';
import { PatternPicture } from '../tray/pattern-picture.tsx';
import { totalOf, type Wanted } from './asked.ts';

const kinds: { kind: ArrangeKind; words: string; about: string }[] = [
  { kind: 'rows', words: 'Rows', about: 'Centred rows or columns; combs nest' },
  { kind: 'ring', words: 'Ring', about: 'Round a centre, closed or with room in the middle' },
  { kind: 'drift', words: 'Drift', about: 'Grown edge to edge, no two seeds alike' },
  { kind: 'fill', words: 'Fill', about: 'As many as a marked area holds' },
];

interface Props {
  wanted: Wanted;
  patterns: readonly ReadyPattern[];
  /** How many hang there that could make room. */
  unlocked: number;
  onChange: (to: Partial<Wanted>) => void;
  onInPlace: (on: boolean) => void;
}

/** What to arrange, how, and where. */
export function WantedFields({ wanted, patterns, unlocked, onChange, onInPlace }: Props) {
  const total = totalOf(wanted.counts);
  return (
    <div className="grid content-start gap-4">
      <fieldset>
        <legend className="mb-1 font-semibold">
          Frames <span className="font-normal text-ink-700 tabular-nums">({total} chosen)</span>
        </legend>
        <ul className="max-h-60 overflow-y-auto border border-plaster-200 bg-white">
          {patterns.map((pattern) => (
            <li key={pattern.id} className="border-b border-plaster-200 last:border-b-0">
              <label className="flex items-center gap-2 px-2 py-1.5 text-sm">
                <PatternPicture pattern={pattern} className="size-8 shrink-0" />
                <span className="min-w-0 grow font-semibold">{pattern.name}</span>
                <input
                  type="number"
                  min={0}
                  max={mostArranged}
                  step={1}
                  value={wanted.counts[pattern.id] ?? 0}
                  onChange={(event) => {
                    const count = Math.max(0, Math.min(mostArranged, Math.round(event.target.valueAsNumber || 0)));
                    onChange({ counts: { ...wanted.counts, [pattern.id]: count } });
                  }}
                  onFocus={(event) => event.target.select()}
                  className="min-h-9 w-18 rounded-sm border border-ink-500 bg-white px-2 text-right tabular-nums"
                />
              </label>
            </li>
          ))}
        </ul>
      </fieldset>
      <fieldset>
        <legend className="mb-1 font-semibold">Kind</legend>
        <div className="grid gap-1">
          {kinds.map(({ kind, words, about }) => (
            <label key={kind} className={`flex cursor-pointer gap-2 border px-2 py-1.5 text-sm ${wanted.kind === kind ? 'border-chalk-600 bg-chalk-100' : 'border-plaster-200 bg-white'}`}>
              <input type="radio" name="arrange-kind" checked={wanted.kind === kind} onChange={() => onChange({ kind })} className="mt-0.5 size-5 shrink-0 accent-chalk-600" />
              <span>
                <span className="font-semibold">{words}</span> <span className="block text-ink-700">{about}</span>
              </span>
            </label>
          ))}
        </div>
      </fieldset>
      {wanted.kind === 'fill' ? (
        <div className="grid grid-cols-2 gap-3">
          <LengthField label="Area’s left" value={wanted.left} onChange={(left) => onChange({ left })} />
          <LengthField label="Area’s right" value={wanted.right} onChange={(right) => onChange({ right })} />
          <LengthField label="Foot above floor" value={wanted.bottom} onChange={(bottom) => onChange({ bottom })} />
          <LengthField label="Top above floor" value={wanted.top} onChange={(top) => onChange({ top })} />
        </div>
      ) : (
        <div className="grid grid-cols-2 gap-3">
          <LengthField label="Middle from left" value={wanted.centreX} onChange={(centreX) => onChange({ centreX })} />
          <LengthField label="Middle above floor" value={wanted.centreY} onChange={(centreY) => onChange({ centreY })} />
        </div>
      )}
      <div className="grid gap-2 text-sm">
        <CheckField label="Frames may be turned" checked={wanted.mayTurn} onChange={(event) => onChange({ mayTurn: event.target.checked })} />
        {unlocked > 0 ? (
          <CheckField
            label={`In place of the ${unlocked === 1 ? 'frame' : `${unlocked} frames`} not locked: they are taken off, with what was written of them`}
            checked={wanted.inPlace}
            onChange={(event) => onInPlace(event.target.checked)}
          />
        ) : null}
      </div>
      <div className="flex items-end gap-2">
        <NumberField label="Seed" className="w-28" value={wanted.seed} onChange={(seed) => onChange({ seed })} />
        <Button onClick={() => onChange({ seed: (Number.isInteger(wanted.seed) ? wanted.seed! : 0) + 1 })}>Another seed</Button>
      </div>
    </div>
  );
}
