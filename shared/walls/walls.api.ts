import { z } from 'zod';
import { bytes, endpoint, id } from '../api/endpoint.ts';
import { StudSpecies } from '../hardware/stud-species.ts';
import { Knowledge } from './knowledge.ts';
import { ListedPhoto, Photo, Progress } from './photo.ts';
import { Obstruction, Stud, Wall, WallShape, Zone } from './wall.ts';

const inWall = z.object({ wallId: id });
const inPhoto = z.object({ wallId: id, photoId: id });

export const wallsApi = {
  list: endpoint({ method: 'get', path: '/api/jobs/:jobId/walls', permission: 'read jobs', summary: 'The walls of a job.', params: z.object({ jobId: id }), reply: z.array(Wall) }),
  create: endpoint({ method: 'post', path: '/api/jobs/:jobId/walls', permission: 'change jobs', status: 201, summary: 'Add a wall to a job.', params: z.object({ jobId: id }), body: WallShape, reply: Wall }),
  read: endpoint({ method: 'get', path: '/api/walls/:wallId', permission: 'read jobs', summary: 'One wall.', params: inWall, reply: Wall }),
  change: endpoint({
    method: 'patch', path: '/api/walls/:wallId', permission: 'change jobs', summary: 'Change size, construction, studs, obstructions or zones of a wall; a list that is given takes the place of the one there.',
    params: inWall,
    body: WallShape.partial().extend({
      version: z.number().int(),
      // Without a default: what is not named stays as it is.
      studSpecies: StudSpecies.optional(),
      studs: z.array(Stud).max(200).optional(),
      obstructions: z.array(Obstruction).max(200).optional(),
      zones: z.array(Zone).max(50).optional(),
    }),
    reply: Wall,
  }),
  upload: endpoint({
    method: 'post', path: '/api/walls/:wallId/photos', permission: 'change jobs', kind: 'upload', status: 201, limit: 'heavy',
    summary: 'Upload a photo of the wall (JPEG, PNG or WebP; up to 40 MB and 60 megapixels) and put it in force; those before stay.', params: inWall, reply: Photo,
  }),
  straighten: endpoint({
    method: 'post', path: '/api/walls/:wallId/photos/:photoId/straighten', permission: 'change jobs', limit: 'heavy',
    summary: 'Straighten the photo from four or more marks of known position, or from plumb and level lines, lengths and one mark; straight edges tell the lens.',
    params: inPhoto, body: Knowledge, reply: Photo,
  }),
  progress: endpoint({ method: 'get', path: '/api/walls/:wallId/photos/:photoId/progress', permission: 'read jobs', summary: 'How far a straightening under way has come.', params: inPhoto, reply: Progress }),
  photos: endpoint({ method: 'get', path: '/api/walls/:wallId/photos', permission: 'read jobs', summary: 'The photos of a wall, newest first; one is in force.', params: inWall, reply: z.array(ListedPhoto) }),
  choosePhoto: endpoint({ method: 'post', path: '/api/walls/:wallId/photos/:photoId/choose', permission: 'change jobs', summary: 'Put this photo of the wall in force.', params: inPhoto, reply: Wall }),
  removePhoto: endpoint({ method: 'delete', path: '/api/walls/:wallId/photos/:photoId', permission: 'change jobs', summary: 'Take the photo off the wall and delete it; the newest of those left comes in force.', params: inPhoto, reply: Wall }),
  preview: endpoint({ method: 'get', path: '/api/walls/:wallId/photos/:photoId/preview', permission: 'read jobs', kind: 'file', summary: 'The upright photo, at most 2048 px, without metadata.', params: inPhoto, reply: bytes }),
  elevation: endpoint({ method: 'get', path: '/api/walls/:wallId/photos/:photoId/elevation', permission: 'read jobs', kind: 'file', summary: 'The straightened elevation.', params: inPhoto, reply: bytes }),
};
