import type { Job, jobStates } from '../../../shared/jobs/jobs.api.ts';
import { classNames } from '../../components/class-names.ts';

type State = (typeof jobStates)[number];

export const stateWords: Record<State, string> = {
  enquiry: 'Enquiry',
  design: 'Design',
  build: 'Build',
  hang: 'Hang',
  done: 'Done',
  declined: 'Declined',
};

const looks: Record<State, string> = {
  enquiry: 'border-ink-500 bg-white text-ink-900',
  design: 'border-chalk-600 bg-chalk-100 text-chalk-700',
  build: 'border-chalk-600 bg-chalk-100 text-chalk-700',
  hang: 'border-chalk-600 bg-chalk-100 text-chalk-700',
  done: 'border-sage-600 bg-sage-100 text-sage-600',
  declined: 'border-ink-500 bg-plaster-100 text-ink-700',
};

/** The state of a job as a word in a ruled box. */
export function JobState({ state }: { state: Job['state'] }) {
  return <span className={classNames('inline-block border px-2 text-sm font-semibold', looks[state])}>{stateWords[state]}</span>;
}
