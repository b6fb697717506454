import { pino } from 'pino';
import { createApp } from './app.ts';
import { ConfigError, readConfig, type Config } from './config.ts';
import { createDataSource } from './database/data-source.ts';
import { demoAccounts } from './database/seed/accounts.ts';
import { seedDemo } from './database/seed/seed.ts';
import { FakeMailServer } from './fakes/mail-server.ts';
import { createOutbox } from './mail/outbox.ts';
import { outboxRepository } from './mail/outbox.repository.ts';
import { createPool } from './workers/pool.ts';

async function main(config: Config): Promise<void> {
  const log = pino({ level: config.logLevel, redact: ['req.headers.cookie', 'req.headers.authorization'] }, pino.destination(2));
  const data = await createDataSource(config.databaseUrl).initialize();
  await data.runMigrations();

  const fakeMail = config.smtpUrl ? null : new FakeMailServer(config.dataDir);
  const smtpUrl = config.smtpUrl ?? (await fakeMail!.start());
  const clock = () => new Date();
  const outbox = createOutbox(outboxRepository(data), { smtpUrl, from: config.mailFrom, clock, log });
  const pool = createPool();
  const { app, rooms } = createApp({ config, data, log, outbox, pool, fakeMail, clock, demo: config.demo ? demoAccounts : null });
  if (config.demo) await seedDemo(data, rooms);

  const server = app.listen(config.port, config.host, (error?: Error) => {
    if (error) {
      process.stderr.write(`The server cannot listen on ${config.host}:${config.port}: ${error.message}. Another PORT may be set.\n`);
      process.exit(1);
    }
    const address = server.address();
    const port = typeof address === 'object' && address ? address.port : config.port;
    process.stdout.write(`Combwright is at ${config.appOrigin.replace(/:0$/, `:${port}`)}\n`);
  });
  server.requestTimeout = 10 * 60_000;
  outbox.start();

  let stopping = false;
  const stop = async () => {
    if (stopping) return;
    stopping = true;
    server.close();
    server.closeIdleConnections();
    const patience = setTimeout(() => server.closeAllConnections(), 5000);
    await outbox.stop();
    await pool.close();
    await fakeMail?.stop();
    await data.destroy();
    clearTimeout(patience);
    server.closeAllConnections();
    process.exit(0);
  };
  process.on('SIGTERM', () => void stop());
  process.on('SIGINT', () => void stop());
}

try {
  await main(readConfig(process.env));
} catch (error) {
  process.stderr.write(error instanceof ConfigError ? `${error.message}\n` : `The server could not start: ${(error as Error).stack ?? String(error)}\n`);
  process.exit(1);
}
