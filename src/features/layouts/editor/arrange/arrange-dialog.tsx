import { useMemo, useState } from 'react';
import { rankedBy } from '../../../../../shared/findings/arrange/arrange.ts';
import { takeEdits } from '../../../../../shared/findings/arrange/take.ts';
import type { Wall } from '../../../../../shared/walls/wall.ts';
import { Button } from '../../../../components/button.tsx';
import { Actions, Dialog } from '../../../../components/dialog.tsx';
import { Notice } from '../../../../components/notice.tsx';
import { ProgressBar } from '../../../../components/progress-bar.tsx';
import { newId } from '../../../../lib/new-id.ts';
import type { Checks } from '../ledger/use-checks.ts';
import type { Designs } from '../state/designs.ts';
import { useEditor, useEditorStore } from '../state/editor-store.ts';
import { askOf, countsOf, firstWanted, totalOf, type Wanted } from './asked.ts';
import { CandidateList } from './candidate-list.tsx';
import { useArranging, type Arranging } from './use-arranging.ts';
import { WantedFields } from './wanted-fields.tsx';

/** Most candidates shown. */
const mostShown = 9;

interface Props {
  wall: Wall;
  designs: Designs;
  /** Null while the checks cannot run: without them nothing can be ranked. */
  checks: Checks | null;
}

/** Arranges chosen patterns, offers what was found, and puts the one taken on the wall as one step. Mount it to open it. */
export function ArrangeDialog({ wall, designs, checks }: Props) {
  const store = useEditorStore();
  const bench = useEditor((e) => e.bench);
  const [wanted, setWanted] = useState<Wanted>(() => firstWanted(wall));
  const [problem, setProblem] = useState<string | null>(null);
  /** Whether the candidates were made to stand in place of what hangs there. */
  const [inPlace, setInPlace] = useState(false);
  const [pickedKey, setPickedKey] = useState<string | null>(null);
  const { arranging, start, stop } = useArranging();
  const patterns = useMemo(() => [...designs.values()].filter((d) => !d.archived), [designs]);
  const unlocked = bench.frames.filter((f) => !f.locked).length;
  const shown = arranging.candidates.slice(0, mostShown);
  const trying = arranging.state === 'trying';
  const picked = shown.find((c) => c.key === pickedKey) ?? shown[0] ?? null;

  const change = (to: Partial<Wanted>) => {
    setProblem(null);
    setWanted((now) => ({ ...now, ...to }));
  };
  const close = () => store.setState({ arranging: false });
  const go = () => {
    if (!checks) return;
    const ask = askOf(wanted, bench, checks.around, designs);
    if ('problem' in ask) {
      setProblem(ask.problem);
      return;
    }
    setInPlace(wanted.inPlace);
    setPickedKey(null);
    start(ask);
  };
  const take = () => {
    if (!picked) return;
    const edits = takeEdits(picked, bench.frames, picked.frames.map(() => newId()), inPlace);
    const placed = edits.flatMap((edit) => (edit.kind === 'frame' && edit.after ? [edit.frameId] : []));
    store.act(`Arranged: ${picked.how.charAt(0).toLowerCase()}${picked.how.slice(1)}, ${placed.length === 1 ? '1 frame' : `${placed.length} frames`}`, edits, { select: placed });
    close();
  };

  return (
    <Dialog open onOpenChange={(open) => (open ? undefined : close())} title="Arrange for me" wide="all" about="Choose frames and a kind, take one of what is found, and go on by hand. One undo takes it back.">
      <div className="grid gap-5 md:grid-cols-[18rem_minmax(0,1fr)]">
        <form
          noValidate
          onSubmit={(event) => {
            event.preventDefault();
            if (!trying) go();
          }}
        >
          <WantedFields
            wanted={wanted}
            patterns={patterns}
            unlocked={unlocked}
            onChange={change}
            onInPlace={(on) => change(on && totalOf(wanted.counts) === 0 ? { inPlace: on, counts: countsOf(bench.frames) } : { inPlace: on })}
          />
          {problem ? (
            <Notice kind="caution" live className="mt-3">
              {problem}
            </Notice>
          ) : null}
          <div className="mt-4 flex gap-2">
            <Button type="submit" weight={shown.length > 0 ? 'plain' : 'primary'} busy={trying} disabled={!checks}>
              Arrange
            </Button>
            {trying ? <Button onClick={stop}>Stop</Button> : null}
          </div>
        </form>
        <section aria-label="Candidates" className="min-w-0">
          <Told arranging={arranging} ready={checks !== null} />
          {arranging.ask ? (
            <CandidateList candidates={shown} picked={picked} onPick={setPickedKey} wall={wall} designs={designs} staying={arranging.ask.scene.frames} area={arranging.ask.area} />
          ) : null}
          <p className="mt-3 text-sm text-ink-700">{rankedBy}</p>
        </section>
      </div>
      <div className="sticky -bottom-4 -mx-5 -mb-4 border-t border-plaster-200 bg-plaster-50 px-5 pb-4 [&>div]:mt-3">
        <Actions>
          <Button onClick={close}>Leave it</Button>
          <Button weight={shown.length > 0 ? 'primary' : 'plain'} disabled={!picked || trying} onClick={take}>
            Take this one
          </Button>
        </Actions>
      </div>
    </Dialog>
  );
}

/** How far the trying has come, or what became of it. */
function Told({ arranging: { state, tried, ways, late, candidates }, ready }: { arranging: Arranging; ready: boolean }) {
  if (state === 'trying') {
    return (
      <div className="mb-3">
        <ProgressBar label={`Trying ways: ${candidates.length} found`} share={ways > 0 ? tried / ways : null} />
      </div>
    );
  }
  const words = !ready ? 'The checks cannot run just now, so nothing can be ranked. Wait a moment and open this again.'
    : state === 'idle' ? 'Nothing arranged yet. Say how many frames of which pattern, then press Arrange.'
    : state === 'failed' ? 'Arranging failed. Try again, or with another seed.'
    : candidates.length === 0 ? 'None of the ways tried has room there. Try fewer frames, another kind, or another middle.'
    : `${candidates.length} found in ${tried} of ${ways} ways${state === 'stopped' ? '; stopped' : late ? '; the time was up' : ''}. ${candidates.length > mostShown ? `The best ${mostShown} are shown.` : ''}`;
  return (
    <Notice kind={state === 'failed' || (state !== 'idle' && candidates.length === 0) ? 'caution' : 'plain'} live className="mb-3">
      {words}
    </Notice>
  );
}
