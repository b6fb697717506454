import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { toast } from 'sonner';
import type { Pattern } from '../../shared/patterns/pattern.ts';
import { Button } from '../components/button.tsx';
import { CheckField } from '../components/check-field.tsx';
import { EmptyState } from '../components/empty-state.tsx';
import { ErrorState } from '../components/error-state.tsx';
import { Loading } from '../components/loading.tsx';
import { Page } from '../components/page.tsx';
import { TitleBlock } from '../components/title-block.tsx';
import { PatternDrawing } from '../features/drawing/pattern-drawing.tsx';
import { hardwareQuery } from '../features/hardware/hardware.queries.ts';
import { PatternDialog } from '../features/patterns/pattern-dialog.tsx';
import { PatternList } from '../features/patterns/pattern-list.tsx';
import { patternsQuery, useChangePattern } from '../features/patterns/patterns.queries.ts';
import { isCallError } from '../lib/call-error.ts';
import { usePageTitle } from '../lib/page-title.ts';
import { useMay } from '../lib/session.ts';

export function PatternsPage() {
  usePageTitle('Pattern book');
  const mayChange = useMay('change patterns');
  const patterns = useQuery(patternsQuery);
  const book = useQuery({ ...hardwareQuery, enabled: mayChange }).data ?? null;
  const change = useChangePattern();
  const [editing, setEditing] = useState<Pattern | 'new' | null>(null);
  const [archived, setArchived] = useState(false);
  const shown = (patterns.data ?? []).filter((pattern) => archived || !pattern.archived);
  const away = (patterns.data ?? []).filter((pattern) => pattern.archived).length;

  const archive = (pattern: Pattern) =>
    change.mutate(
      { patternId: pattern.id, name: pattern.name, design: pattern.design, version: pattern.version, archived: !pattern.archived },
      {
        onSuccess: () => toast.success(pattern.archived ? `${pattern.name} is back in the book` : `${pattern.name} is put away`),
        onError: (error) => toast.error(isCallError(error) ? error.problem.title : 'The pattern was not changed', { description: isCallError(error) ? error.problem.detail : undefined }),
      },
    );

  return (
    <Page>
      <TitleBlock
        title="Pattern book"
        cells={patterns.data ? [{ label: 'Patterns', value: patterns.data.length - away }] : []}
        action={
          mayChange ? (
            <Button weight="primary" onClick={() => setEditing('new')}>
              New pattern
            </Button>
          ) : undefined
        }
      />
      {patterns.isError && !patterns.data ? <ErrorState error={patterns.error} onRetry={() => void patterns.refetch()} /> : null}
      {patterns.isPending ? <Loading what="the pattern book" /> : null}
      {patterns.data && shown.length === 0 ? (
        <EmptyState title="The pattern book is empty" action={mayChange ? <Button onClick={() => setEditing('new')}>Make the first pattern</Button> : undefined}>
          A pattern is one frame design: its shape, its boards, and where its hangers sit. Layouts place patterns on walls.
        </EmptyState>
      ) : null}
      {away > 0 ? <CheckField label={`Show what is put away (${away})`} checked={archived} onChange={(event) => setArchived(event.target.checked)} /> : null}
      <PatternList
        patterns={shown}
        draw={(pattern) => <PatternDrawing design={pattern.design} label={`Drawing of ${pattern.name}`} className="size-full" />}
        onChange={mayChange ? setEditing : null}
        onArchive={mayChange ? archive : null}
      />
      {editing ? (
        <PatternDialog
          pattern={editing === 'new' ? null : editing}
          draw={(design) => <PatternDrawing design={design} memberNumbers label="Drawing of the pattern" className="aspect-square w-full max-md:max-h-56" />}
          book={book}
          onClose={() => setEditing(null)}
        />
      ) : null}
    </Page>
  );
}
