import { randomUUID } from 'node:crypto';
import { mkdirSync, readdirSync, rmSync } from 'node:fs';
import { rm } from 'node:fs/promises';
import path from 'node:path';
import type { RequestHandler } from 'express';
import multer from 'multer';
import { ProblemError } from '../http/problems.ts';

/** Uploads are at most this large. */
export const mostBytes = 40 * 1024 * 1024;

/**
 * Receives one file in the field `file` to a temporary folder; `req.file.path` says where. The file is deleted when the
 * reply is over, whatever became of it: handlers copy what they keep. Leftovers of a crash are swept at the start.
 */
export function createReceiver(dataDir: string): RequestHandler {
  const folder = path.join(dataDir, 'incoming');
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  for (const name of readdirSync(folder)) rmSync(path.join(folder, name), { force: true });

  const receive = multer({
    storage: multer.diskStorage({ destination: folder, filename: (_req, _file, done) => done(null, randomUUID()) }),
    limits: { fileSize: mostBytes, files: 1, fields: 4, fieldSize: 4096, parts: 6, headerPairs: 50 },
    defParamCharset: 'utf8',
  }).single('file');

  return (req, res, next) => {
    receive(req, res, (error: unknown) => {
      // After an error multer has deleted the file itself and taken the path off.
      const place = req.file?.path;
      if (place) {
        const clean = () => void rm(place, { force: true });
        if (res.closed || res.destroyed) clean();
        else res.once('close', clean);
      }
      if (error) next(error);
      else if (!place) next(new ProblemError('bad-input', 'No file came with this. Please choose a photo and send it in the field "file".'));
      else next();
    });
  };
}
