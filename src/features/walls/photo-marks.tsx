import { type KeyboardEvent, type PointerEvent, useEffect, useRef, useState } from 'react';
import type { Photo } from '../../../shared/walls/wall.ts';
import { Notice } from '../../components/notice.tsx';
import { usePicture } from '../../lib/picture.ts';
import { Loupe } from './loupe.tsx';
import { cornerNames, onPhoto, type MarkDraft } from './marks-draft.ts';

interface Props {
  photo: Photo;
  marks: readonly MarkDraft[];
  /** Marks found wanting, counted from 0. */
  wanting: readonly number[];
  onMove: (index: number, px: MarkDraft['px']) => void;
}

const steps: Record<string, [number, number]> = { ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, -1], ArrowDown: [0, 1] };

/** The photo with its marks: dragged, with a magnified view beside the finger, or nudged by arrow keys a pixel at a time. */
export function PhotoMarks({ photo, marks, wanting, onMove }: Props) {
  const { src, failed, onError } = usePicture(photo.previewUrl);
  const frame = useRef<HTMLDivElement>(null);
  const [shownWidth, setShownWidth] = useState(0);
  const [active, setActive] = useState<number | null>(null);
  const grip = useRef({ x: 0, y: 0 });

  useEffect(() => {
    const element = frame.current;
    if (!element) return;
    const watcher = new ResizeObserver(() => setShownWidth(element.clientWidth));
    watcher.observe(element);
    return () => watcher.disconnect();
  }, []);

  if (failed) return <Notice kind="stop">The photo could not be fetched. Check the connection and reload the page.</Notice>;

  const scale = shownWidth / photo.widthPx;
  const pointed = (event: PointerEvent): MarkDraft['px'] => {
    const box = frame.current!.getBoundingClientRect();
    return { x: (event.clientX - box.left) / scale, y: (event.clientY - box.top) / scale };
  };
  const take = (event: PointerEvent<HTMLButtonElement>, index: number) => {
    if (event.button !== 0) return;
    const at = pointed(event);
    const { px } = marks[index]!;
    // The mark keeps its distance from the finger, so that touching it does not move it.
    grip.current = { x: px.x - at.x, y: px.y - at.y };
    event.currentTarget.setPointerCapture(event.pointerId);
    event.currentTarget.focus({ preventScroll: true });
    setActive(index);
  };
  const drag = (event: PointerEvent<HTMLButtonElement>, index: number) => {
    if (!event.currentTarget.hasPointerCapture(event.pointerId)) return;
    const at = pointed(event);
    onMove(index, onPhoto({ x: at.x + grip.current.x, y: at.y + grip.current.y }, photo));
  };
  const nudge = (event: KeyboardEvent, index: number) => {
    const step = steps[event.key];
    if (!step || event.ctrlKey || event.metaKey || event.altKey) return;
    event.preventDefault();
    const by = event.shiftKey ? 20 : 1;
    const { px } = marks[index]!;
    onMove(index, onPhoto({ x: px.x + step[0] * by, y: px.y + step[1] * by }, photo));
  };
  const outline = marks.map(({ px }) => `${px.x},${px.y}`).join(' ');
  const loupe = active === null ? null : marks[active];

  return (
    <figure>
      <div ref={frame} className="relative w-full select-none overflow-hidden border border-ink-700 bg-plaster-100" style={{ aspectRatio: `${photo.widthPx} / ${photo.heightPx}` }}>
        <img src={src} onError={onError} alt="The wall as photographed" draggable={false} className="block size-full" />
        <svg aria-hidden="true" viewBox={`0 0 ${photo.widthPx} ${photo.heightPx}`} className="pointer-events-none absolute inset-0 size-full">
          <polygon points={outline} className="fill-chalk-600/10 stroke-white" strokeWidth="4" vectorEffect="non-scaling-stroke" />
          <polygon points={outline} className="fill-none stroke-chalk-600" strokeWidth="2" vectorEffect="non-scaling-stroke" />
        </svg>
        {marks.map(({ px }, i) => (
          <button
            key={cornerNames[i] ?? i}
            type="button"
            aria-label={`Mark ${i + 1}, ${cornerNames[i] ?? ''}: ${Math.round(px.x)} px across, ${Math.round(px.y)} px down. Arrow keys move it.`}
            aria-describedby="marks-how"
            className="absolute flex size-11 -translate-x-1/2 -translate-y-1/2 cursor-move touch-none items-center justify-center rounded-full focus-visible:outline-offset-0"
            style={{ left: `${(px.x / photo.widthPx) * 100}%`, top: `${(px.y / photo.heightPx) * 100}%` }}
            onPointerDown={(e) => take(e, i)}
            onPointerMove={(e) => drag(e, i)}
            onPointerUp={(e) => e.currentTarget.releasePointerCapture(e.pointerId)}
            onKeyDown={(e) => nudge(e, i)}
            onFocus={() => setActive(i)}
            onBlur={() => setActive(null)}
          >
            <MarkSign number={i + 1} wanting={wanting.includes(i)} />
          </button>
        ))}
        {loupe && scale > 0 ? <Loupe src={src} photo={photo} at={loupe.px} scale={scale} shownWidth={shownWidth} /> : null}
      </div>
      <figcaption id="marks-how" className="mt-2 text-sm text-ink-700">
        Drag each mark onto a point whose place you measured. By keyboard: arrow keys move the mark you are on by one pixel, with Shift by twenty.
      </figcaption>
    </figure>
  );
}

/** A ring with a cross in it, so that the point itself stays in sight, and the mark's number beside it. */
function MarkSign({ number, wanting }: { number: number; wanting: boolean }) {
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
    </svg>
  );
}
