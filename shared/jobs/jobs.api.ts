import { z } from 'zod';
import { endpoint, id, instant } from '../api/endpoint.ts';

export const jobStates = ['enquiry', 'design', 'build', 'hang', 'done', 'declined'] as const;

const JobSheet = z.object({
  title: z.string().trim().min(1, 'Please give the job a title.').max(120),
  clientName: z.string().trim().min(1, "Please give the client's name.").max(120),
  clientEmail: z.email({ error: 'Please give a full e-mail address, such as ana@example.com.' }).max(254),
  site: z.string().trim().max(300),
});

export const Job = JobSheet.extend({
  id, state: z.enum(jobStates), version: z.number().int(), assignedTo: z.array(id), createdAt: instant, updatedAt: instant,
  /** What is outstanding at each step of the job card, in words; empty where nothing is. */
  card: z.object({ measure: z.array(z.string()), layout: z.array(z.string()), signoff: z.array(z.string()), workshop: z.array(z.string()), hanging: z.array(z.string()) }),
});
export type Job = z.infer<typeof Job>;

const one = z.object({ jobId: id });

export const jobsApi = {
  list: endpoint({ method: 'get', path: '/api/jobs', permission: 'read jobs', summary: 'The job book: every job the reader may see.', reply: z.array(Job) }),
  create: endpoint({ method: 'post', path: '/api/jobs', permission: 'change jobs', status: 201, summary: 'Open a job.', body: JobSheet, reply: Job }),
  read: endpoint({ method: 'get', path: '/api/jobs/:jobId', permission: 'read jobs', summary: 'One job with its card.', params: one, reply: Job }),
  change: endpoint({ method: 'patch', path: '/api/jobs/:jobId', permission: 'change jobs', summary: 'Change a job.', params: one, body: JobSheet.partial().extend({ version: z.number().int(), state: z.enum(jobStates).optional(), assignedTo: z.array(id).max(50).optional() }), reply: Job }),
};
