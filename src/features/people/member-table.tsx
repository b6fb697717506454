import type { Member } from '../../../shared/people/people.api.ts';
import { Table, Td, Th } from '../../components/table.tsx';
import { dayOf } from '../../lib/dates.ts';
import { roleWords } from './role-words.ts';

/** The people of the shop and what each may do. */
export function MemberTable({ members }: { members: readonly Member[] }) {
  return (
    <Table caption="People of the shop">
      <thead>
        <tr>
          <Th>Name</Th>
          <Th>E-mail</Th>
          <Th>Role</Th>
          <Th>Since</Th>
        </tr>
      </thead>
      <tbody>
        {members.map((member) => (
          <tr key={member.id}>
            <Th scope="row">
              {member.name}
              {member.active ? '' : ' (left)'}
            </Th>
            <Td>{member.email}</Td>
            <Td>
              {roleWords[member.role].name}
              <span className="block text-sm text-ink-700">{roleWords[member.role].does}</span>
            </Td>
            <Td className="whitespace-nowrap tabular-nums">{dayOf(member.createdAt)}</Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
