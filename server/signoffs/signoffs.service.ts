import { randomUUID } from 'node:crypto';
import type { BodyOf } from '../../shared/api/endpoint.ts';
import type { Layout } from '../../shared/layouts/layout.ts';
import { canonicalText, contentText, Snapshot } from '../../shared/signoffs/snapshot.ts';
import type { Link, Portal, PortalRevision, signoffsApi } from '../../shared/signoffs/signoffs.api.ts';
import type { LinkRow } from '../database/entities/layouts.ts';
import type { FileStore } from '../files/file-store.ts';
import { notFound, ProblemError } from '../http/problems.ts';
import type { Who } from '../http/who.ts';
import type { JobsService } from '../jobs/jobs.service.ts';
import { sha256, type LayoutsService } from '../layouts/layouts.service.ts';
import type { Outbox } from '../mail/outbox.ts';
import type { PeopleService } from '../people/people.service.ts';
import { hashToken, newToken } from '../http/tokens.ts';
import type { WallsService } from '../walls/walls.service.ts';
import { letters } from './letters.ts';
import type { LinkWithRevision, RevisionWithLayout, SignoffsRepository } from './signoffs.repository.ts';

/** How long a client's link stays open. */
const linkDays = 30;
export const consent = 'I have looked at this layout on my wall, and agree that it is made and hung as shown here.';

interface Needs {
  signoffs: SignoffsRepository;
  layouts: LayoutsService;
  jobs: JobsService;
  walls: WallsService;
  people: PeopleService;
  files: FileStore;
  outbox: Outbox;
  origin: string;
  clock: () => Date;
}

/** What goes to the client, what comes back, and the record of it. */
export function signoffsService({ signoffs, layouts, jobs, walls, people, files, outbox, origin, clock }: Needs) {
  const dayText = (date: Date) => date.toISOString().slice(0, 10);

  async function linkFor(token: string): Promise<LinkWithRevision> {
    const link = await signoffs.linkByHash(hashToken(token));
    if (!link) throw new ProblemError('not-found', 'This link is not known. Please open it from the mail again, whole.');
    if (link.revokedAt) throw new ProblemError('gone', 'The shop has closed this link. Please ask them for a new one.');
    if (link.expiresAt <= clock()) throw new ProblemError('gone', 'This link is past its time. Please ask the shop for a new one.');
    return link;
  }

  /** The revision named in the address, where this link's job holds it. */
  async function revisionFor(token: string, revisionId: string): Promise<{ link: LinkWithRevision; revision: RevisionWithLayout }> {
    const link = await linkFor(token);
    const revision = await signoffs.revision(link.shopId, revisionId);
    if (!revision || revision.layout.jobId !== link.jobId) throw notFound('revision');
    return { link, revision };
  }

  function requireOpen(revision: RevisionWithLayout): void {
    if (revision.state === 'with client') return;
    const words = {
      signed: 'This revision is already signed.',
      'changes asked': 'You have asked for changes to this revision; the shop will send a new one.',
      superseded: 'A newer revision has taken the place of this one. Please open the newest mail.',
      draft: 'This revision is not open.',
    }[revision.state as Exclude<RevisionWithLayout['state'], 'with client'>];
    throw new ProblemError('gone', words);
  }

  return {
    async send(who: Who, layoutId: string, { version, note }: BodyOf<typeof signoffsApi.send>): Promise<Layout> {
      const { whole, content, told } = await layouts.whole(who, layoutId);
      const { layout } = whole;
      if (layout.version !== version) throw new ProblemError('stale', 'The layout changed since you opened it. Look again before you send.', { current: told });
      if (content.frames.length === 0) throw new ProblemError('bad-input', 'There is no frame on the wall yet: place one before sending.');
      const job = await jobs.jobFor(who, layout.jobId);
      const shop = await people.shopOf(who.shopId);
      const now = clock();
      const token = newToken();
      const expiresAt = new Date(now.getTime() + linkDays * 86_400_000);
      const letterOf = (letter: string) =>
        letters.request({ client: job.clientName, shop: shop.name, job: job.title, layout: layout.name, letter, note, url: `${origin}/p/${token}`, until: dayText(expiresAt) });
      const to = { shopId: who.shopId, address: job.clientEmail, replyTo: shop.replyTo };
      const link = (revisionId: string): LinkRow => ({
        id: randomUUID(), shopId: who.shopId, revisionId, jobId: job.id, tokenHash: hashToken(token), sentTo: job.clientEmail, createdAt: now, expiresAt, revokedAt: null,
      });

      const last = whole.revisions.at(-1);
      if (last && told.state !== 'draft') {
        if (last.state === 'signed') throw new ProblemError('conflict', 'This revision is signed. Change the layout to make the next one.');
        if (last.state === 'changes asked') throw new ProblemError('conflict', 'The client asked for changes to this very revision. Change the layout, then send.');
        await signoffs.addLink(link(last.id), (t) => outbox.post(to, letterOf(last.letter), t));
        return layouts.read(who, layoutId);
      }

      const revisionId = randomUUID();
      const snapshot: Snapshot = { format: 1, shop: shop.name, job: job.title, client: job.clientName, letter: told.letter, note, ...content };
      const canonical = canonicalText(snapshot);
      const picture = await walls.elevationOf(who.shopId, layout.wallId);
      // The picture is copied, so that a photo taken off the wall later does not take the record along.
      const elevationKey = picture && content.elevation?.sha256 === picture.sha256 ? await files.copy(who.shopId, picture.key) : null;
      const sent = await signoffs.send(
        {
          id: revisionId, shopId: who.shopId, layoutId, letter: told.letter, state: 'with client', canonical, sha256: sha256(canonical),
          contentSha256: sha256(contentText(content)), elevationKey, sentAt: now, signedAt: null, signedName: null, consent: null, askedFor: null,
        },
        link(revisionId),
        (t) => outbox.post(to, letterOf(told.letter), t),
      );
      if (!sent) {
        if (elevationKey) await files.remove(elevationKey);
        throw new ProblemError('stale', 'This layout was just sent by someone else.', { current: await layouts.read(who, layoutId) });
      }
      await jobs.touch(job);
      return layouts.read(who, layoutId);
    },

    async links(who: Who, jobId: string): Promise<Link[]> {
      await jobs.jobFor(who, jobId);
      return (await signoffs.linksOf(who.shopId, jobId)).map((l) => ({
        id: l.id, letter: l.revision.letter, layoutName: l.revision.layout.name, sentTo: l.sentTo,
        createdAt: l.createdAt.toISOString(), expiresAt: l.expiresAt.toISOString(), revokedAt: l.revokedAt?.toISOString() ?? null,
      }));
    },

    async revoke(who: Who, linkId: string): Promise<void> {
      const link = await signoffs.link(who.shopId, linkId);
      if (!link) throw notFound('link');
      await signoffs.revoke(linkId, clock());
    },

    async record(who: Who, revisionId: string) {
      const revision = await signoffs.revision(who.shopId, revisionId);
      if (!revision) throw notFound('revision');
      await jobs.jobFor(who, revision.layout.jobId);
      return {
        canonical: revision.canonical, sha256: revision.sha256, verified: sha256(revision.canonical) === revision.sha256, state: revision.state,
        signedName: revision.signedName, signedAt: revision.signedAt?.toISOString() ?? null, consent: revision.consent,
      };
    },

    async portal(token: string): Promise<Portal> {
      const link = await linkFor(token);
      const [shop, job, revisions] = await Promise.all([
        people.shopOf(link.shopId), jobs.ofShop(link.shopId, link.jobId), signoffs.ofJob(link.shopId, link.jobId),
      ]);
      if (!job) throw notFound('job');
      const newest = new Map(revisions.map((r) => [r.layoutId, r]));
      const shown = revisions.filter((r) => newest.get(r.layoutId) === r || r.id === link.revisionId);
      return {
        shopName: shop.name, jobTitle: job.title, clientName: job.clientName, units: shop.units, expiresAt: link.expiresAt.toISOString(), consent,
        revisions: shown.map((r) => portalRevision(token, r)),
      };
    },

    async portalElevation(token: string, revisionId: string): Promise<string> {
      const { revision } = await revisionFor(token, revisionId);
      if (!revision.elevationKey) throw notFound('picture');
      return revision.elevationKey;
    },

    /** Freezes the client's yes. Signing the same revision twice in the same name is one signature. */
    async sign(token: string, revisionId: string, input: BodyOf<typeof signoffsApi.sign>): Promise<PortalRevision> {
      const { link, revision } = await revisionFor(token, revisionId);
      if (revision.state === 'signed' && revision.signedName === input.name) return portalRevision(token, revision);
      requireOpen(revision);
      if (input.sha256 !== revision.sha256) throw new ProblemError('stale', 'The page showed another revision than the one to be signed. Please load it again.');
      const shop = await people.shopOf(link.shopId);
      const job = await jobs.ofShop(link.shopId, link.jobId);
      if (!job) throw notFound('job');
      const snapshot = verified(revision);
      const signedAt = clock();
      const about = { client: job.clientName, shop: shop.name, job: job.title, layout: snapshot.sheet.name, letter: revision.letter, name: input.name, sha256: revision.sha256 };
      const done = await signoffs.sign(revision, { signedName: input.name, signedAt, consent }, async (t) => {
        if (shop.replyTo) {
          await outbox.post({ shopId: link.shopId, address: shop.replyTo, replyTo: job.clientEmail }, letters.signed({ ...about, url: `${origin}/jobs/${job.id}` }), t);
        }
        await outbox.post({ shopId: link.shopId, address: job.clientEmail, replyTo: shop.replyTo }, letters.copy({ ...about, at: dayText(signedAt) }), t);
      });
      const { revision: now } = await revisionFor(token, revisionId);
      if (!done && !(now.state === 'signed' && now.signedName === input.name)) requireOpen(now);
      if (done) await jobs.signed(job);
      return portalRevision(token, now);
    },

    async askChanges(token: string, revisionId: string, { words }: BodyOf<typeof signoffsApi.askChanges>): Promise<PortalRevision> {
      const { link, revision } = await revisionFor(token, revisionId);
      requireOpen(revision);
      const shop = await people.shopOf(link.shopId);
      const job = await jobs.ofShop(link.shopId, link.jobId);
      if (!job) throw notFound('job');
      const letter = letters.changes({ client: job.clientName, job: job.title, layout: revision.layout.name, letter: revision.letter, words, url: `${origin}/jobs/${job.id}` });
      const done = await signoffs.askChanges(revisionId, words, async (t) => {
        if (shop.replyTo) await outbox.post({ shopId: link.shopId, address: shop.replyTo, replyTo: job.clientEmail }, letter, t);
      });
      const { revision: now } = await revisionFor(token, revisionId);
      if (!done) requireOpen(now);
      return portalRevision(token, now);
    },

    /** Streams a stored picture to a reply. */
    files,
  };
}
export type SignoffsService = ReturnType<typeof signoffsService>;

/** The frozen layout, after its hash was found to fit. */
function verified(revision: RevisionWithLayout): Snapshot {
  if (sha256(revision.canonical) !== revision.sha256) {
    throw new ProblemError('conflict', 'The record of this revision does not match its hash. It cannot be shown or signed; please tell the shop.');
  }
  return Snapshot.parse(JSON.parse(revision.canonical));
}

function portalRevision(token: string, r: RevisionWithLayout): PortalRevision {
  return {
    id: r.id, letter: r.letter, layoutName: r.layout.name, state: r.state, sha256: r.sha256, sentAt: r.sentAt.toISOString(),
    signedAt: r.signedAt?.toISOString() ?? null, signedName: r.signedName, askedFor: r.askedFor, snapshot: verified(r),
    elevationUrl: r.elevationKey ? `/api/portal/${token}/revisions/${r.id}/elevation` : null,
  };
}
