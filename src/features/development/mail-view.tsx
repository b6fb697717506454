import type { z } from 'zod';
import { developmentApi, type Mail } from '../../../shared/api/development.api.ts';
import { addressOf } from '../../lib/call.ts';
import { momentOf } from '../../lib/dates.ts';
import { linkedText } from './linked-text.ts';

/** One message as its reader would see it. Its HTML stands in a frame of its own, without scripts. */
export function MailView({ mail }: { mail: z.infer<typeof Mail> }) {
  return (
    <article aria-label={mail.subject} className="border border-ink-700 bg-white">
      <header className="border-b border-plaster-200 px-4 py-3">
        <h2 className="font-bold">{mail.subject}</h2>
        <p className="text-sm text-ink-700">
          From {mail.from} to {mail.to}, {momentOf(mail.at)}
        </p>
      </header>
      <p className="px-4 py-3 break-words whitespace-pre-wrap">
        {linkedText(mail.text).map(({ text, href }, i) =>
          href ? (
            <a key={i} href={href} className="font-semibold text-chalk-600 underline">
              {text}
            </a>
          ) : (
            text
          ),
        )}
      </p>
      {mail.html ? (
        <details className="border-t border-plaster-200">
          <summary className="cursor-pointer px-4 py-2 font-semibold text-chalk-600">Show the HTML form</summary>
          <iframe title="HTML form of the message" src={addressOf(developmentApi.mailPage, { params: { mailId: mail.id } })} sandbox="allow-popups allow-popups-to-escape-sandbox" className="h-96 w-full border-t border-plaster-200" />
        </details>
      ) : null}
    </article>
  );
}
