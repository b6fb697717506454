import { z } from 'zod';
import { done, endpoint, id } from '../api/endpoint.ts';
import { AnchorBody } from './anchors.ts';
import { BracketBody } from './brackets.ts';
import { HardwareBook } from './hardware-book.ts';
import { ScrewBody } from './screws.ts';

const name = z.string().trim().min(1, 'Please give it a name.').max(80);

/** One entry of the hardware book, whatever it is. */
export const HardwareItem = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('screw'), name, body: ScrewBody }),
  z.object({ kind: z.literal('bracket'), name, body: BracketBody.omit({ name: true }) }),
  z.object({ kind: z.literal('anchor'), name, body: AnchorBody.omit({ name: true }) }),
]);
export type HardwareItem = z.infer<typeof HardwareItem>;

const one = z.object({ hardwareId: id });

export const hardwareApi = {
  book: endpoint({ method: 'get', path: '/api/hardware', permission: 'read jobs', summary: "The shop's hardware book: screws, brackets, anchors.", reply: HardwareBook }),
  add: endpoint({ method: 'post', path: '/api/hardware', permission: 'change patterns', status: 201, summary: 'Add a screw, bracket or anchor.', body: HardwareItem, reply: HardwareBook }),
  change: endpoint({ method: 'put', path: '/api/hardware/:hardwareId', permission: 'change patterns', summary: 'Change an entry; its kind stays.', params: one, body: HardwareItem, reply: HardwareBook }),
  remove: endpoint({ method: 'delete', path: '/api/hardware/:hardwareId', permission: 'change patterns', summary: 'Take an entry out of the book; hangers that named it then hold by nothing.', params: one, reply: done }),
};
