import { randomUUID } from 'node:crypto';
import type { Pattern, PatternDesign } from '../../shared/patterns/pattern.ts';
import type { PatternRow } from '../database/entities/layouts.ts';
import { notFound, ProblemError } from '../http/problems.ts';
import type { Who } from '../http/who.ts';
import type { PatternsRepository } from './patterns.repository.ts';

/** The shop's pattern book. */
export function patternsService(patterns: PatternsRepository, clock: () => Date) {
  return {
    list: async (who: Who): Promise<Pattern[]> => (await patterns.ofShop(who.shopId)).map(told),

    async create(who: Who, input: { name: string; design: PatternDesign }): Promise<Pattern> {
      const row = { id: randomUUID(), shopId: who.shopId, ...input, archived: false, version: 1, createdAt: clock() };
      await patterns.add(row);
      return told(row);
    },

    async change(who: Who, patternId: string, input: { name: string; design: PatternDesign; archived: boolean; version: number }): Promise<Pattern> {
      if (!(await patterns.find(who.shopId, patternId))) throw notFound('pattern');
      const { version, ...values } = input;
      const saved = await patterns.change(patternId, version, values);
      const row = await patterns.find(who.shopId, patternId);
      if (!row) throw notFound('pattern');
      if (!saved) throw new ProblemError('stale', 'Someone changed this pattern since you opened it.', { current: told(row) });
      return told(row);
    },

    /** The named patterns of a shop; ids of other shops are simply missing. */
    some: async (shopId: string, ids: readonly string[]): Promise<Pattern[]> => (await patterns.some(shopId, [...new Set(ids)])).map(told),
  };
}
export type PatternsService = ReturnType<typeof patternsService>;

const told = (row: PatternRow): Pattern => ({ id: row.id, name: row.name, design: row.design, version: row.version, archived: Boolean(row.archived) });
