import { In, IsNull, type DataSource } from 'typeorm';
import { LayoutRow, LinkRow, RevisionRow } from '../database/entities/layouts.ts';
import { duplicateKey, errorNumber, inTransaction, type Transaction } from '../database/transaction.ts';

export type RevisionWithLayout = RevisionRow & { layout: LayoutRow };
export type LinkWithRevision = LinkRow & { revision: RevisionWithLayout };

export function signoffsRepository(data: DataSource) {
  const revisions = data.getRepository(RevisionRow);
  const links = data.getRepository(LinkRow);
  return {
    /**
     * Writes a revision, the link to it and whatever `also` posts, all or nothing; earlier revisions of the layout that
     * wait on the client are superseded. False when another send took the letter first.
     */
    async send(revision: RevisionRow, link: LinkRow, also: (t: Transaction) => Promise<void>): Promise<boolean> {
      try {
        await inTransaction(data, async (m) => {
          await m.update(RevisionRow, { layoutId: revision.layoutId, state: In(['with client', 'changes asked']) }, { state: 'superseded' });
          await m.insert(RevisionRow, revision);
          await m.insert(LinkRow, link);
          await also(m);
        });
        return true;
      } catch (error) {
        if (errorNumber(error) === duplicateKey) return false;
        throw error;
      }
    },
    async addLink(link: LinkRow, also: (t: Transaction) => Promise<void>): Promise<void> {
      await inTransaction(data, async (m) => {
        await m.insert(LinkRow, link);
        await also(m);
      });
    },
    async revision(shopId: string, id: string): Promise<RevisionWithLayout | null> {
      return (await revisions.findOne({ where: { id, shopId }, relations: { layout: true } })) as RevisionWithLayout | null;
    },
    async ofJob(shopId: string, jobId: string): Promise<RevisionWithLayout[]> {
      return (await revisions.find({ where: { shopId, layout: { jobId } }, relations: { layout: true }, order: { sentAt: 'ASC', letter: 'ASC' } })) as RevisionWithLayout[];
    },
    async linksOf(shopId: string, jobId: string): Promise<LinkWithRevision[]> {
      return (await links.find({ where: { shopId, jobId }, relations: { revision: { layout: true } }, order: { createdAt: 'DESC' } })) as LinkWithRevision[];
    },
    async linkByHash(tokenHash: string): Promise<LinkWithRevision | null> {
      return (await links.findOne({ where: { tokenHash }, relations: { revision: { layout: true } } })) as LinkWithRevision | null;
    },
    async link(shopId: string, id: string): Promise<LinkRow | null> {
      return links.findOneBy({ shopId, id });
    },
    async revoke(id: string, now: Date): Promise<void> {
      await links.update({ id, revokedAt: IsNull() }, { revokedAt: now });
    },
    /** Signs where the revision still waits on the client; other options on the same wall, and what was signed before, step back. */
    async sign(revision: RevisionWithLayout, values: { signedName: string; signedAt: Date; consent: string }, also: (t: Transaction) => Promise<void>): Promise<boolean> {
      return inTransaction(data, async (m) => {
        const result = await m.update(RevisionRow, { id: revision.id, state: 'with client' }, { ...values, state: 'signed' });
        if (result.affected !== 1) return false;
        const onWall = await m.find(LayoutRow, { where: { wallId: revision.layout.wallId }, select: { id: true } });
        const others = (await m.find(RevisionRow, { where: { layoutId: In(onWall.map((l) => l.id)), state: In(['with client', 'signed', 'changes asked']) }, select: { id: true } }))
          .map((r) => r.id)
          .filter((id) => id !== revision.id);
        if (others.length > 0) await m.update(RevisionRow, { id: In(others) }, { state: 'superseded' });
        await also(m);
        return true;
      });
    },
    async askChanges(id: string, words: string, also: (t: Transaction) => Promise<void>): Promise<boolean> {
      return inTransaction(data, async (m) => {
        const result = await m.update(RevisionRow, { id, state: 'with client' }, { state: 'changes asked', askedFor: words });
        if (result.affected !== 1) return false;
        await also(m);
        return true;
      });
    },
  };
}
export type SignoffsRepository = ReturnType<typeof signoffsRepository>;
