import { randomUUID } from 'node:crypto';
import { mkdirSync, readdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import type { AddressInfo } from 'node:net';
import path from 'node:path';
import { simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';

export interface FakeMail {
  id: string;
  from: string;
  to: string;
  subject: string;
  at: string;
  text: string;
  html: string | null;
}

/** A mail server on loopback that keeps every message as a file, for those without one. */
export class FakeMailServer {
  private readonly server: SMTPServer;
  private readonly folder: string;

  constructor(dataDir: string) {
    this.folder = path.join(dataDir, 'fake-mailbox');
    mkdirSync(this.folder, { recursive: true, mode: 0o700 });
    this.server = new SMTPServer({
      authOptional: true,
      disabledCommands: ['STARTTLS', 'AUTH'],
      size: 5_000_000,
      onData: (stream, _session, done) => {
        const parts: Buffer[] = [];
        stream.on('data', (part: Buffer) => parts.push(part));
        stream.on('error', done);
        stream.on('end', () => {
          // Named by time so that the newest sort last; complete only once it bears its name.
          const name = `${Date.now().toString(36).padStart(9, '0')}-${randomUUID().slice(0, 8)}`;
          const draft = path.join(this.folder, `.${name}`);
          writeFileSync(draft, Buffer.concat(parts));
          renameSync(draft, path.join(this.folder, `${name}.eml`));
          done();
        });
      },
    });
  }

  /** Starts on a free port; gives the SMTP address. */
  async start(port = 0): Promise<string> {
    await new Promise<void>((resolve, reject) => {
      this.server.once('error', reject);
      this.server.listen(port, '127.0.0.1', () => resolve());
    });
    this.server.on('error', () => undefined);
    return `smtp://127.0.0.1:${(this.server.server.address() as AddressInfo).port}`;
  }

  async stop(): Promise<void> {
    await new Promise<void>((resolve) => this.server.close(() => resolve()));
  }

  /** Newest first. */
  async list(): Promise<FakeMail[]> {
    const names = readdirSync(this.folder).filter((n) => n.endsWith('.eml')).sort().reverse().slice(0, 200);
    return Promise.all(names.map((n) => this.parsed(n.replace(/\.eml$/, ''))));
  }

  async read(id: string): Promise<FakeMail | null> {
    return readdirSync(this.folder).includes(`${id}.eml`) ? this.parsed(id) : null;
  }

  private async parsed(id: string): Promise<FakeMail> {
    const mail = await simpleParser(readFileSync(path.join(this.folder, `${id}.eml`)));
    const to = Array.isArray(mail.to) ? mail.to.map((a) => a.text).join(', ') : (mail.to?.text ?? '');
    return {
      id, from: mail.from?.text ?? '', to, subject: mail.subject ?? '', at: new Date(parseInt(id.split('-')[0] ?? '0', 36)).toISOString(),
      text: mail.text ?? '', html: mail.html === false ? null : (mail.html ?? null),
    };
  }
}
