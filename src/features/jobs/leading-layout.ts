import type { Layout } from '../../../shared/layouts/layout.ts';

/** The layout that the job goes on with: the signed one, else the last saved that is still in play, else the last saved. */
export function leadingLayout(layouts: readonly Layout[]): Layout | undefined {
  const rank = ({ state }: Layout) => (state === 'signed' ? 0 : state === 'superseded' ? 2 : 1);
  return [...layouts].sort((a, b) => rank(a) - rank(b) || (a.updatedAt < b.updatedAt ? 1 : -1))[0];
}
