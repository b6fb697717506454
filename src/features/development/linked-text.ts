export interface TextPart {
  text: string;
  /** Address, where the part is a link. */
  href?: string;
}

/** Splits plain text at its http addresses; punctuation that ends a sentence is not part of them. */
export function linkedText(text: string): TextPart[] {
  const parts: TextPart[] = [];
  let from = 0;
  for (const match of text.matchAll(/https?:\/\/[^\s<>"]+/g)) {
    const href = match[0].replace(/[.,;:!?)\]]+$/, '');
    if (match.index > from) parts.push({ text: text.slice(from, match.index) });
    parts.push({ text: href, href });
    from = match.index + href.length;
  }
  if (from < text.length) parts.push({ text: text.slice(from) });
  return parts;
}
