import type { Layout } from '../../../shared/layouts/layout.ts';
import { classNames } from '../../components/class-names.ts';

export const layoutStateWords: Record<Layout['state'], string> = {
  draft: 'Draft',
  'with client': 'With client',
  signed: 'Signed',
  'changes asked': 'Changes asked',
  superseded: 'Superseded',
};

const looks: Record<Layout['state'], string> = {
  draft: 'border-ink-500 bg-white text-ink-900',
  'with client': 'border-chalk-600 bg-chalk-100 text-chalk-700',
  signed: 'border-sage-600 bg-sage-100 text-sage-600',
  'changes asked': 'border-ochre-600 bg-ochre-100 text-ochre-600',
  superseded: 'border-ink-500 bg-plaster-100 text-ink-700',
};

/** Revision letter and state of a layout. */
export function LayoutState({ layout }: { layout: Pick<Layout, 'letter' | 'state'> }) {
  return (
    <span className={classNames('inline-block border px-2 text-sm font-semibold', looks[layout.state])}>
      {layout.letter} · {layoutStateWords[layout.state]}
    </span>
  );
}
