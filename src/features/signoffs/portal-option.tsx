import { Check } from 'lucide-react';
import type { ReactNode } from 'react';
import type { PortalRevision } from '../../../shared/signoffs/signoffs.api.ts';
import { Notice } from '../../components/notice.tsx';
import { dayOf, momentOf } from '../../lib/dates.ts';
import { useUnits } from '../../lib/units.ts';
import { AnswerForms } from './answer-forms.tsx';
import { plainSizes } from './plain-sizes.ts';

interface Props {
  token: string;
  consent: string;
  revision: PortalRevision;
  /** Name of another option that was signed, or null. */
  signedInstead: string | null;
  /** The layout on the wall. */
  picture: ReactNode;
}

/** One option as the client sees it: the drawing, the sizes in words, and what can be answered. */
export function PortalOption({ token, consent, revision, signedInstead, picture }: Props) {
  const { snapshot } = revision;
  const sizes = plainSizes(snapshot, useUnits());
  return (
    <article aria-labelledby={`option-${revision.id}`} className="flex flex-col gap-4">
      <header className="flex flex-wrap items-baseline justify-between gap-x-4 border-b border-ink-700 pb-1">
        <h2 id={`option-${revision.id}`} className="text-lg font-bold">
          {revision.layoutName}
        </h2>
        <p className="text-sm text-ink-700">
          {snapshot.wall.name}, revision {revision.letter}, sent {dayOf(revision.sentAt)}
        </p>
      </header>
      <figure className="border border-plaster-200 bg-plaster-100 p-2">{picture}</figure>
      <Standing revision={revision} signedInstead={signedInstead} />
      {snapshot.note ? (
        <div>
          <h3 className="text-sm font-semibold text-ink-700">A word from the shop</h3>
          <p className="max-w-prose break-words whitespace-pre-wrap">{snapshot.note}</p>
        </div>
      ) : null}
      <div>
        <h3 className="mb-1 font-bold">Sizes</h3>
        <ul className="list-disc pl-5">
          {sizes.whole.map((words) => (
            <li key={words}>{words}</li>
          ))}
        </ul>
        <dl className="mt-3 border-t border-plaster-200">
          {sizes.frames.map(({ name, words, labels }) => (
            <div key={name} className="border-b border-plaster-200 py-2">
              <dt className="font-semibold">{name}</dt>
              <dd>{words}</dd>
              <dd className="text-sm text-ink-700">On the drawing: {labels}</dd>
            </div>
          ))}
        </dl>
      </div>
      {revision.state === 'with client' ? <AnswerForms token={token} revision={revision} consent={consent} /> : null}
    </article>
  );
}

/** Where the option stands, once it has been answered or replaced. */
function Standing({ revision, signedInstead }: Pick<Props, 'revision' | 'signedInstead'>) {
  switch (revision.state) {
    case 'signed':
      return (
        <Notice kind="good" live>
          <p className="flex items-center gap-2 font-bold text-sage-600">
            <Check aria-hidden="true" className="size-5" />
            Signed
          </p>
          <p>
            Signed by {revision.signedName}
            {revision.signedAt ? `, ${momentOf(revision.signedAt)}` : ''}. What is shown here is what was agreed, and it stays as it is.
          </p>
          <p className="mt-1 text-sm break-all text-ink-700">Record {revision.sha256.slice(0, 16)}</p>
        </Notice>
      );
    case 'changes asked':
      return (
        <Notice kind="caution" live>
          <p className="font-bold">You asked for changes</p>
          {revision.askedFor ? <p className="break-words whitespace-pre-wrap">{revision.askedFor}</p> : null}
          <p className="mt-1 text-sm">The shop has your words and will send a new option.</p>
        </Notice>
      );
    case 'superseded':
      return (
        <Notice live>
          <p className="font-bold">No longer open</p>
          <p>{signedInstead ? `${signedInstead} was signed in place of this option.` : 'The shop has put something newer in place of this option.'}</p>
        </Notice>
      );
    default:
      return null;
  }
}
