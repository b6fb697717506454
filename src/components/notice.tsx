import type { ReactNode } from 'react';
import { classNames } from './class-names.ts';

const looks = {
  plain: 'border-ink-500 bg-white',
  stop: 'border-madder-600 bg-madder-100',
  caution: 'border-ochre-600 bg-ochre-100',
  good: 'border-sage-600 bg-sage-100',
} as const;

/** A ruled strip with something the reader should know. `live` reads it out when it appears. */
export function Notice({ kind = 'plain', live = false, className, children }: { kind?: keyof typeof looks; live?: boolean; className?: string; children: ReactNode }) {
  return (
    <div role={live ? (kind === 'stop' ? 'alert' : 'status') : undefined} className={classNames('border-l-4 px-4 py-3 text-ink-900', looks[kind], className)}>
      {children}
    </div>
  );
}
