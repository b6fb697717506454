import { Button } from '../../../../components/button.tsx';
import { Notice } from '../../../../components/notice.tsx';
import { useEditor, useEditorStore } from '../state/editor-store.ts';

/** Asks which of two people's changes stands, where both changed the same frame. Nothing is overwritten until answered. */
export function ConflictNotice() {
  const store = useEditorStore();
  const conflicts = useEditor((e) => e.conflicts);
  const savedBy = useEditor((e) => e.stored.savedBy);
  if (conflicts.length === 0) return null;
  const names = conflicts.map(({ own }) => (own.kind === 'sheet' ? 'the name or reveal' : `frame ${(own.after ?? own.before)?.label ?? ''}`.trim()));
  return (
    <Notice kind="caution" live>
      <p className="font-semibold">
        {savedBy} saved other changes to {listed(names)} before you.
      </p>
      <p>What was saved stands on the wall now; your own changes to {conflicts.length === 1 ? 'it' : 'them'} wait here. Everything else of yours is in place.</p>
      <div className="mt-2 flex flex-wrap gap-3">
        <Button small onClick={() => store.settle('theirs')}>
          Keep what was saved
        </Button>
        <Button small onClick={() => store.settle('mine')}>
          Put mine in its place
        </Button>
      </div>
    </Notice>
  );
}

function listed(names: readonly string[]): string {
  const shown = names.slice(0, 4);
  const more = names.length - shown.length;
  if (more > 0) return `${shown.join(', ')} and ${more} more`;
  return shown.length === 1 ? shown[0]! : `${shown.slice(0, -1).join(', ')} and ${shown.at(-1)}`;
}
