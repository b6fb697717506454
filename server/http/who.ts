import type { Role } from '../../shared/people/permissions.ts';

/** The member of a shop on whose behalf a request runs. */
export interface Who {
  userId: string;
  shopId: string;
  role: Role;
  name: string;
  sessionId: string;
}
