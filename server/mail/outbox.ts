import { randomUUID } from 'node:crypto';
import nodemailer from 'nodemailer';
import type { Logger } from 'pino';
import type { Transaction } from '../database/transaction.ts';
import { headerText, letterHtml, letterText, type Letter } from './letter.ts';
import type { OutboxRepository } from './outbox.repository.ts';

/** Seconds until the next try after the first, second, … failure; after the last the message is marked failed. */
const backOffSeconds = [5, 30, 120, 600, 1800, 3600, 7200, 14_400, 28_800];
/** A sender that dies while sending gives the message back after this long. */
const claimSeconds = 90;

export interface Outbox {
  post(to: { shopId: string; address: string; replyTo: string | null }, letter: Letter, transaction?: Transaction): Promise<void>;
  /** Sends what is due, once through; returns how many went. */
  sendDue(): Promise<number>;
  start(): void;
  stop(): Promise<void>;
}

/**
 * Mail goes by way of a table: written with what it tells of, sent by this loop, tried again with growing pauses.
 * Each message reaches the mail server at least once; its Message-ID stays the same over tries, so that a second
 * copy after a crash can be told as such.
 */
export function createOutbox(rows: OutboxRepository, settings: { smtpUrl: string; from: string; clock: () => Date; log: Logger }): Outbox {
  const transport = nodemailer.createTransport(settings.smtpUrl, {
    disableFileAccess: true, disableUrlAccess: true, connectionTimeout: 10_000, greetingTimeout: 10_000, socketTimeout: 20_000,
    ...(settings.smtpUrl.startsWith('smtp://127.0.0.1') ? { ignoreTLS: true } : {}),
  } as object);
  let timer: NodeJS.Timeout | null = null;
  let running: Promise<number> = Promise.resolve(0);
  let again = false;
  let stopped = false;

  async function once(): Promise<number> {
    let sent = 0;
    for (const row of await rows.due(settings.clock())) {
      if (!(await rows.claim(row, after(claimSeconds)))) continue;
      try {
        await transport.sendMail({
          messageId: `<${row.id}@combwright>`, from: settings.from, to: row.recipient, subject: row.subject, text: row.text, html: row.html,
          ...(row.replyTo ? { replyTo: row.replyTo } : {}),
        });
        await rows.sent(row.id, settings.clock());
        sent += 1;
      } catch (error) {
        const wait = backOffSeconds[row.attempts];
        settings.log.warn({ mail: row.id, attempt: row.attempts + 1, reason: (error as Error).message }, 'mail not sent');
        await rows.failed(row.id, (error as Error).message, wait === undefined ? null : after(wait));
      }
    }
    return sent;
  }

  const after = (seconds: number) => new Date(settings.clock().getTime() + seconds * 1000);

  /** One pass at a time; a pass asked for while another runs follows it. */
  function sendDue(): Promise<number> {
    if (again) return running;
    again = true;
    running = running.catch(() => 0).then(() => {
      again = false;
      return once();
    });
    return running;
  }

  return {
    async post(to, letter, transaction) {
      const now = settings.clock();
      await rows.add(
        {
          id: randomUUID(), shopId: to.shopId, recipient: to.address, replyTo: to.replyTo, subject: headerText(letter.subject).slice(0, 300),
          text: letterText(letter), html: letterHtml(letter), state: 'waiting', attempts: 0, lastError: null, createdAt: now, nextTryAt: now, sentAt: null,
        },
        transaction,
      );
    },
    sendDue,
    start() {
      const tick = () => {
        sendDue()
          .catch((error: Error) => settings.log.error({ err: error }, 'outbox'))
          .finally(() => {
            if (!stopped) timer = setTimeout(tick, 1000);
          });
      };
      timer = setTimeout(tick, 200);
    },
    async stop() {
      stopped = true;
      if (timer) clearTimeout(timer);
      await running.catch(() => 0);
      transport.close();
    },
  };
}
