import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { ListedPhoto } from '../../../shared/walls/photo.ts';
import type { Wall } from '../../../shared/walls/wall.ts';
import { Button } from '../../components/button.tsx';
import { ConfirmDialog } from '../../components/confirm-dialog.tsx';
import { ErrorState } from '../../components/error-state.tsx';
import { Loading } from '../../components/loading.tsx';
import { momentOf } from '../../lib/dates.ts';
import { usePicture } from '../../lib/picture.ts';
import { useUnits } from '../../lib/units.ts';
import { errorWords } from './error-words.ts';
import { photosQuery, useChoosePhoto, useRemovePhoto } from './walls.queries.ts';

/** The photos of a wall, newest first, and which of them is in force. */
export function PhotoList({ wall, onChosen }: { wall: Wall; onChosen: () => void }) {
  const photos = useQuery(photosQuery(wall.id));
  const choose = useChoosePhoto(wall);
  const remove = useRemovePhoto(wall);
  const [asking, setAsking] = useState<string | null>(null);
  if (!photos.data) return photos.isError ? <ErrorState error={photos.error} onRetry={() => void photos.refetch()} /> : <Loading what="the photos" />;
  if (photos.data.length === 0) return null;
  return (
    <div className="grid gap-3">
      <h3 className="font-semibold text-ink-900">Photos of this wall</h3>
      <ul className="grid gap-3 sm:grid-cols-2 lg:grid-cols-3">
        {photos.data.map((photo, i) => (
          <li key={photo.id} className="grid grid-cols-[6rem_minmax(0,1fr)] gap-3 border border-plaster-200 bg-white p-3">
            <Thumbnail photo={photo} name={`Photo ${photos.data.length - i}`} />
            <div className="grid content-start gap-2">
              <PhotoWords photo={photo} name={`Photo ${photos.data.length - i}`} />
              <div className="flex flex-wrap gap-2">
                {photo.inForce ? null : (
                  <Button small busy={choose.isPending && choose.variables === photo.id} aria-label={`Use photo ${photos.data.length - i}`} onClick={() => choose.mutate(photo.id, { onSuccess: onChosen })}>
                    Use this one
                  </Button>
                )}
                <Button small weight="danger" aria-label={`Delete photo ${photos.data.length - i}`} onClick={() => setAsking(photo.id)}>
                  Delete
                </Button>
              </div>
            </div>
          </li>
        ))}
      </ul>
      {choose.error ? <ErrorState error={choose.error} /> : null}
      <ConfirmDialog open={asking !== null} title="Delete this photo?" deed="Delete the photo" danger busy={remove.isPending} onCancel={() => setAsking(null)} onConfirm={() => asking && remove.mutate(asking, { onSuccess: () => setAsking(null) })}>
        <p>The photo and its straightened picture are deleted. Studs, obstructions and layouts stay; what was signed keeps its own copy.</p>
        {remove.error ? <ErrorState error={remove.error} /> : null}
      </ConfirmDialog>
    </div>
  );
}

function Thumbnail({ photo, name }: { photo: ListedPhoto; name: string }) {
  const { src, failed, onError } = usePicture(photo.previewUrl);
  if (failed) return <div className="bg-plaster-100" />;
  return <img src={src} onError={onError} alt={`${name} of the wall`} className="h-20 w-24 object-cover" />;
}

function PhotoWords({ photo, name }: { photo: ListedPhoto; name: string }) {
  const units = useUnits();
  const worst = photo.fit?.expectedErrorMm.worst;
  return (
    <p className="text-sm text-ink-700">
      <span className="block font-semibold text-ink-900">
        {name}
        {photo.inForce ? ', in force' : ''}
      </span>
      {momentOf(photo.createdAt)}
      <span className="block">{!photo.elevation ? 'Not straightened' : worst === undefined ? 'Straightened' : `Straightened, out by at most ${errorWords(worst, units)}`}</span>
    </p>
  );
}
