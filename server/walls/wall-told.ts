import type { Photo } from '../../shared/walls/photo.ts';
import type { Wall } from '../../shared/walls/wall.ts';
import type { PhotoRow } from '../database/entities/walls.ts';
import type { WallWhole } from './walls.repository.ts';

/** A wall as others may see it. */
export function told(wall: WallWhole): Wall {
  return {
    id: wall.id, jobId: wall.jobId, name: wall.name, widthMm: wall.widthMm, heightMm: wall.heightMm, construction: wall.construction,
    coveringMm: wall.coveringMm, studSpecies: wall.studSpecies, version: wall.version, outlineMm: wall.outlineMm, obstructions: wall.obstructions, zones: wall.zones,
    studs: wall.studs.map(({ id, xMm, widthMm, foundBy, uncertaintyMm }) => ({ id, xMm, widthMm, foundBy, uncertaintyMm })),
    photo: wall.photo && toldPhoto(wall.photo),
  };
}

/** A photo as others may see it: no key of the file store. */
export function toldPhoto(photo: PhotoRow): Photo {
  const base = `/api/walls/${photo.wallId}/photos/${photo.id}`;
  return {
    id: photo.id, widthPx: photo.widthPx, heightPx: photo.heightPx, marks: photo.marks, known: photo.known, fit: photo.fit, sharpness: photo.sharpness, focal35Mm: photo.focal35Mm,
    createdAt: photo.createdAt.toISOString(),
    previewUrl: `${base}/preview`,
    // The picture may be straightened anew: its address changes with its content.
    elevation: photo.elevation && { url: `${base}/elevation?v=${photo.elevationSha256?.slice(0, 12) ?? ''}`, ...photo.elevation },
  };
}
