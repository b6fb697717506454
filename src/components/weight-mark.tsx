export type FindingWeight = 'stop' | 'caution' | 'note';

/** The outline of each weight's mark, as an SVG path in a square of 20. */
export const weightShapes: Record<FindingWeight, string> = {
  stop: 'M7 1.500h6l5.500 5.500v6L13 18.500H7L1.500 13V7z',
  caution: 'M10 2l8.700 16H1.300z',
  note: 'M10 1.500a8.500 8.500 0 1 0 .001 0z',
};

const looks: Record<FindingWeight, { word: string; colour: string }> = {
  stop: { word: 'Stop', colour: 'text-madder-600' },
  caution: { word: 'Caution', colour: 'text-ochre-600' },
  note: { word: 'Note', colour: 'text-ink-500' },
};

/** How heavy something weighs, by shape and by word: stop is an octagon, caution a triangle, note a circle. */
export function WeightMark({ weight, wordHidden = false }: { weight: FindingWeight; wordHidden?: boolean }) {
  const { word, colour } = looks[weight];
  return (
    <span className={`inline-flex items-center gap-1 font-semibold ${colour}`}>
      <svg viewBox="0 0 20 20" aria-hidden="true" className="size-4 shrink-0">
        <path d={weightShapes[weight]} fill="currentColor" />
        {weight === 'note' ? null : <path d="M10 6.500v5.500M10 13.800v1.700" strokeWidth="1.800" className="stroke-white" />}
      </svg>
      <span className={wordHidden ? 'sr-only' : 'text-sm'}>{word}</span>
    </span>
  );
}
