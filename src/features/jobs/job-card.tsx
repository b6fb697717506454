import { Check } from 'lucide-react';
import type { Job } from '../../../shared/jobs/jobs.api.ts';

export const steps = [
  { key: 'measure', name: 'Site measure' },
  { key: 'layout', name: 'Layout' },
  { key: 'signoff', name: 'Sign-off' },
  { key: 'workshop', name: 'Workshop' },
  { key: 'hanging', name: 'Hang day' },
] as const satisfies readonly { key: keyof Job['card']; name: string }[];

/** The five steps of a job as a ruled strip, with what is outstanding in each. */
export function JobCard({ card }: { card: Job['card'] }) {
  return (
    <ol aria-label="Job card" className="grid border-t border-l border-ink-700 bg-white sm:grid-cols-5">
      {steps.map(({ key, name }, i) => (
        <li key={key} className="border-r border-b border-ink-700 px-4 py-2">
          <p className="flex items-baseline gap-2 font-bold text-ink-900">
            <span className="text-sm text-ink-500 tabular-nums">{i + 1}</span>
            {name}
          </p>
          {card[key].length === 0 ? (
            <p className="mt-1 flex items-center gap-1 text-sm text-sage-600">
              <Check aria-hidden="true" className="size-4" />
              Nothing outstanding
            </p>
          ) : (
            <ul className="mt-1 text-sm text-ink-700">
              {card[key].map((words) => (
                <li key={words} className="first-letter:uppercase">
                  {words}
                </li>
              ))}
            </ul>
          )}
        </li>
      ))}
    </ol>
  );
}

/** The first step of a job with something outstanding, in a line; null where nothing is. */
export function nextOutstanding(card: Job['card']): { step: string; words: string } | null {
  for (const { key, name } of steps) {
    const words = card[key][0];
    if (words !== undefined) return { step: name, words };
  }
  return null;
}
