import type { DataSource } from 'typeorm';
import { HardwareRow } from '../database/entities/hardware.ts';

export function hardwareRepository(data: DataSource) {
  const hardware = data.getRepository(HardwareRow);
  return {
    ofShop: (shopId: string) => hardware.find({ where: { shopId }, order: { createdAt: 'ASC', name: 'ASC', id: 'ASC' } }),
    find: (shopId: string, id: string) => hardware.findOneBy({ shopId, id }),
    add: async (rows: HardwareRow[]): Promise<void> => void (await hardware.insert(rows)),
    change: async (id: string, values: Pick<HardwareRow, 'name' | 'body'>): Promise<void> => void (await hardware.update({ id }, values)),
    remove: async (id: string): Promise<void> => void (await hardware.delete({ id })),
  };
}
export type HardwareRepository = ReturnType<typeof hardwareRepository>;
