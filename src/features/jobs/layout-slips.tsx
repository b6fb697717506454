import { EllipsisVertical } from 'lucide-react';
import { type ReactNode, useState } from 'react';
import { toast } from 'sonner';
import type { Layout } from '../../../shared/layouts/layout.ts';
import { templatesApi } from '../../../shared/templates/templates.api.ts';
import { ConfirmDialog } from '../../components/confirm-dialog.tsx';
import { ErrorState } from '../../components/error-state.tsx';
import { Menu, MenuItem } from '../../components/menu.tsx';
import { Slip, Slips } from '../../components/slip.tsx';
import { addressOf } from '../../lib/call.ts';
import { momentOf } from '../../lib/dates.ts';
import { paths } from '../../lib/paths.ts';
import { useUnits } from '../../lib/units.ts';
import { useRemoveLayout } from './job-parts.queries.ts';
import { LayoutState } from './layout-state.tsx';

interface Props {
  layouts: readonly Layout[];
  wallName: (wallId: string) => string;
  draw: (layout: Layout) => ReactNode;
  mayChange: boolean;
}

/** The layouts of a job, each with its drawing, letter and state. */
export function LayoutSlips({ layouts, wallName, draw, mayChange }: Props) {
  const units = useUnits();
  const [removing, setRemoving] = useState<Layout | null>(null);
  return (
    <>
      <Slips>
        {layouts.map((layout) => (
          <Slip
            key={layout.id}
            to={paths.layout(layout.jobId, layout.id)}
            title={layout.name}
            picture={draw(layout)}
            deeds={
              <Menu label={<EllipsisVertical aria-hidden="true" className="size-5" />} name={`More for ${layout.name}`}>
                <MenuItem
                  onSelect={() => window.open(addressOf(templatesApi.pdf, { params: { layoutId: layout.id }, query: { paper: units === 'in' ? 'letter' : 'a4' } }), '_blank', 'noopener')}
                >
                  Template, 1:1 (PDF)
                </MenuItem>
                {mayChange && layout.revisions.length === 0 ? (
                  <MenuItem danger onSelect={() => setRemoving(layout)}>
                    Delete the layout…
                  </MenuItem>
                ) : null}
              </Menu>
            }
          >
            <p className="mb-1">
              <LayoutState layout={layout} />
            </p>
            <p>
              {wallName(layout.wallId)}, {layout.frames.length} {layout.frames.length === 1 ? 'frame' : 'frames'}
            </p>
            <p className="tabular-nums">
              Saved {momentOf(layout.updatedAt)} by {layout.updatedBy}
            </p>
            <Answer layout={layout} />
          </Slip>
        ))}
      </Slips>
      {removing ? <RemoveLayout layout={removing} onClose={() => setRemoving(null)} /> : null}
    </>
  );
}

/** What the client said last, or that the bench has moved on since. */
function Answer({ layout }: { layout: Layout }) {
  const asked = layout.revisions.find((revision) => revision.state === 'changes asked' && revision.askedFor);
  if (layout.changedSinceSigned) return <p className="mt-1 font-semibold text-ochre-600">Changed since it was signed</p>;
  if (layout.state === 'changes asked' && asked) return <blockquote className="mt-1 border-l-4 border-ochre-600 pl-2 break-words text-ink-900">{asked.askedFor}</blockquote>;
  return null;
}

function RemoveLayout({ layout, onClose }: { layout: Layout; onClose: () => void }) {
  const remove = useRemoveLayout(layout.jobId);
  return (
    <ConfirmDialog
      open
      title={`Delete ${layout.name}?`}
      deed="Delete it"
      keep="Keep it"
      danger
      busy={remove.isPending}
      onCancel={onClose}
      onConfirm={() =>
        remove.mutate(layout.id, {
          onSuccess: () => {
            toast.success(`${layout.name} is deleted`);
            onClose();
          },
        })
      }
    >
      <p>It was never sent to the client. Its frames go with it and cannot be brought back.</p>
      {remove.isError ? <ErrorState error={remove.error} /> : null}
    </ConfirmDialog>
  );
}
