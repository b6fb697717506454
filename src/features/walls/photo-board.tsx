import { type KeyboardEvent, type PointerEvent, useEffect, useRef, useState } from 'react';
import type { Point } from '../../../shared/walls/homography.ts';
import type { Photo } from '../../../shared/walls/wall.ts';
import { Notice } from '../../components/notice.tsx';
import { usePicture } from '../../lib/picture.ts';
import { HandleSign } from './handle-sign.tsx';
import { Loupe } from './loupe.tsx';
import { onPhoto } from './marks-draft.ts';
import type { PhotoDraft } from './photo-draft.ts';
import { handlesOf, type Handle, type HandleOf } from './photo-handles.ts';
import { PhotoLinesDrawn } from './photo-lines-drawn.tsx';

interface Props {
  photo: Photo;
  draft: PhotoDraft;
  /** Marks found wanting, counted from 0. */
  wanting: readonly number[];
  /** What each mark is off by, in words; empty where that cannot be told. */
  offBy: readonly string[];
  onMove: (of: HandleOf, px: Point, name: string) => void;
}

const steps: Record<string, [number, number]> = { ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, -1], ArrowDown: [0, 1] };

/** The photo with all that is marked on it: dragged, with a magnified view beside the finger, or nudged by arrow keys a pixel at a time. */
export function PhotoBoard({ photo, draft, wanting, offBy, onMove }: Props) {
  const { src, failed, onError } = usePicture(photo.previewUrl);
  const frame = useRef<HTMLDivElement>(null);
  const [shownWidth, setShownWidth] = useState(0);
  const [active, setActive] = useState<string | null>(null);
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
  const handles = handlesOf(draft);
  const pointed = (event: PointerEvent): Point => {
    const box = frame.current!.getBoundingClientRect();
    return { x: (event.clientX - box.left) / scale, y: (event.clientY - box.top) / scale };
  };
  const take = (event: PointerEvent<HTMLButtonElement>, { key, px }: Handle) => {
    if (event.button !== 0) return;
    const at = pointed(event);
    // The handle keeps its distance from the finger, so that touching it does not move it.
    grip.current = { x: px.x - at.x, y: px.y - at.y };
    event.currentTarget.setPointerCapture(event.pointerId);
    event.currentTarget.focus({ preventScroll: true });
    setActive(key);
  };
  const drag = (event: PointerEvent<HTMLButtonElement>, { of, name }: Handle) => {
    if (!event.currentTarget.hasPointerCapture(event.pointerId)) return;
    const at = pointed(event);
    onMove(of, onPhoto({ x: at.x + grip.current.x, y: at.y + grip.current.y }, photo), name);
  };
  const nudge = (event: KeyboardEvent, { of, px, name }: Handle) => {
    const step = steps[event.key];
    if (!step || event.ctrlKey || event.metaKey || event.altKey) return;
    event.preventDefault();
    const by = event.shiftKey ? 20 : 1;
    onMove(of, onPhoto({ x: px.x + step[0] * by, y: px.y + step[1] * by }, photo), name);
  };
  const looked = handles.find((h) => h.key === active);

  return (
    <figure>
      <div ref={frame} className="relative w-full select-none overflow-hidden border border-ink-700 bg-plaster-100" style={{ aspectRatio: `${photo.widthPx} / ${photo.heightPx}` }}>
        <img src={src} onError={onError} alt="The wall as photographed" draggable={false} className="block size-full" />
        <PhotoLinesDrawn photo={photo} draft={draft} />
        {handles.map((handle) => {
          const { key, of, px, name } = handle;
          const isMark = of.kind === 'mark';
          return (
            <button
              key={key}
              type="button"
              aria-label={`${name}: ${Math.round(px.x)} px across, ${Math.round(px.y)} px down. Arrow keys move it.`}
              aria-describedby="marks-how"
              className={`absolute flex -translate-x-1/2 -translate-y-1/2 cursor-move touch-none items-center justify-center rounded-full focus-visible:outline-offset-0 ${isMark ? 'z-10 size-11' : 'size-8'} ${key === active ? 'z-20' : ''}`}
              style={{ left: `${(px.x / photo.widthPx) * 100}%`, top: `${(px.y / photo.heightPx) * 100}%` }}
              onPointerDown={(e) => take(e, handle)}
              onPointerMove={(e) => drag(e, handle)}
              onPointerUp={(e) => e.currentTarget.releasePointerCapture(e.pointerId)}
              onKeyDown={(e) => nudge(e, handle)}
              onFocus={() => setActive(key)}
              onBlur={() => setActive(null)}
            >
              <HandleSign kind={of.kind} number={of.index + 1} wanting={isMark && wanting.includes(of.index)} words={isMark ? offBy[of.index] : undefined} />
            </button>
          );
        })}
        {looked && scale > 0 ? <Loupe src={src} photo={photo} at={looked.px} scale={scale} shownWidth={shownWidth} /> : null}
      </div>
      <figcaption id="marks-how" className="mt-2 text-sm text-ink-700">
        Drag each mark onto a point whose place you measured. By keyboard: arrow keys move the mark you are on by one pixel, with Shift by twenty; all of it can be typed in the tables too.
      </figcaption>
    </figure>
  );
}
