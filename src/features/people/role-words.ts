import type { Role } from '../../../shared/people/permissions.ts';

/** What each role may do, in a line. */
export const roleWords: Record<Role, { name: string; does: string }> = {
  owner: { name: 'Owner', does: 'takes jobs, runs the team, and all that a maker does' },
  maker: { name: 'Maker', does: 'measures walls, designs frames and layouts, sends for sign-off' },
  hanger: { name: 'Hanger', does: 'sees the jobs given to them and records the hanging' },
};
