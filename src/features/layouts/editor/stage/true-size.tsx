import { Fullscreen } from 'lucide-react';
import { useState } from 'react';
import { Button } from '../../../../components/button.tsx';
import { Actions, Dialog } from '../../../../components/dialog.tsx';
import { readPxPerMm, supposedPxPerMm, useMeasuredPxPerMm, writePxPerMm } from '../../../../lib/screen-scale.ts';
import { useEditorStore } from '../state/editor-store.ts';
import { Tool } from './tool.tsx';
import { zoomed } from './view.ts';

/** A bank or membership card, ID-1 of ISO/IEC 7810: 85.60 by 53.98 mm. */
const card = { widthMm: 85.6, heightMm: 53.98 };

/** Draws the wall as large as life on this screen, once the screen has been measured against a card or a ruler. */
export function TrueSize() {
  const store = useEditorStore();
  const known = useMeasuredPxPerMm();
  const [asking, setAsking] = useState(false);
  const show = () => {
    const { view, size } = store.getState();
    store.setState({ view: zoomed(view, (readPxPerMm() ?? supposedPxPerMm) / view.scale, { x: size.width / 2, y: size.height / 2 }) });
  };
  return (
    <>
      <Tool name="True size on this screen" onPress={() => (known === null ? setAsking(true) : show())}>
        <Fullscreen aria-hidden="true" className="size-5" />
      </Tool>
      {known === null ? null : (
        <Button small weight="quiet" onClick={() => setAsking(true)}>
          Measure the screen again
        </Button>
      )}
      {asking ? (
        <MeasureScreen
          onClose={() => setAsking(false)}
          onMeasured={(pxPerMm) => {
            writePxPerMm(pxPerMm);
            setAsking(false);
            show();
          }}
        />
      ) : null}
    </>
  );
}

function MeasureScreen({ onClose, onMeasured }: { onClose: () => void; onMeasured: (pxPerMm: number) => void }) {
  const [pxPerMm, setPxPerMm] = useState(() => readPxPerMm() ?? supposedPxPerMm);
  return (
    <Dialog open onOpenChange={(open) => (open ? undefined : onClose())} title="Measure this screen" about="Hold a bank card flat to the screen and draw the box until it is as wide as the card. Or hold a ruler to it: the box is to be 85.6 mm (3 3/8 in) wide.">
      <div className="overflow-hidden py-2" style={{ height: card.heightMm * pxPerMm + 24 }}>
        <div className="rounded-lg border-2 border-chalk-600 bg-chalk-100" style={{ width: card.widthMm * pxPerMm, height: card.heightMm * pxPerMm }} />
      </div>
      <label className="block text-sm font-semibold text-ink-900">
        Width of the box
        <input
          type="range"
          min={2}
          max={8}
          step={0.01}
          value={pxPerMm}
          aria-valuetext={`${(card.widthMm * pxPerMm).toFixed(0)} pixels`}
          onChange={(event) => setPxPerMm(Number(event.target.value))}
          className="mt-1 block w-full accent-chalk-600"
        />
      </label>
      <p className="mt-2 text-sm text-ink-700">Kept on this device. Zooming the browser changes it: measure again then.</p>
      <Actions>
        <Button onClick={onClose}>Cancel</Button>
        <Button weight="primary" onClick={() => onMeasured(pxPerMm)}>
          Show true size
        </Button>
      </Actions>
    </Dialog>
  );
}
