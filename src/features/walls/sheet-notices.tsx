import { Button } from '../../components/button.tsx';
import { ErrorState } from '../../components/error-state.tsx';
import { Notice } from '../../components/notice.tsx';
import type { WallSheet } from './use-wall-draft.ts';

/** What stands between a draft and its being saved: someone was before, something is missing, the line is down. */
export function SheetNotices({ sheet, onTakeTheirs }: { sheet: WallSheet; onTakeTheirs: () => void }) {
  const wrong = Object.keys(sheet.errors).length;
  return (
    <>
      {sheet.overtaken ? (
        <Notice kind="caution" live>
          <p className="font-bold">Someone saved this wall before you</p>
          <p className="mt-1">
            Studs: {sheet.overtaken.current.studs.length} in theirs, {sheet.draft.studs.length} in yours. Obstructions: {sheet.overtaken.current.obstructions.length} in theirs,{' '}
            {sheet.draft.obstructions.length} in yours. Yours is still here and not saved.
          </p>
          <div className="mt-3 flex flex-wrap gap-3">
            <Button small onClick={onTakeTheirs}>
              Take theirs, drop mine
            </Button>
            <Button small weight="danger" busy={sheet.saving} onClick={() => void sheet.saveOver()}>
              Save mine over theirs
            </Button>
          </div>
        </Notice>
      ) : null}
      {wrong > 0 ? (
        <Notice kind="stop" live>
          Not saved yet: {wrong === 1 ? 'one field needs' : `${wrong} fields need`} another look. {Object.values(sheet.errors)[0]}
        </Notice>
      ) : null}
      {sheet.failure && wrong === 0 ? <ErrorState error={sheet.failure} onRetry={sheet.save} /> : null}
    </>
  );
}
