import { useMutation, useQuery } from '@tanstack/react-query';
import { useRef, useState } from 'react';
import { templatesApi } from '../../../shared/templates/templates.api.ts';
import { Button } from '../../components/button.tsx';
import { ErrorState } from '../../components/error-state.tsx';
import { ProgressBar } from '../../components/progress-bar.tsx';
import { addressOf, call } from '../../lib/call.ts';
import { newId } from '../../lib/new-id.ts';
import { templateProgressQuery, type TemplateWish } from './templates.queries.ts';

interface Props {
  layout: { id: string; name: string; letter: string };
  /** What to make; null while a choice cannot be read. */
  wish: TemplateWish | null;
  ready: () => Promise<unknown>;
  onClose: () => void;
}

/** Makes the file, tells how far it has come, and hands it over. */
export function MakePanel({ layout, wish, ready, onClose }: Props) {
  const [ticket, setTicket] = useState<string | null>(null);
  const [made, setMade] = useState<string | null>(null);
  const cancel = useRef<AbortController | null>(null);
  const make = useMutation({
    mutationFn: async () => {
      await ready();
      cancel.current = new AbortController();
      const mine = newId();
      setTicket(mine);
      return (await call(templatesApi.pdf, { params: { layoutId: layout.id }, query: { ...wish!, ticket: mine }, signal: cancel.current.signal })) as Blob;
    },
    onSuccess: (pdf) => {
      if (made) URL.revokeObjectURL(made);
      const address = URL.createObjectURL(pdf);
      setMade(address);
      download(address, `${layout.name} ${layout.letter} template.pdf`);
    },
    onSettled: () => setTicket(null),
  });
  const progress = useQuery(templateProgressQuery(layout.id, ticket)).data;
  const called = make.error instanceof DOMException && make.error.name === 'AbortError';
  const other = (output: 'dxf' | 'svg') => addressOf(templatesApi[output], { params: { layoutId: layout.id }, query: wish ?? {} });

  return (
    <div className="grid gap-3 border-t border-plaster-200 pt-4">
      {make.error && !called ? <ErrorState error={make.error} onRetry={() => make.mutate()} /> : null}
      {called ? <p role="status">Called off: nothing was made.</p> : null}
      {make.isPending ? (
        <ProgressBar label={progress && progress.pages > 0 ? `Drawing page ${Math.min(progress.drawn + 1, progress.pages)} of ${progress.pages}` : 'Laying out the sheets'} share={progress && progress.pages > 0 ? progress.drawn / progress.pages : null} />
      ) : null}
      {make.isSuccess && made ? (
        <p role="status">
          The template is in your downloads.{' '}
          <a href={made} target="_blank" rel="noreferrer" className="text-chalk-600 underline">
            Open it to print
          </a>
          {' '}at actual size (100 %), not fitted to the page.
        </p>
      ) : null}
      <div className="flex flex-wrap items-center justify-end gap-3">
        {wish ? (
          <p className="mr-auto text-sm text-ink-700">
            For a cutter or plotter, the wall whole:{' '}
            <a href={other('dxf')} download className="inline-block py-1 text-chalk-600 underline">
              DXF
            </a>
            ,{' '}
            <a href={other('svg')} download className="inline-block py-1 text-chalk-600 underline">
              SVG
            </a>
          </p>
        ) : null}
        {make.isPending ? <Button onClick={() => cancel.current?.abort()}>Call it off</Button> : <Button onClick={onClose}>Close</Button>}
        <Button weight="primary" busy={make.isPending} disabled={!wish} onClick={() => make.mutate()}>
          Make the template
        </Button>
      </div>
    </div>
  );
}

/** Gives a file to the browser's downloads. */
function download(address: string, name: string): void {
  const link = document.createElement('a');
  link.href = address;
  link.download = name;
  link.click();
}
