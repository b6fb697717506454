import { randomUUID } from 'node:crypto';
import type { Anchor } from '../../shared/hardware/anchors.ts';
import type { Bracket } from '../../shared/hardware/brackets.ts';
import type { HardwareBook } from '../../shared/hardware/hardware-book.ts';
import type { HardwareItem } from '../../shared/hardware/hardware.api.ts';
import { standardLagScrew, standardWoodScrew, type Screw } from '../../shared/hardware/screws.ts';
import { MM_PER_INCH } from '../../shared/units/constants.ts';
import type { HardwareRow } from '../database/entities/hardware.ts';
import { notFound, ProblemError } from '../http/problems.ts';
import type { Who } from '../http/who.ts';
import type { HardwareRepository } from './hardware.repository.ts';

/** Screws that a new shop finds in its book: usual sizes at usual lengths, by the published dimensions. */
const usualScrews: HardwareItem[] = [
  ...([['#8', 1.25], ['#8', 2], ['#10', 1.5], ['#10', 1.75], ['#10', 2], ['#10', 2.5], ['#10', 3], ['#12', 2.5], ['#12', 3], ['#14', 3]] as const).map(([size, inches]): HardwareItem => ({
    kind: 'screw', name: `Wood screw ${size} × ${inchText(inches)}`, body: standardWoodScrew(size, inches * MM_PER_INCH),
  })),
  ...([['1/4', 2.5], ['1/4', 3], ['5/16', 3]] as const).map(([size, inches]): HardwareItem => ({
    kind: 'screw', name: `Lag screw ${size} × ${inchText(inches)}`, body: standardLagScrew(size, inches * MM_PER_INCH),
  })),
];

function inchText(inches: number): string {
  const whole = Math.floor(inches);
  const part = { 0: '', 0.25: ' 1/4', 0.5: ' 1/2', 0.75: ' 3/4' }[inches - whole] ?? '';
  return `${whole}${part} in`;
}

/** The shop's hardware book. */
export function hardwareService(hardware: HardwareRepository, clock: () => Date) {
  const bookOf = async (shopId: string): Promise<HardwareBook> => {
    const rows = await hardware.ofShop(shopId);
    const entries = <T>(kind: HardwareRow['kind']) => rows.filter((r) => r.kind === kind).map((r) => ({ ...r.body, id: r.id, name: r.name }) as T);
    return { screws: entries<Screw>('screw'), brackets: entries<Bracket>('bracket'), anchors: entries<Anchor>('anchor') };
  };

  const row = (shopId: string, item: HardwareItem): HardwareRow => ({ id: randomUUID(), shopId, ...item, createdAt: clock() });

  async function requireScrew(shopId: string, item: HardwareItem): Promise<void> {
    if (item.kind !== 'bracket' || item.body.frameScrewId === null) return;
    const screw = await hardware.find(shopId, item.body.frameScrewId);
    if (screw?.kind !== 'screw') {
      throw new ProblemError('bad-input', 'The screw into the frame is not in your hardware book.', { fields: [{ path: 'body.frameScrewId', words: 'Choose a screw of your book.' }] });
    }
  }

  return {
    bookOf,
    book: (who: Who) => bookOf(who.shopId),

    /** Fills a new shop's book with the usual screws. */
    stockUp: async (shopId: string): Promise<void> => hardware.add(usualScrews.map((item) => row(shopId, item))),

    async add(who: Who, item: HardwareItem): Promise<HardwareBook> {
      await requireScrew(who.shopId, item);
      await hardware.add([row(who.shopId, item)]);
      return bookOf(who.shopId);
    },

    async change(who: Who, hardwareId: string, item: HardwareItem): Promise<HardwareBook> {
      const known = await hardware.find(who.shopId, hardwareId);
      if (!known) throw notFound('entry');
      if (known.kind !== item.kind) throw new ProblemError('conflict', `This entry is a ${known.kind}; it cannot become a ${item.kind}.`);
      await requireScrew(who.shopId, item);
      await hardware.change(hardwareId, { name: item.name, body: item.body });
      return bookOf(who.shopId);
    },

    async remove(who: Who, hardwareId: string): Promise<void> {
      if (!(await hardware.find(who.shopId, hardwareId))) throw notFound('entry');
      await hardware.remove(hardwareId);
    },
  };
}
export type HardwareService = ReturnType<typeof hardwareService>;
