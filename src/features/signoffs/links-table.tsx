import { useState } from 'react';
import { toast } from 'sonner';
import type { Link } from '../../../shared/signoffs/signoffs.api.ts';
import { Button } from '../../components/button.tsx';
import { ConfirmDialog } from '../../components/confirm-dialog.tsx';
import { ErrorState } from '../../components/error-state.tsx';
import { Table, Td, Th } from '../../components/table.tsx';
import { dayOf } from '../../lib/dates.ts';
import { useRevokeLink } from './signoffs.queries.ts';

/** Links that the client of a job was given, and closing them. `now` in ms, to tell which have run out. */
export function LinksTable({ jobId, links, now }: { jobId: string; links: readonly Link[]; now: number }) {
  const revoke = useRevokeLink(jobId);
  const [closing, setClosing] = useState<Link | null>(null);
  return (
    <>
      <Table caption="Links given to the client">
        <thead>
          <tr>
            <Th>Layout</Th>
            <Th>Sent to</Th>
            <Th>Sent</Th>
            <Th>Open until</Th>
            <Th>
              <span className="sr-only">Close</span>
            </Th>
          </tr>
        </thead>
        <tbody>
          {links.map((link) => (
            <tr key={link.id}>
              <Th scope="row">
                {link.layoutName} {link.letter}
              </Th>
              <Td>{link.sentTo}</Td>
              <Td className="whitespace-nowrap tabular-nums">{dayOf(link.createdAt)}</Td>
              <Td className="whitespace-nowrap tabular-nums">
                {link.revokedAt ? `Closed ${dayOf(link.revokedAt)}` : Date.parse(link.expiresAt) < now ? `Ran out ${dayOf(link.expiresAt)}` : dayOf(link.expiresAt)}
              </Td>
              <Td className="text-right">
                {!link.revokedAt && Date.parse(link.expiresAt) >= now ? (
                  <Button small weight="danger" aria-label={`Close the link to ${link.layoutName} ${link.letter}`} onClick={() => setClosing(link)}>
                    Close
                  </Button>
                ) : null}
              </Td>
            </tr>
          ))}
        </tbody>
      </Table>
      <ConfirmDialog
        open={closing !== null}
        title="Close this link?"
        deed="Close the link"
        keep="Leave it open"
        danger
        busy={revoke.isPending}
        onCancel={() => {
          setClosing(null);
          revoke.reset();
        }}
        onConfirm={() => {
          if (!closing) return;
          revoke.mutate(closing.id, {
            onSuccess: () => {
              setClosing(null);
              toast.success('The link is closed');
            },
          });
        }}
      >
        <p>
          {closing?.sentTo} will no longer see the layout by it. A closed link cannot be opened again; sending the layout anew gives a new one.
        </p>
        {revoke.isError ? <ErrorState error={revoke.error} /> : null}
      </ConfirmDialog>
    </>
  );
}
