import type { Figure } from '../units/figure.ts';

export const weights = ['stop', 'caution', 'note'] as const;
/** stop: not to be hung so. caution: a person must decide. note: good to know. */
export type Weight = (typeof weights)[number];

/** One result of a check. */
export interface Finding {
  /** The rule and what it is about: the same finding keeps its name while things move. */
  id: string;
  rule: string;
  weight: Weight;
  title: string;
  words: string;
  frameIds: string[];
  /** `frameId/hangerId`. */
  hangerIds: string[];
  readonly figures: readonly Figure[];
  source: string;
}

/** What a rule finds; the engine adds the rule's own words. */
export interface Found {
  /** What it is about, unlike any other of the rule. */
  about: string;
  weight: Weight;
  words: string;
  frameIds: string[];
  hangerIds?: string[];
  /** The figures, or how to work them out once someone opens the finding. */
  figures?: Figure[] | (() => Figure[]);
}
