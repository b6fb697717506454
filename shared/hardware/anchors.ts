import { z } from 'zod';
import { id } from '../api/endpoint.ts';

const loadN = z.number().finite().positive('A rating is more than zero; leave it empty where none is printed.').max(1e6).nullable();

/** An anchor for walls without wood behind: what its packet says, for one anchor in this wall. The program ships no ratings. */
export const AnchorBody = z.object({
  name: z.string().trim().min(1, 'Please name the anchor.').max(80),
  kind: z.enum(['hollow wall', 'masonry']),
  /** Allowable: may be used as it is. Ultimate: the load at failure. */
  ratedAs: z.enum(['allowable', 'ultimate']),
  shearN: loadN,
  tensionN: loadN,
});
export type AnchorBody = z.infer<typeof AnchorBody>;

export const Anchor = AnchorBody.extend({ id });
export type Anchor = z.infer<typeof Anchor>;

/**
 * What an ultimate rating is divided by. 4 is makers' practice for wallboard fixings and mechanical anchors (common practice);
 * tests in wallboard have come up to 45 % under rated strength (Journal of Testing and Evaluation 28(2), 2000, 112-115).
 */
export const ultimateDivisor = 4;

/** What one anchor may carry, N. No rating: nothing. */
export function anchorAllowable(anchor: Pick<AnchorBody, 'ratedAs' | 'shearN' | 'tensionN'>): { shearN: number; tensionN: number } {
  const divisor = anchor.ratedAs === 'ultimate' ? ultimateDivisor : 1;
  return { shearN: (anchor.shearN ?? 0) / divisor, tensionN: (anchor.tensionN ?? 0) / divisor };
}
