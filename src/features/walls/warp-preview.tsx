import { useEffect, useRef, useState } from 'react';
import type { ElevationPlan } from '../../../shared/walls/elevation-plan.ts';
import type { Photo } from '../../../shared/walls/wall.ts';
import { warpedPicture, type Pixels } from './warp-picture.ts';

const widestPx = 640;

/** The straightened wall as it will be, worked out here while marks are moved and while the server draws the full picture. */
export function WarpPreview({ photo, plan }: { photo: Photo; plan: ElevationPlan }) {
  const canvas = useRef<HTMLCanvasElement>(null);
  const pixels = usePixels(photo.previewUrl);
  const shape = plan.widthMm / plan.heightMm;
  const width = Math.round(shape >= 1 ? widestPx : widestPx * shape);
  const height = Math.max(1, Math.round(width / shape));

  useEffect(() => {
    const context = canvas.current?.getContext('2d');
    if (!pixels || !context) return;
    const { data } = warpedPicture(pixels, photo.widthPx, plan, width, height);
    context.putImageData(new ImageData(data as Uint8ClampedArray<ArrayBuffer>, width, height), 0, 0);
  }, [pixels, photo.widthPx, plan, width, height]);

  return (
    <figure>
      <canvas ref={canvas} width={width} height={height} role="img" aria-label="The wall as it will be straightened" className="block max-h-80 w-full border border-ink-700 bg-plaster-100 object-contain" />
      <figcaption className="mt-1 text-sm text-ink-700">As it will be straightened: plumb and level things must look so.</figcaption>
    </figure>
  );
}

/** The preview's pixels, at most 1400 px wide; null until they are there. */
function usePixels(url: string): Pixels | null {
  const [read, setRead] = useState<{ url: string; pixels: Pixels } | null>(null);
  useEffect(() => {
    const image = new Image();
    image.onload = () => {
      const width = Math.min(1400, image.naturalWidth);
      const height = Math.round((image.naturalHeight * width) / image.naturalWidth);
      const place = document.createElement('canvas');
      Object.assign(place, { width, height });
      const context = place.getContext('2d', { willReadFrequently: true });
      if (!context) return;
      context.drawImage(image, 0, 0, width, height);
      setRead({ url, pixels: context.getImageData(0, 0, width, height) });
    };
    image.src = url;
    return () => {
      image.onload = null;
    };
  }, [url]);
  return read?.url === url ? read.pixels : null;
}
