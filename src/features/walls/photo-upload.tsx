import { type DragEvent, useId, useRef, useState } from 'react';
import type { Wall } from '../../../shared/walls/wall.ts';
import { Button } from '../../components/button.tsx';
import { classNames } from '../../components/class-names.ts';
import { ErrorState } from '../../components/error-state.tsx';
import { Notice } from '../../components/notice.tsx';
import { ProgressBar } from '../../components/progress-bar.tsx';
import { useUploadPhoto } from './walls.queries.ts';

const mostMb = 40;

/** Takes a photo by choosing or dropping it, and tells how far it has come. `onWithout` goes on with a drawn wall. */
export function PhotoUpload({ wall, onUploaded, onWithout }: { wall: Wall; onUploaded: () => void; onWithout?: () => void }) {
  const id = useId();
  const chooser = useRef<HTMLInputElement>(null);
  const calledOff = useRef<AbortController | null>(null);
  const [share, setShare] = useState(0);
  const [over, setOver] = useState(false);
  const [refused, setRefused] = useState<string | null>(null);
  const [sent, setSent] = useState<File | null>(null);
  const upload = useUploadPhoto(wall);

  const send = (file: File | undefined) => {
    if (!file) return;
    setRefused(file.size > mostMb * 1024 * 1024 ? `“${file.name}” is larger than ${mostMb} MB. Please send a smaller one.` : null);
    if (file.size > mostMb * 1024 * 1024) return;
    const controller = new AbortController();
    calledOff.current = controller;
    setShare(0);
    setSent(file);
    upload.mutate({ file, signal: controller.signal, onProgress: setShare }, { onSuccess: onUploaded });
  };
  const drop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    if (!upload.isPending) send(event.dataTransfer.files[0]);
  };
  const callOff = () => {
    calledOff.current?.abort();
    upload.reset();
  };

  return (
    <div
      className={classNames('grid gap-4 border border-dashed px-6 py-8', over ? 'border-chalk-600 bg-chalk-100' : 'border-ink-500')}
      onDragOver={(e) => {
        e.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={drop}
    >
      <div className="max-w-prose">
        <p className="font-bold text-ink-900">{wall.photo ? 'Another photo of this wall' : 'A photo of the wall'}</p>
        <p className="mt-1 text-ink-700">
          Tape four points on the wall and measure them, stand back so that all of them are in the picture, and take it as squarely as the room allows.
          JPEG, PNG or WebP, up to {mostMb} MB. Where it was taken is removed from every copy that is shown.
        </p>
      </div>
      {upload.isPending ? (
        <div className="grid max-w-md gap-3">
          <ProgressBar label={share < 1 ? 'Sending the photo' : 'Looking at the photo'} share={share < 1 ? share : null} />
          <Button className="justify-self-start" onClick={callOff}>
            Cancel
          </Button>
        </div>
      ) : (
        <div className="flex flex-wrap items-center gap-3">
          <input
            ref={chooser}
            id={id}
            type="file"
            accept="image/*"
            className="sr-only"
            tabIndex={-1}
            aria-label="Photo of the wall"
            onChange={(e) => {
              send(e.target.files?.[0]);
              // The same file may be chosen again after a refusal.
              e.target.value = '';
            }}
          />
          <Button weight={wall.photo ? 'plain' : 'primary'} onClick={() => chooser.current?.click()}>
            Choose a photo
          </Button>
          {onWithout ? (
            <Button weight="quiet" onClick={onWithout}>
              {wall.photo ? 'Keep the one there is' : 'Draw the wall without a photo'}
            </Button>
          ) : null}
          <span className="text-sm text-ink-500 max-sm:hidden">or drop it here</span>
        </div>
      )}
      {refused ? (
        <Notice kind="stop" live>
          {refused}
        </Notice>
      ) : null}
      {upload.error ? <ErrorState error={upload.error} onRetry={sent ? () => send(sent) : undefined} /> : null}
    </div>
  );
}
