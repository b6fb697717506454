import type { HandleOf } from './photo-handles.ts';

interface Props {
  kind: HandleOf['kind'];
  number: number;
  wanting: boolean;
  /** Written below the sign. */
  words?: string;
}

/** A mark is a ring with a cross in it, so that the point itself stays in sight, and its number beside it; ends of lines are squares, points of an edge small rings. */
export function HandleSign({ kind, number, wanting, words }: Props) {
  if (kind !== 'mark') return <EndSign kind={kind} />;
  const line = wanting ? 'stroke-madder-600' : 'stroke-chalk-600';
  return (
    <svg viewBox="0 0 44 44" aria-hidden="true" className="pointer-events-none size-11 overflow-visible">
      <circle cx="22" cy="22" r="13" className="fill-none stroke-white" strokeWidth="5" />
      <circle cx="22" cy="22" r="13" className={`fill-none ${line}`} strokeWidth="2.5" strokeDasharray={wanting ? '5 3' : undefined} />
      <path d="M22 14v16M14 22h16" className="stroke-white" strokeWidth="3" />
      <path d="M22 14v16M14 22h16" className={line} strokeWidth="1" />
      <circle cx="36" cy="8" r="9" className={wanting ? 'fill-madder-600' : 'fill-chalk-600'} />
      <text x="36" y="12" textAnchor="middle" fontSize="12" className="fill-white font-bold">
        {number}
      </text>
      {words ? (
        <text x="22" y="50" textAnchor="middle" fontSize="12" strokeWidth="4" className="fill-ink-900 stroke-white font-bold tabular-nums [paint-order:stroke]">
          {words}
        </text>
      ) : null}
    </svg>
  );
}

function EndSign({ kind }: { kind: 'edge' | 'line' | 'length' }) {
  return (
    <svg viewBox="0 0 32 32" aria-hidden="true" className="pointer-events-none size-8 overflow-visible">
      {kind === 'edge' ? <circle cx="16" cy="16" r="6" className="fill-none stroke-white" strokeWidth="5" /> : <rect x="10" y="10" width="12" height="12" className="fill-none stroke-white" strokeWidth="5" />}
      {kind === 'edge' ? <circle cx="16" cy="16" r="6" className="fill-none stroke-ink-900" strokeWidth="2" /> : <rect x="10" y="10" width="12" height="12" className={`fill-none ${kind === 'length' ? 'stroke-madder-600' : 'stroke-chalk-700'}`} strokeWidth="2" />}
      <path d="M16 13v6M13 16h6" className="stroke-ink-900" strokeWidth="1" />
    </svg>
  );
}
