import { revisionWords } from './sheet-title.ts';
import type { TemplateInput } from './template-input.ts';

/** What the file says of itself: shown by readers in the window's title and the properties. */
export function templateFacts({ title, drawnAt }: TemplateInput): { title: string; subject: string; author: string } {
  return {
    title: `Hanging template: ${[title.job, title.wall, title.layout].filter(Boolean).join(', ')}, revision ${title.letter}`,
    subject: `${revisionWords(title)}. Print at 100 %. ${drawnAt}`,
    author: title.shop,
  };
}
