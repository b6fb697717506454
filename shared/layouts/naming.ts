const A = 'A'.charCodeAt(0);

/** The revision letter after the given one, as drawings are lettered: A, B … Z, AA, AB … */
export function nextLetter(letter: string): string {
  if (!/^[A-Z]+$/.test(letter)) throw new RangeError(`A revision letter is made of A to Z, not "${letter}".`);
  const places = [...letter].map((c) => c.charCodeAt(0) - A);
  let i = places.length - 1;
  while (i >= 0 && places[i] === 25) places[i--] = 0;
  if (i < 0) places.unshift(0);
  else places[i] = (places[i] ?? 0) + 1;
  return String.fromCharCode(...places.map((p) => p + A));
}

/** The label for the next frame placed: one more than the highest number in use, so that a label on paper is not given twice while its frame hangs. */
export function nextLabel(frames: Iterable<{ label: string }>): string {
  let highest = 0;
  for (const { label } of frames) if (/^\d{1,6}$/.test(label)) highest = Math.max(highest, Number(label));
  return String(highest + 1);
}

/** Order of labels as a person counts: 2 before 10, numbers before words. */
export function byLabel(a: { label: string }, b: { label: string }): number {
  const na = /^\d+$/.test(a.label) ? Number(a.label) : Infinity;
  const nb = /^\d+$/.test(b.label) ? Number(b.label) : Infinity;
  if (na !== nb) return na - nb;
  return a.label < b.label ? -1 : a.label > b.label ? 1 : 0;
}
