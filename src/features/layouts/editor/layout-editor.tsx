import type { Wall } from '../../../../shared/walls/wall.ts';
import { classNames } from '../../../components/class-names.ts';
import { Notice } from '../../../components/notice.tsx';
import { ArrangeDialog } from './arrange/arrange-dialog.tsx';
import { ConflictNotice } from './ledger/conflict-notice.tsx';
import { FindingsLedger } from './ledger/findings-ledger.tsx';
import { FrameSheet } from './ledger/frame-sheet.tsx';
import { FramesTable, WholeSizes } from './ledger/frames-table.tsx';
import { LoadsLedger } from './ledger/loads-ledger.tsx';
import { SeekPanel } from './ledger/seek-panel.tsx';
import type { Checks } from './ledger/use-checks.ts';
import { LayoutStage } from './stage/layout-stage.tsx';
import { MeasureReadout } from './stage/measure-readout.tsx';
import { StageToolbar } from './stage/stage-toolbar.tsx';
import type { Designs } from './state/designs.ts';
import { useEditor } from './state/editor-store.ts';
import { Tray } from './tray/tray.tsx';

interface Props {
  wall: Wall;
  designs: Designs;
  /** Null while the checks cannot run. */
  checks: Checks | null;
  readOnly: boolean;
  /** The window is too narrow to work in, whatever the reader may do. */
  narrow: boolean;
}

/** The wall, the tray along its foot and the ledger beside it. Stands inside an EditorContext. */
export function LayoutEditor({ wall, designs, checks, readOnly, narrow }: Props) {
  const save = useEditor((e) => e.save);
  const seeking = useEditor((e) => e.seeking);
  const arranging = useEditor((e) => e.arranging);
  const findings = checks?.findings ?? null;
  return (
    <div className="flex flex-col gap-3 lg:min-h-0 lg:grow lg:flex-row">
      <div className="flex min-w-0 grow flex-col gap-3 lg:min-h-0">
        {narrow ? <Notice>This window is too narrow to work in. You can look at the layout here; to change it, open it on a screen at least 768 px wide.</Notice> : null}
        {save.kind === 'refused' ? (
          <Notice kind="stop" live>
            <p className="font-semibold">Your last changes could not be saved.</p>
            <p>{save.words} They are kept on this device; undo the last step, or reload the page to try again.</p>
          </Notice>
        ) : null}
        <ConflictNotice />
        <div className={classNames('flex min-h-80 flex-col border border-ink-700 lg:h-auto lg:min-h-[26rem] lg:grow', narrow ? 'h-[52dvh]' : 'h-[72dvh]')}>
          <StageToolbar wall={wall} designs={designs} readOnly={readOnly} />
          <LayoutStage wall={wall} designs={designs} findings={findings} readOnly={readOnly} />
          <div className="relative">
            <MeasureReadout />
          </div>
          <StatusLine readOnly={readOnly} />
          {readOnly ? null : <Tray designs={designs} wall={wall} />}
        </div>
      </div>
      <aside aria-label="Ledger" className="flex shrink-0 flex-col gap-4 lg:w-96 lg:overflow-y-auto lg:pr-1">
        {seeking && !readOnly ? <SeekPanel checks={checks} /> : null}
        {readOnly ? null : <FrameSheet designs={designs} wall={wall} />}
        <FindingsLedger findings={findings} designs={designs} />
        <LoadsLedger checks={checks} />
        <FramesTable designs={designs} />
        <WholeSizes designs={designs} wall={wall} readOnly={readOnly} />
      </aside>
      {arranging && !readOnly ? <ArrangeDialog wall={wall} designs={designs} checks={checks} /> : null}
    </div>
  );
}

/** What was done last, read out; and what the keys and the mouse do. Of one height always, so that the wall does not jump. */
function StatusLine({ readOnly }: { readOnly: boolean }) {
  const news = useEditor((e) => e.news);
  return (
    <div className="flex shrink-0 items-center justify-between gap-x-4 border-t border-plaster-200 bg-white px-3 py-1 text-sm text-ink-700">
      <p role="status" className="min-h-6 min-w-0 truncate leading-6" title={news.words}>
        {/* The same words twice are news twice. */}
        <span key={news.count}>{news.words}</span>
      </p>
      {readOnly ? null : (
        <details className="relative shrink-0 max-md:hidden">
          <summary className="cursor-pointer leading-6 font-semibold text-chalk-700 underline underline-offset-4">Keys and mouse</summary>
          <ul id="wall-keys" className="absolute right-0 bottom-full z-10 mb-2 grid w-96 gap-1 border border-ink-700 bg-white p-3 text-ink-900">
            <li>Arrows nudge what is chosen, with Shift farther; Delete removes it; Ctrl or ⌘ with A chooses all.</li>
            <li>Drag over the bare wall to choose several; Shift adds to what is chosen.</li>
            <li>Hold Ctrl (⌘ on a Mac) while dragging to let go of snapping.</li>
            <li>Wheel or two fingers: nearer and farther. Space and drag: along the wall.</li>
            <li>Ctrl or ⌘ with Z takes back, with Y or Shift and Z makes again.</li>
          </ul>
        </details>
      )}
    </div>
  );
}
