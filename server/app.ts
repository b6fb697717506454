import { randomBytes, randomUUID } from 'node:crypto';
import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import compression from 'compression';
import cookieParser from 'cookie-parser';
import express, { type Express, type Request, type Response } from 'express';
import helmet from 'helmet';
import type { Logger } from 'pino';
import { developmentApi } from '../shared/api/development.api.ts';
import { healthApi } from '../shared/api/health.api.ts';
import type { Config } from './config.ts';
import type { Database } from './database/data-source.ts';
import type { FakeMailServer } from './fakes/mail-server.ts';
import { createFileStore } from './files/file-store.ts';
import { createReceiver } from './files/receive.ts';
import { hardwareRepository } from './hardware/hardware.repository.ts';
import { hardwareRoutes } from './hardware/hardware.routes.ts';
import { hardwareService } from './hardware/hardware.service.ts';
import { answerErrors, nothingHere } from './http/errors.ts';
import { limitPerMinute } from './http/limits.ts';
import { Mount, type Mounted } from './http/mount.ts';
import { openApiDocument } from './http/openapi.ts';
import { sameOriginOnly } from './http/origin.ts';
import { notFound } from './http/problems.ts';
import type { Who } from './http/who.ts';
import { jobsRepository } from './jobs/jobs.repository.ts';
import { jobsRoutes } from './jobs/jobs.routes.ts';
import { jobsService } from './jobs/jobs.service.ts';
import { layoutsRepository } from './layouts/layouts.repository.ts';
import { layoutsRoutes } from './layouts/layouts.routes.ts';
import { layoutsService } from './layouts/layouts.service.ts';
import type { Outbox } from './mail/outbox.ts';
import { patternsRepository } from './patterns/patterns.repository.ts';
import { patternsRoutes } from './patterns/patterns.routes.ts';
import { patternsService } from './patterns/patterns.service.ts';
import { peopleRepository } from './people/people.repository.ts';
import { peopleRoutes } from './people/people.routes.ts';
import { peopleService } from './people/people.service.ts';
import { sessionCookies } from './people/sessions.ts';
import { signoffsRepository } from './signoffs/signoffs.repository.ts';
import { signoffsRoutes } from './signoffs/signoffs.routes.ts';
import { signoffsService } from './signoffs/signoffs.service.ts';
import { printersRepository } from './templates/printers.repository.ts';
import { printersService } from './templates/printers.service.ts';
import { createTemplateStore } from './templates/template-store.ts';
import { templatesRoutes } from './templates/templates.routes.ts';
import { templatesService } from './templates/templates.service.ts';
import { wallsRepository } from './walls/walls.repository.ts';
import { wallsRoutes } from './walls/walls.routes.ts';
import { wallsService } from './walls/walls.service.ts';
import type { WorkerPool } from './workers/pool.ts';

export interface Parts {
  config: Config;
  data: Database;
  log: Logger;
  outbox: Outbox;
  pool: WorkerPool;
  /** null where a real mail server is set. */
  fakeMail: FakeMailServer | null;
  clock: () => Date;
  demo: { email: string; password: string; role: string; name: string }[] | null;
  /** Work factor of password hashes; tests lower it. */
  bcryptCost?: number;
}

/** Wires every room together; the one place that knows them all. */
export function createApp(parts: Parts): { app: Express; mounted: Mounted[]; rooms: Rooms } {
  const { config, data, log } = parts;
  const rooms = createRooms(parts);
  const cookies = sessionCookies(config.jwtSecret, config.appOrigin.startsWith('https:'));

  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', config.trustProxy);
  app.set('query parser', 'simple');
  app.use((req, res, next) => {
    res.locals.requestId = randomUUID();
    res.locals.nonce = randomBytes(16).toString('base64');
    res.set('X-Request-Id', res.locals.requestId as string);
    const started = performance.now();
    res.on('finish', () => log.debug({ requestId: res.locals.requestId, method: req.method, path: withoutToken(req.path), status: res.statusCode, ms: Math.round(performance.now() - started) }, 'request'));
    next();
  });
  app.use(securityHeaders(config));
  app.use(compression());
  const api = express.Router();
  app.use('/api', limitPerMinute(config.limits.general, 'requests'), sameOriginOnly(config.appOrigin), cookieParser(), express.json({ limit: '2mb' }));
  app.use(api);

  const mount = new Mount(api, {
    async whoOf(req: Request): Promise<Who | null> {
      const claims = cookies.claims(req);
      return claims ? rooms.people.whoIs(claims) : null;
    },
    limits: {
      'sign-in': limitPerMinute(config.limits.signIn, 'tries'),
      mail: limitPerMinute(config.limits.mail, 'messages'),
      heavy: limitPerMinute(config.limits.heavy, 'uploads or papers'),
    },
    receiveFile: createReceiver(config.dataDir),
    developing: !config.production,
  });

  mount.on(healthApi.health, async ({ res }) => {
    const database = await data.query('SELECT 1').then(() => 'up' as const, () => 'down' as const);
    if (database === 'down') res.status(503);
    const reply = { process: 'up' as const, database, development: !config.production, demo: parts.demo };
    if (database === 'down') res.json(reply);
    return reply;
  });
  mount.on(healthApi.document, async () => openApiDocument(mount.mounted.map((m) => m.endpoint)));
  mount.on(developmentApi.mailbox, async () => (await parts.fakeMail?.list()) ?? []);
  mount.on(developmentApi.mail, async ({ params }) => {
    const mail = await parts.fakeMail?.read(params.mailId);
    if (!mail) throw notFound('message');
    return mail;
  });
  mount.on(developmentApi.mailPage, async ({ params, res }) => {
    const mail = await parts.fakeMail?.read(params.mailId);
    if (!mail) throw notFound('message');
    // As a mail reader would show it: its own inline styles, and nothing else.
    res.set('Content-Security-Policy', "default-src 'none'; style-src 'unsafe-inline'; frame-ancestors 'self'; sandbox allow-popups allow-top-navigation-by-user-activation").type('html').send(mail.html ?? '');
  });
  peopleRoutes(mount, rooms.people, cookies);
  jobsRoutes(mount, rooms.jobs);
  hardwareRoutes(mount, rooms.hardware);
  patternsRoutes(mount, rooms.patterns);
  wallsRoutes(mount, rooms.walls);
  layoutsRoutes(mount, rooms.layouts);
  signoffsRoutes(mount, rooms.signoffs);
  templatesRoutes(mount, rooms.templates, rooms.printers);

  app.use('/api', nothingHere);
  servePages(app);
  app.use(nothingHere);
  app.use(answerErrors(log));
  return { app, mounted: mount.mounted, rooms };
}

function createRooms({ config, data, outbox, pool, clock, bcryptCost }: Parts) {
  const files = createFileStore(config.dataDir);
  const hardware = hardwareService(hardwareRepository(data), clock);
  const people = peopleService(peopleRepository(data), clock, hardware.stockUp, bcryptCost);
  const jobs = jobsService(jobsRepository(data), people, clock);
  const patterns = patternsService(patternsRepository(data), clock);
  const walls = wallsService({ walls: wallsRepository(data), jobs, files, pool, clock });
  const layouts = layoutsService({ layouts: layoutsRepository(data), jobs, walls, patterns, clock });
  const signoffs = signoffsService({ signoffs: signoffsRepository(data), layouts, jobs, walls, people, files, outbox, origin: config.appOrigin, clock });
  const printers = printersService(printersRepository(data), clock);
  const templates = templatesService({ layouts, jobs, people, hardware, printers, store: createTemplateStore(config.dataDir), pool, clock });
  jobs.lookAt({
    wallsOf: (job) => walls.ofJob(job.shopId, job.id),
    layoutsOf: (job) => layouts.ofJob(job.shopId, job.id),
  });
  return { people, hardware, jobs, patterns, walls, layouts, signoffs, printers, templates };
}
export type Rooms = ReturnType<typeof createRooms>;

/** The one style sheet that the toaster library writes into the page, by its hash (it takes no nonce), and an empty one. */
const toasterStyles = ["'sha256-StEaX+se6YS7pqjzrzMIA0KaX9zF/8zAhvQXZAe5epY='", "'sha256-47DEQpj8HBSa+/TImW+5JCeuQeRkm5NMpJWZG3hSuFU='"];

function securityHeaders(config: Config) {
  const https = config.appOrigin.startsWith('https:');
  const styleSrc = ["'self'", (_req: unknown, res: unknown) => `'nonce-${(res as Response).locals.nonce as string}'`, ...toasterStyles];
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"], scriptSrc: ["'self'"], styleSrc, imgSrc: ["'self'", 'blob:', 'data:'], fontSrc: ["'self'"],
        connectSrc: ["'self'"], objectSrc: ["'none'"], baseUri: ["'none'"], frameAncestors: ["'none'"], formAction: ["'self'"], workerSrc: ["'self'", 'blob:'],
        ...(https ? { upgradeInsecureRequests: [] } : {}),
      },
    },
    strictTransportSecurity: https ? { maxAge: 31_536_000 } : false,
    referrerPolicy: { policy: 'no-referrer' },
    crossOriginEmbedderPolicy: false,
  });
}

/** The built pages; every address that is not a file is the application's own to route. */
function servePages(app: Express): void {
  const dist = path.resolve(import.meta.dirname, '../dist');
  if (!existsSync(path.join(dist, 'index.html'))) return;
  app.use('/assets', express.static(path.join(dist, 'assets'), { immutable: true, maxAge: '365d', fallthrough: false }));
  app.use(express.static(dist, { index: false, maxAge: 0 }));
  const page = readFileSync(path.join(dist, 'index.html'), 'utf8');
  app.get('/{*page}', (_req, res) => {
    res.set('Cache-Control', 'no-store').type('html').send(page.replaceAll('%CSP_NONCE%', res.locals.nonce as string));
  });
}

/** A client's token opens doors: it stays out of the log. */
const withoutToken = (address: string) => address.replace(/\/(portal|p)\/[^/]+/, '/$1/…');
