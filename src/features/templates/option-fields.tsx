import { isRoll, papers, paperName, type Paper } from '../../../shared/templates/papers.ts';
import { LengthField } from '../../components/length-field.tsx';
import { SelectField } from '../../components/select-field.tsx';
import type { Choices } from './choices.ts';

interface Props {
  choices: Choices;
  onChange: (change: Partial<Choices>) => void;
  frames: readonly { id: string; label: string }[];
  /** Words of the server for a field, by its name. */
  errors: Record<string, string>;
}

/** What is printed, and on what. */
export function OptionFields({ choices, onChange, frames, errors }: Props) {
  return (
    <div className="grid gap-4 sm:grid-cols-2 lg:grid-cols-1 xl:grid-cols-2">
      <SelectField
        label="Paper"
        value={choices.paper}
        onChange={(event) => onChange({ paper: event.target.value as Paper })}
        options={papers.map((value) => ({ value, words: paperName(value) }))}
      />
      <SelectField
        label="What to print"
        value={choices.kind}
        error={errors.kind}
        onChange={(event) => onChange({ kind: event.target.value as Choices['kind'] })}
        options={[
          { value: 'full', words: 'The full template' },
          { value: 'screws', words: 'Screws only' },
          { value: 'frames', words: 'One frame at a time' },
          { value: 'story stick', words: 'Story stick' },
        ]}
      />
      {choices.paper === 'roll' ? <LengthField label="Width of the roll" value={choices.rollWidthMm} error={errors.rollWidthMm} onChange={(rollWidthMm) => onChange({ rollWidthMm })} /> : null}
      {isRoll(choices.paper) ? (
        <SelectField
          label="Past 5.08 m (14,400 units)"
          value={choices.longPages}
          onChange={(event) => onChange({ longPages: event.target.value as Choices['longPages'] })}
          options={[{ value: 'split', words: 'Split into pieces' }, { value: 'user unit', words: 'One page with UserUnit' }]}
        />
      ) : null}
      <SelectField
        label="Joins"
        value={choices.join}
        onChange={(event) => onChange({ join: event.target.value as Choices['join'] })}
        options={[{ value: 'overlap', words: 'Overlap' }, { value: 'butt', words: 'Butt, edge to edge' }]}
      />
      {choices.join === 'overlap' ? <LengthField label="Overlap at least" value={choices.overlapMm} error={errors.overlapMm} onChange={(overlapMm) => onChange({ overlapMm })} /> : null}
      <LengthField label="Printer’s margin" value={choices.marginMm} error={errors.marginMm} onChange={(marginMm) => onChange({ marginMm })} />
      <SelectField
        label="Sheets turned"
        value={choices.orientation}
        onChange={(event) => onChange({ orientation: event.target.value as Choices['orientation'] })}
        options={[{ value: 'fewest', words: 'As takes fewest' }, { value: 'portrait', words: 'Upright' }, { value: 'landscape', words: 'Lying' }]}
      />
      <SelectField
        label="Ink"
        value={choices.colours}
        onChange={(event) => onChange({ colours: event.target.value as Choices['colours'] })}
        options={[{ value: 'colour', words: 'Colour' }, { value: 'black', words: 'Plain black' }]}
      />
      <SelectField
        label="Hang first"
        value={choices.firstFrameId}
        error={errors.firstFrameId}
        onChange={(event) => onChange({ firstFrameId: event.target.value })}
        options={[{ value: '', words: 'From the bottom up' }, ...frames.map(({ id, label }) => ({ value: id, words: `Frame ${label}` }))]}
      />
    </div>
  );
}
