import type { ReactNode } from 'react';
import { isConfirmed, type Wall } from '../../../shared/walls/wall.ts';
import { LengthText } from '../../components/length-text.tsx';
import { Slip, Slips } from '../../components/slip.tsx';
import { paths } from '../../lib/paths.ts';
import { constructionWords } from '../../../shared/walls/construction.ts';

/** The walls of a job, each with its drawing. */
export function WallSlips({ walls, draw }: { walls: readonly Wall[]; draw: (wall: Wall) => ReactNode }) {
  return (
    <Slips>
      {walls.map((wall) => (
        <Slip key={wall.id} to={paths.measure(wall.jobId, wall.id)} title={wall.name} picture={draw(wall)}>
          <p>
            <LengthText mm={wall.widthMm} /> × <LengthText mm={wall.heightMm} />, {constructionWords[wall.construction].toLowerCase()}
          </p>
          <p>
            {wall.photo ? (wall.photo.elevation ? 'Photo straightened' : 'Photo not straightened yet') : 'No photo'}, {studWords(wall)}
          </p>
        </Slip>
      ))}
    </Slips>
  );
}

function studWords({ studs }: Wall): string {
  if (studs.length === 0) return 'no studs';
  const open = studs.filter((stud) => !isConfirmed(stud)).length;
  return `${studs.length} ${studs.length === 1 ? 'stud' : 'studs'}${open > 0 ? `, ${open} unconfirmed` : ''}`;
}
