import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { toast } from 'sonner';
import type { Anchor } from '../../shared/hardware/anchors.ts';
import type { Bracket } from '../../shared/hardware/brackets.ts';
import type { HardwareBook } from '../../shared/hardware/hardware-book.ts';
import type { Screw } from '../../shared/hardware/screws.ts';
import type { Pattern } from '../../shared/patterns/pattern.ts';
import { Button } from '../components/button.tsx';
import { ConfirmDialog } from '../components/confirm-dialog.tsx';
import { EmptyState } from '../components/empty-state.tsx';
import { ErrorState } from '../components/error-state.tsx';
import { Loading } from '../components/loading.tsx';
import { Page, Section } from '../components/page.tsx';
import { TitleBlock } from '../components/title-block.tsx';
import { AnchorDialog } from '../features/hardware/anchor-dialog.tsx';
import { BracketDialog } from '../features/hardware/bracket-dialog.tsx';
import { AnchorTable, BracketTable, ScrewTable } from '../features/hardware/hardware-tables.tsx';
import { hardwareQuery, useRemoveHardware } from '../features/hardware/hardware.queries.ts';
import { ScrewDialog } from '../features/hardware/screw-dialog.tsx';
import { patternsQuery } from '../features/patterns/patterns.queries.ts';
import { usePageTitle } from '../lib/page-title.ts';
import { useMay } from '../lib/session.ts';

type Open = { kind: 'screw'; entry: Screw | null } | { kind: 'bracket'; entry: Bracket | null } | { kind: 'anchor'; entry: Anchor | null };
type Leaving = { id: string; name: string };

/** The shop's screws, brackets and anchors, with what their makers state. */
export function HardwarePage() {
  usePageTitle('Hardware book');
  const mayChange = useMay('change patterns');
  const book = useQuery(hardwareQuery);
  const [open, setOpen] = useState<Open | null>(null);
  const [leaving, setLeaving] = useState<Leaving | null>(null);
  const close = () => setOpen(null);
  const adding = (kind: Open['kind'], words: string) => (mayChange ? <Button small onClick={() => setOpen({ kind, entry: null })}>{words}</Button> : null);

  return (
    <Page>
      <TitleBlock
        title="Hardware book"
        cells={book.data ? [{ label: 'Screws', value: book.data.screws.length }, { label: 'Brackets', value: book.data.brackets.length }, { label: 'Anchors', value: book.data.anchors.length }] : []}
      />
      {book.isError && !book.data ? <ErrorState error={book.error} onRetry={() => void book.refetch()} /> : null}
      {book.isPending ? <Loading what="the hardware book" /> : null}
      {book.data ? (
        <>
          <Section title="Screws" action={adding('screw', 'Add a screw')}>
            {book.data.screws.length === 0 ? (
              <EmptyState title="No screw is in the book">Add the screws your shop drives into studs and frames.</EmptyState>
            ) : (
              <ScrewTable screws={book.data.screws} onChange={mayChange ? (entry) => setOpen({ kind: 'screw', entry }) : null} onRemove={mayChange ? setLeaving : null} />
            )}
            <p className="mt-2 max-w-prose text-sm text-ink-700">Strength in wood is worked out from these by AWC NDS-2018 and TR12. Dimensions of standard sizes: NDS-2018 appendix L, in part from memory; measure what you buy.</p>
          </Section>
          <Section title="Brackets" action={adding('bracket', 'Add a bracket')}>
            {book.data.brackets.length === 0 ? (
              <EmptyState title="No bracket is in the book">Add the plate or hanger that goes between frame and wall, with its maker’s working load. Without one nothing holds.</EmptyState>
            ) : (
              <BracketTable brackets={book.data.brackets} screws={book.data.screws} onChange={mayChange ? (entry) => setOpen({ kind: 'bracket', entry }) : null} onRemove={mayChange ? setLeaving : null} />
            )}
          </Section>
          <Section title="Anchors" action={adding('anchor', 'Add an anchor')}>
            {book.data.anchors.length === 0 ? (
              <EmptyState title="No anchor is in the book">Add what you use where no stud is, with the load its packet states.</EmptyState>
            ) : (
              <AnchorTable anchors={book.data.anchors} onChange={mayChange ? (entry) => setOpen({ kind: 'anchor', entry }) : null} onRemove={mayChange ? setLeaving : null} />
            )}
            <p className="mt-2 max-w-prose text-sm text-ink-700">
              The program ships no ratings for brackets and anchors: they are the maker’s, from the packet. An ultimate load is divided by 4. Follow the maker’s instructions, and your local code where it asks for more.
            </p>
          </Section>
        </>
      ) : null}
      {open?.kind === 'screw' ? <ScrewDialog screw={open.entry} onClose={close} /> : null}
      {open?.kind === 'bracket' ? <BracketDialog bracket={open.entry} screws={book.data?.screws ?? []} onClose={close} /> : null}
      {open?.kind === 'anchor' ? <AnchorDialog anchor={open.entry} onClose={close} /> : null}
      {leaving && book.data ? <TakeOut entry={leaving} book={book.data} onDone={() => setLeaving(null)} /> : null}
    </Page>
  );
}

/** Asks before an entry goes, and names what counts on it. */
function TakeOut({ entry, book, onDone }: { entry: Leaving; book: HardwareBook; onDone: () => void }) {
  const patterns = useQuery(patternsQuery);
  const remove = useRemoveHardware();
  const users = usersOf(entry.id, patterns.data ?? [], book);
  return (
    <ConfirmDialog
      open
      title={`Take ${entry.name} out of the book?`}
      deed="Take it out"
      danger
      busy={remove.isPending}
      onCancel={onDone}
      onConfirm={() =>
        remove.mutate(entry.id, {
          onSuccess: () => {
            toast.success(`${entry.name} is out of the book`);
            onDone();
          },
        })
      }
    >
      {users.length > 0 ? <p>{listed(users)} {users.length === 1 ? 'counts' : 'count'} on it, and will hold by nothing there until you choose another.</p> : <p>Nothing in your books counts on it.</p>}
      {remove.error ? <ErrorState error={remove.error} /> : null}
    </ConfirmDialog>
  );
}

function usersOf(id: string, patterns: readonly Pattern[], book: HardwareBook): string[] {
  const uses = ({ design }: Pattern) => design.hangers.some((h) => h.bracketId === id || h.wallScrewId === id || h.anchorId === id);
  return [...patterns.filter(uses), ...book.brackets.filter((b) => b.frameScrewId === id)].map(({ name }) => name);
}

function listed(names: readonly string[]): string {
  const shown = names.slice(0, 5);
  if (names.length > shown.length) return `${shown.join(', ')} and ${names.length - shown.length} more`;
  return shown.length === 1 ? shown[0]! : `${shown.slice(0, -1).join(', ')} and ${shown.at(-1)}`;
}
