import { Button } from '../../components/button.tsx';
import { CornerFields } from './corner-fields.tsx';
import type { Deed } from './use-wall-draft.ts';
import type { Corner, DraftErrors, WallDraft } from './wall-draft.ts';

interface Props {
  draft: WallDraft;
  errors: DraftErrors;
  onChange: (part: Pick<WallDraft, 'outline'>, deed?: Deed) => void;
}

/** The wall's outline where it is no upright rectangle: under a sloped ceiling, beside a stair. */
export function OutlineFields({ draft, errors, onChange }: Props) {
  const { widthMm, heightMm, outline } = draft;
  if (outline) {
    return (
      <div className="grid gap-3">
        <CornerFields of="the wall" corners={outline} errors={errors} path="outline" onChange={(corners) => onChange({ outline: corners })} />
        <div>
          <Button small onClick={() => onChange({ outline: null }, { words: 'Wall made a rectangle again' })}>
            Make it a rectangle again
          </Button>
        </div>
      </div>
    );
  }
  const ready = widthMm !== null && heightMm !== null && widthMm > 0 && heightMm > 0;
  const slope = (low: 'left' | 'right') => {
    const [w, h] = [widthMm ?? 0, heightMm ?? 0];
    const knee = Math.round(h / 2);
    const half = Math.round(w / 2);
    // A knee wall of half the height, and the slope up to the middle: to be set right in the table.
    const corners: Corner[] = low === 'left'
      ? [{ xMm: 0, yMm: 0 }, { xMm: w, yMm: 0 }, { xMm: w, yMm: h }, { xMm: half, yMm: h }, { xMm: 0, yMm: knee }]
      : [{ xMm: 0, yMm: 0 }, { xMm: w, yMm: 0 }, { xMm: w, yMm: knee }, { xMm: half, yMm: h }, { xMm: 0, yMm: h }];
    onChange({ outline: corners }, { words: `Ceiling sloped to the ${low}` });
  };
  return (
    <div className="grid gap-2">
      <p className="text-sm text-ink-700">The ceiling is level and the wall a rectangle. Where the ceiling slopes, begin with a slope and set its corners right.</p>
      <div className="flex flex-wrap gap-2">
        <Button small disabled={!ready} onClick={() => slope('left')}>Slopes down to the left</Button>
        <Button small disabled={!ready} onClick={() => slope('right')}>Slopes down to the right</Button>
      </div>
    </div>
  );
}
