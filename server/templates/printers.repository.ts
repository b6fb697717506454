import type { DataSource } from 'typeorm';
import { PrinterRow } from '../database/entities/printers.ts';

export function printersRepository(data: DataSource) {
  const printers = data.getRepository(PrinterRow);
  return {
    ofShop: (shopId: string) => printers.find({ where: { shopId }, order: { createdAt: 'ASC', id: 'ASC' } }),
    find: (shopId: string, id: string) => printers.findOneBy({ shopId, id }),
    add: async (row: PrinterRow): Promise<void> => void (await printers.insert(row)),
    change: async (id: string, values: Pick<PrinterRow, 'correctionX' | 'correctionY' | 'measuredAt'>): Promise<void> => void (await printers.update({ id }, values)),
    remove: async (id: string): Promise<void> => void (await printers.delete({ id })),
  };
}
export type PrintersRepository = ReturnType<typeof printersRepository>;
