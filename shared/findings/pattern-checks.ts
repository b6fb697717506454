import type { LayoutPattern } from '../layouts/layout.ts';
import type { Figure } from '../units/figure.ts';
import type { Weight } from './finding.ts';
import type { PatternRule } from './rule.ts';
import { rules } from './rules.ts';
import type { Surroundings } from './scene.ts';

/** What the rules on patterns say of one design by itself, before any frame of it is placed. */
export interface PatternCheck {
  id: string;
  title: string;
  weight: Weight;
  words: string;
  source: string;
  figures: Figure[];
}

const patternRules = rules.filter((rule): rule is PatternRule => rule.of === 'pattern');

export function patternChecks(pattern: LayoutPattern, around: Omit<Surroundings, 'wall'>): PatternCheck[] {
  return patternRules.flatMap((rule) =>
    rule.check(pattern, around).map(({ about, weight, words, figures }) => ({
      id: `${rule.id}: ${about}`, title: rule.title, source: rule.source, weight, words, figures: typeof figures === 'function' ? figures() : (figures ?? []),
    })),
  );
}
