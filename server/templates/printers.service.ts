import { randomUUID } from 'node:crypto';
import { correctionFrom, type AxisVerdict, type MeasuredBars } from '../../shared/templates/printer-correction.ts';
import type { Printer } from '../../shared/templates/templates.api.ts';
import type { PrinterRow } from '../database/entities/printers.ts';
import { notFound, ProblemError } from '../http/problems.ts';
import type { Who } from '../http/who.ts';
import type { PrintersRepository } from './printers.repository.ts';

const mostPrinters = 50;

/** The shop's printers and what was measured on their prints. */
export function printersService(printers: PrintersRepository, clock: () => Date) {
  async function known(who: Who, printerId: string): Promise<PrinterRow> {
    const row = await printers.find(who.shopId, printerId);
    if (!row) throw notFound('printer');
    return row;
  }

  return {
    list: async (who: Who): Promise<Printer[]> => (await printers.ofShop(who.shopId)).map(told),

    read: async (who: Who, printerId: string): Promise<Printer> => told(await known(who, printerId)),

    async add(who: Who, name: string): Promise<Printer> {
      if ((await printers.ofShop(who.shopId)).length >= mostPrinters) throw new ProblemError('bad-input', `A shop keeps at most ${mostPrinters} printers.`);
      const row: PrinterRow = { id: randomUUID(), shopId: who.shopId, name, correctionX: 1, correctionY: 1, measuredAt: null, createdAt: clock() };
      await printers.add(row);
      return told(row);
    },

    /** Corrects both axes, or neither where one of them shows a wrong print setting. */
    async measure(who: Who, printerId: string, bars: MeasuredBars): Promise<{ printer: Printer; across: AxisVerdict; up: AxisVerdict }> {
      const row = await known(who, printerId);
      const across = correctionFrom(bars.across, 'across', bars.printedWith.x, bars.divisionMm, bars.units);
      const up = correctionFrom(bars.up, 'up', bars.printedWith.y, bars.divisionMm, bars.units);
      const refused = [across, up].flatMap((a, i) => (a.kind === 'refused' ? [{ path: i === 0 ? 'across.measuredMm' : 'up.measuredMm', words: a.words }] : []));
      if (across.kind === 'refused' || up.kind === 'refused') throw new ProblemError('bad-input', refused.map((r) => r.words).join(' '), { fields: refused });
      const values = { correctionX: across.verdict.factor, correctionY: up.verdict.factor, measuredAt: clock() };
      await printers.change(row.id, values);
      return { printer: told({ ...row, ...values }), across: across.verdict, up: up.verdict };
    },

    async remove(who: Who, printerId: string): Promise<void> {
      await printers.remove((await known(who, printerId)).id);
    },
  };
}
export type PrintersService = ReturnType<typeof printersService>;

const told = ({ id, name, correctionX, correctionY, measuredAt }: PrinterRow): Printer => ({ id, name, correctionX, correctionY, measuredAt: measuredAt?.toISOString() ?? null });
