import { In, type DataSource } from 'typeorm';
import { PatternRow } from '../database/entities/layouts.ts';

export function patternsRepository(data: DataSource) {
  const patterns = data.getRepository(PatternRow);
  return {
    add: async (row: PatternRow): Promise<void> => void (await patterns.insert(row)),
    ofShop: (shopId: string) => patterns.find({ where: { shopId }, order: { createdAt: 'ASC', id: 'ASC' } }),
    find: (shopId: string, id: string) => patterns.findOneBy({ shopId, id }),
    some: (shopId: string, ids: string[]) => (ids.length > 0 ? patterns.findBy({ shopId, id: In(ids) }) : Promise.resolve([])),
    /** Writes on the given version only; false when someone saved before. */
    change: async (id: string, version: number, values: Pick<PatternRow, 'name' | 'design' | 'archived'>): Promise<boolean> =>
      (await patterns.update({ id, version }, { ...values, version: version + 1 })).affected === 1,
  };
}
export type PatternsRepository = ReturnType<typeof patternsRepository>;
