import { describe, expect, it } from 'vitest';
import type { Job } from '../../../shared/jobs/jobs.api.ts';
import type { Layout } from '../../../shared/layouts/layout.ts';
import { narrowed } from '../../../src/features/jobs/job-book.ts';
import { leadingLayout } from '../../../src/features/jobs/leading-layout.ts';

const job = (title: string, over: Partial<Job> = {}) => ({ title, clientName: 'Ana', clientEmail: 'ana@example.com', site: '', state: 'design', updatedAt: '2026-03-01T00:00:00Z', ...over }) as Job;
const titles = (jobs: Job[]) => jobs.map(({ title }) => title);

describe('the job book', () => {
  const book = [job('Hall', { clientName: 'Zoë Quill', site: '4 Lime Row' }), job('Hall again', { state: 'done' }), job('Stair', { state: 'declined' }), job('Loft', { updatedAt: '2026-03-02T00:00:00Z' })];

  it('shows what is running, the last changed first, until asked for more', () => {
    expect(titles(narrowed(book, { text: '', state: 'running' }))).toEqual(['Loft', 'Hall']);
    expect(narrowed(book, { text: '', state: 'all' })).toHaveLength(4);
    expect(titles(narrowed(book, { text: '', state: 'done' }))).toEqual(['Hall again']);
  });

  it('finds every typed word in title, client or site, whatever its case and accents', () => {
    expect(titles(narrowed(book, { text: 'ZOE lime', state: 'running' }))).toEqual(['Hall']);
    expect(narrowed(book, { text: 'zoe oak', state: 'all' })).toEqual([]);
  });
});

describe('the layout a job goes on with', () => {
  const layout = (name: string, state: Layout['state'], updatedAt: string) => ({ name, state, updatedAt }) as Layout;

  it('is the signed one, though another was saved later', () => {
    expect(leadingLayout([layout('A', 'superseded', '2026-03-03'), layout('B', 'signed', '2026-03-01'), layout('C', 'draft', '2026-03-02')])?.name).toBe('B');
  });

  it('is the last saved in play where none is signed, and none where there is none', () => {
    expect(leadingLayout([layout('A', 'superseded', '2026-03-03'), layout('B', 'draft', '2026-03-01'), layout('C', 'with client', '2026-03-02')])?.name).toBe('C');
    expect(leadingLayout([])).toBeUndefined();
  });
});
