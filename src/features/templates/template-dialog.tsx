import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import { type Paper, paperName, papers } from '../../../shared/templates/papers.ts';
import { templatesApi } from '../../../shared/templates/templates.api.ts';
import { Button } from '../../components/button.tsx';
import { Actions, Dialog } from '../../components/dialog.tsx';
import { ErrorState } from '../../components/error-state.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { call } from '../../lib/call.ts';
import { useUnits } from '../../lib/units.ts';

interface Props {
  layout: { id: string; name: string; letter: string };
  /** Saves what is unsaved first, so that the paper shows what the wall shows; throws where it could not be saved. */
  ready: () => Promise<unknown>;
  onClose: () => void;
}

/** Makes the hanging template, 1:1, as a PDF to print and tape to the wall. */
export function TemplateDialog({ layout, ready, onClose }: Props) {
  const units = useUnits();
  const [paper, setPaper] = useState<Paper>(units === 'in' ? 'letter' : 'a4');
  const make = useMutation({
    mutationFn: async () => {
      await ready();
      const pdf = (await call(templatesApi.pdf, { params: { layoutId: layout.id }, query: { paper } })) as Blob;
      hand(pdf, `${layout.name} ${layout.letter} template.pdf`);
    },
  });
  return (
    <Dialog open onOpenChange={onClose} title="Hanging template" about="Everything the wall needs at full size: outlines, screw centres, datums and studs.">
      <div className="grid gap-4">
        <SelectField
          label="Paper"
          value={paper}
          onChange={(event) => setPaper(event.target.value as Paper)}
          options={papers.map((value) => ({ value, words: paperName(value) }))}
        />
        <p className="text-sm text-ink-700">
          Print at actual size (100 %), not fitted to the page. Measure the printed bars before you tape anything, and look for cables and pipes before you drill.
        </p>
        {make.error ? <ErrorState error={make.error} onRetry={() => make.mutate()} /> : null}
        {make.isSuccess ? <p role="status">The template is in your downloads.</p> : null}
      </div>
      <Actions>
        <Button onClick={onClose}>Close</Button>
        <Button weight="primary" busy={make.isPending} onClick={() => make.mutate()}>
          Make the template
        </Button>
      </Actions>
    </Dialog>
  );
}

/** Gives a file to the browser's downloads. */
function hand(file: Blob, name: string): void {
  const url = URL.createObjectURL(file);
  const link = document.createElement('a');
  link.href = url;
  link.download = name;
  link.click();
  setTimeout(() => URL.revokeObjectURL(url), 60_000);
}
