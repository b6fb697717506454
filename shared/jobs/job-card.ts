import type { Layout } from '../layouts/layout.ts';
import { isConfirmed, type Wall } from '../walls/wall.ts';
import type { Job } from './jobs.api.ts';

const count = (n: number, one: string, many = `${one}s`) => `${n} ${n === 1 ? one : many}`;

/** Whole days between two instants. */
const daysBetween = (from: string, to: string) => Math.floor((Date.parse(to) - Date.parse(from)) / 86_400_000);

/** What is outstanding at each step of a job, in words; an empty list means nothing is. */
export function jobCard(job: { state: Job['state']; walls: readonly Wall[]; layouts: readonly Layout[]; assigned: number; now: string }): Job['card'] {
  const { walls, layouts } = job;
  const measure: string[] = [];
  if (walls.length === 0) measure.push('no wall measured');
  for (const wall of walls) {
    if (wall.photo && !wall.photo.elevation) measure.push(`${wall.name}: photo not straightened`);
    if (wall.studs.length === 0 && wall.construction !== 'masonry' && wall.construction !== 'solid wood') measure.push(`${wall.name}: no studs yet`);
    const unconfirmed = wall.studs.filter((s) => !isConfirmed(s)).length;
    if (unconfirmed > 0) measure.push(`${wall.name}: ${count(unconfirmed, 'stud')} unconfirmed`);
  }

  const layout: string[] = [];
  if (layouts.length === 0) layout.push('no layout started');
  for (const l of layouts) if (l.frames.length === 0) layout.push(`${l.name}: no frames`);

  const signoff: string[] = [];
  const signed = layouts.some((l) => l.revisions.some((r) => r.state === 'signed'));
  for (const l of layouts) {
    for (const r of l.revisions) {
      if (r.state === 'with client') {
        const days = daysBetween(r.sentAt, job.now);
        signoff.push(`${l.name} ${r.letter}: waiting on client${days > 0 ? ` for ${count(days, 'day')}` : ', sent today'}`);
      }
      if (r.state === 'changes asked' && l.state !== 'with client') signoff.push(`${l.name} ${r.letter}: client asked for changes`);
    }
    if (l.changedSinceSigned) signoff.push(`${l.name}: changed since signed`);
  }
  if (!signed && signoff.length === 0) signoff.push('nothing sent yet');

  return {
    measure,
    layout,
    signoff,
    workshop: signed ? [] : ['waits for a signature'],
    hanging: job.assigned === 0 ? ['nobody assigned to hang'] : [],
  };
}
