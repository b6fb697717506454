import { LengthField } from '../../components/length-field.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { TextField } from '../../components/text-field.tsx';
import type { DraftErrors, WallDraft } from './wall-draft.ts';
import { constructionWords, holdsInWood, studSpeciesOptions } from '../../../shared/walls/construction.ts';
import { optionsOf } from './wall-words.ts';

interface Props {
  draft: WallDraft;
  errors: DraftErrors;
  onChange: (change: Partial<WallDraft>) => void;
}

/** Name, size and make of the wall. */
export function ShapeFields({ draft, errors, onChange }: Props) {
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <TextField className="sm:col-span-2" label="Name" value={draft.name} error={errors.name} onChange={(e) => onChange({ name: e.target.value })} />
      <LengthField label="Width" value={draft.widthMm} error={errors.widthMm} onChange={(widthMm) => onChange({ widthMm })} />
      <LengthField label="Height" hint="Finished floor to ceiling." value={draft.heightMm} error={errors.heightMm} onChange={(heightMm) => onChange({ heightMm })} />
      <SelectField
        label="Construction"
        value={draft.construction}
        error={errors.construction}
        options={optionsOf(constructionWords)}
        onChange={(e) => onChange({ construction: e.target.value as WallDraft['construction'] })}
      />
      <LengthField label="Covering" hint="Between bracket and stud." value={draft.coveringMm} error={errors.coveringMm} onChange={(coveringMm) => onChange({ coveringMm })} />
      {holdsInWood(draft.construction) ? (
        <SelectField
          className="sm:col-span-2"
          label="Wood of the studs"
          hint="Its species group, as stamped on the lumber. The number is the specific gravity G by NDS-2018; where in doubt take a lower one."
          value={draft.studSpecies}
          error={errors.studSpecies}
          options={studSpeciesOptions}
          onChange={(e) => onChange({ studSpecies: e.target.value as WallDraft['studSpecies'] })}
        />
      ) : null}
    </div>
  );
}
