import type { Point } from '../../../shared/walls/homography.ts';

interface Props {
  src: string;
  photo: { widthPx: number; heightPx: number };
  /** The point looked at, px of the photo. */
  at: Point;
  /** CSS px per px of the photo, and the photo's width on the page. */
  scale: number;
  shownWidth: number;
}

const sizePx = 132;
const zoom = 5;

/** The photo about a point, five times as large as on the page; it stands where neither finger nor mark is. */
export function Loupe({ src, photo, at, scale, shownWidth }: Props) {
  const here = { x: at.x * scale, y: at.y * scale };
  const left = here.x > shownWidth / 2 ? 8 : shownWidth - sizePx - 8;
  const back = { width: photo.widthPx * scale * zoom, height: photo.heightPx * scale * zoom };
  return (
    <div
      aria-hidden="true"
      data-loupe
      className="pointer-events-none absolute top-2 overflow-hidden rounded-full border-2 border-ink-900 bg-plaster-100 shadow-lg"
      style={{
        left, width: sizePx, height: sizePx,
        backgroundImage: `url("${src}")`,
        backgroundRepeat: 'no-repeat',
        backgroundSize: `${back.width}px ${back.height}px`,
        backgroundPosition: `${sizePx / 2 - here.x * zoom - 2}px ${sizePx / 2 - here.y * zoom - 2}px`,
      }}
    >
      <svg viewBox="-64 -64 128 128" className="size-full">
        <path d="M-64 0H-5M5 0H64M0 -64V-5M0 5V64" className="stroke-white" strokeWidth="3" />
        <path d="M-64 0H-5M5 0H64M0 -64V-5M0 5V64" className="stroke-madder-600" strokeWidth="1" />
      </svg>
    </div>
  );
}
