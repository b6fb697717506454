import type { Permission } from '../api/endpoint.ts';

export const roles = ['owner', 'maker', 'hanger'] as const;
export type Role = (typeof roles)[number];

/** Which roles of a shop hold which permission. `anyone`, `hold link` and `develop` are not matters of role. */
const held: Record<Permission, readonly Role[]> = {
  anyone: roles,
  'signed in': roles,
  'read jobs': roles,
  'record hanging': roles,
  'change jobs': ['owner', 'maker'],
  'change patterns': ['owner', 'maker'],
  'run shop': ['owner'],
  'hold link': [],
  develop: roles,
};

/** Whether a role holds a permission; the server enforces by it and the page hides by it. */
export function may(role: Role, permission: Permission): boolean {
  return held[permission].includes(role);
}

/** A hanger reads only the jobs assigned to them; owners and makers read every job of their shop. */
export function mayReadJob(who: { role: Role; shopId: string; userId: string }, job: { shopId: string; assignedTo: readonly string[] }): boolean {
  if (who.shopId !== job.shopId) return false;
  return who.role !== 'hanger' || job.assignedTo.includes(who.userId);
}
