import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Button } from '../components/button.tsx';
import { ErrorState } from '../components/error-state.tsx';
import { Loading } from '../components/loading.tsx';
import { Notice } from '../components/notice.tsx';
import { Page } from '../components/page.tsx';
import { TitleBlock } from '../components/title-block.tsx';
import { AddMemberDialog } from '../features/people/add-member-dialog.tsx';
import { MemberTable } from '../features/people/member-table.tsx';
import { membersQuery } from '../features/people/people.queries.ts';
import { usePageTitle } from '../lib/page-title.ts';
import { useMay } from '../lib/session.ts';

export function TeamPage() {
  usePageTitle('Team');
  const mayRun = useMay('run shop');
  const members = useQuery({ ...membersQuery, enabled: mayRun });
  const [adding, setAdding] = useState(false);
  if (!mayRun) {
    return (
      <Page narrow>
        <TitleBlock title="Team" />
        <Notice>The team is looked after by the owner of the shop.</Notice>
      </Page>
    );
  }
  return (
    <Page>
      <TitleBlock
        title="Team"
        cells={members.data ? [{ label: 'People', value: members.data.length }] : []}
        action={
          <Button weight="primary" onClick={() => setAdding(true)}>
            Add a person
          </Button>
        }
      />
      {members.data ? <MemberTable members={members.data} /> : members.isError ? <ErrorState error={members.error} onRetry={() => void members.refetch()} /> : <Loading what="the team" />}
      {adding ? <AddMemberDialog onClose={() => setAdding(false)} /> : null}
    </Page>
  );
}
