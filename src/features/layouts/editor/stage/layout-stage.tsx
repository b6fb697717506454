import { useEffect, useMemo, useRef, useState } from 'react';
import { Stage } from 'react-konva';
import { formatLength } from '../../../../../shared/units/length.ts';
import type { Wall } from '../../../../../shared/walls/wall.ts';
import { classNames } from '../../../../components/class-names.ts';
import { usePicture } from '../../../../lib/picture.ts';
import { useUnits } from '../../../../lib/units.ts';
import { listenToKeys } from '../gestures/keys.ts';
import { listenToPointer } from '../gestures/pointer.ts';
import { type ShownFinding, weightOfFrames } from '../ledger/findings-ledger.tsx';
import type { Designs } from '../state/designs.ts';
import { useEditor, useEditorStore } from '../state/editor-store.ts';
import { GuidesShape } from './guides-shape.tsx';
import { FramesShape, GroundShape, HandShape, SiteShape, WallLayer } from './layers.tsx';
import { MarksShape } from './marks-shape.tsx';
import { fitted } from './view.ts';

interface Props {
  wall: Wall;
  designs: Designs;
  /** Frames with a stop or a caution are marked; null while the checks cannot run. */
  findings: readonly ShownFinding[] | null;
  readOnly: boolean;
}

/** The wall with its frames, drawn to scale; what can be done on it by hand can be done from the ledger too. */
export function LayoutStage({ wall, designs, findings, readOnly }: Props) {
  const store = useEditorStore();
  const units = useUnits();
  const element = useRef<HTMLDivElement>(null);
  const latest = useRef({ designs, wall, readOnly, units });
  const size = useEditor((e) => e.size);
  const selected = useEditor((e) => e.selected.length);
  const carrying = useEditor((e) => e.hand !== null);
  const measuring = useEditor((e) => e.measuring !== null);
  const [over, setOver] = useState(false);
  const picture = wall.photo?.elevation ?? null;
  const marked = useMemo(() => weightOfFrames(findings ?? []), [findings]);
  const image = useImage(picture?.url ?? null);

  useEffect(() => {
    latest.current = { designs, wall, readOnly, units };
  }, [designs, wall, readOnly, units]);

  useEffect(() => {
    const stage = element.current;
    if (!stage) return;
    store.setState({ stage });
    const keys = listenToKeys({ store, units: () => latest.current.units, readOnly: () => latest.current.readOnly });
    const stop = listenToPointer(stage, { store, designs: () => latest.current.designs, wall: () => latest.current.wall, readOnly: () => latest.current.readOnly, spaceHeld: keys.spaceHeld });
    return () => {
      stop();
      keys.stop();
      store.setState({ stage: null });
    };
  }, [store]);

  useEffect(() => {
    const stage = element.current;
    if (!stage) return;
    const watch = new ResizeObserver(() => {
      const now = { width: stage.clientWidth, height: stage.clientHeight };
      const { size: before, view } = store.getState();
      // First sight of the wall, and whenever the whole of it was in view: keep it whole.
      const whole = before.width === 0 || sameView(view, fitted(wall, before));
      store.setState({ size: now, view: whole ? fitted(wall, now) : view });
    });
    watch.observe(stage);
    return () => watch.disconnect();
  }, [store, wall]);

  return (
    <div
      ref={element}
      tabIndex={0}
      role="group"
      aria-label={`The wall ${wall.name}, ${formatLength(wall.widthMm, units)} by ${formatLength(wall.heightMm, units)}. The frames are listed in the ledger.`}
      aria-describedby="wall-keys"
      data-wall-stage
      onPointerEnter={() => setOver(true)}
      onPointerLeave={() => setOver(false)}
      className={classNames(
        'relative min-h-0 grow overflow-hidden bg-plaster-100 select-none focus-visible:outline-offset-[-3px]',
        readOnly ? 'touch-pan-y' : 'touch-none',
        measuring ? 'cursor-crosshair' : carrying ? 'cursor-grabbing' : over && selected > 0 && !readOnly ? 'cursor-grab' : 'cursor-default',
      )}
    >
      {size.width > 0 ? (
        <Stage width={size.width} height={size.height} listening={false}>
          <WallLayer>
            <GroundShape wall={wall} picture={picture} image={image} />
            <SiteShape wall={wall} />
          </WallLayer>
          <WallLayer>
            <FramesShape designs={designs} />
            <MarksShape designs={designs} marked={marked} />
          </WallLayer>
          <WallLayer>
            <HandShape designs={designs} />
            <GuidesShape designs={designs} wall={wall} readOnly={readOnly} lengthText={(mm) => formatLength(mm, units)} />
          </WallLayer>
        </Stage>
      ) : null}
    </div>
  );
}

const sameView = (a: { scale: number; left: number; bottom: number }, b: typeof a): boolean =>
  Math.abs(a.scale - b.scale) < 1e-9 && Math.abs(a.left - b.left) < 0.5 && Math.abs(a.bottom - b.bottom) < 0.5;

/** The photo as an image, once it has come. */
function useImage(url: string | null): HTMLImageElement | null {
  const { src, onError } = usePicture(url ?? '');
  const [loaded, setLoaded] = useState<{ src: string; image: HTMLImageElement } | null>(null);
  const failed = useRef(onError);
  useEffect(() => {
    failed.current = onError;
  });
  useEffect(() => {
    if (!url) return;
    const image = new Image();
    image.onload = () => setLoaded({ src, image });
    image.onerror = () => failed.current();
    image.src = src;
    return () => {
      image.onload = null;
      image.onerror = null;
    };
  }, [url, src]);
  return url && loaded?.src === src ? loaded.image : null;
}
