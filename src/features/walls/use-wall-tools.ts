import { useState } from 'react';
import { inOrder, startingClearanceMm, studFaceMm, usualUncertaintyMm } from '../../../shared/walls/studs.ts';
import type { Obstruction, Stud, Zone } from '../../../shared/walls/wall.ts';
import { newId } from '../../lib/new-id.ts';
import { useUnits } from '../../lib/units.ts';
import { emptyCheck, type Check } from './check.ts';
import type { WallSheet } from './use-wall-draft.ts';
import { cornersOf, type ObstructionDraft, type StudDraft } from './wall-draft.ts';
import { begunWith, closed, type Drawing, type Drawn, type Tool } from './wall-tools.ts';
import { foundByWords, obstructionWords, zoneWords } from './wall-words.ts';

/** The tool in hand on the wall, what it makes, and the check that is drawn. */
export function useWallTools(sheet: WallSheet, wall: { widthMm: number; heightMm: number }) {
  const units = useUnits();
  const [drawing, setDrawing] = useState<Drawing | null>(null);
  const [kind, setKind] = useState<Obstruction['kind']>('outlet');
  const [foundBy, setFoundBy] = useState<Stud['foundBy']>('finder');
  const [zoneKind, setZoneKind] = useState<Zone['kind']>('passage');
  const [check, setCheck] = useState<Check | null>(null);
  const { draft, change } = sheet;

  const addObstruction = (shape: Pick<ObstructionDraft, 'leftMm' | 'bottomMm' | 'widthMm' | 'heightMm' | 'corners'>) =>
    change({ obstructions: [...draft.obstructions, { id: newId(), kind, name: '', clearanceMm: startingClearanceMm(kind, units), ...shape }] }, { words: `${obstructionWords[kind]} drawn` });
  const made = (drawn: Drawn) => {
    switch (drawn.kind) {
      case 'stud': {
        const stud: StudDraft = { id: newId(), xMm: drawn.xMm, widthMm: draft.construction === 'steel studs' ? studFaceMm.steel : studFaceMm.wood, foundBy, uncertaintyMm: usualUncertaintyMm[foundBy] };
        // One not yet typed to the end stands last, where it was put.
        const known = [...draft.studs, stud].filter((s): s is StudDraft & { xMm: number } => s.xMm !== null && Number.isFinite(s.xMm));
        change({ studs: [...inOrder(known), ...draft.studs.filter((s) => s.xMm === null || !Number.isFinite(s.xMm))] }, { words: `Stud at ${drawn.xMm} mm set, ${foundByWords[foundBy].toLowerCase()}` });
        return;
      }
      case 'box':
        addObstruction({ leftMm: drawn.leftMm, bottomMm: drawn.bottomMm, widthMm: drawn.widthMm, heightMm: drawn.heightMm, corners: null });
        return;
      case 'polygon':
        addObstruction({ leftMm: null, bottomMm: null, widthMm: null, heightMm: null, corners: cornersOf(drawn.corners) });
        return;
      case 'zone':
        change({ zones: [...draft.zones, { id: newId(), kind: zoneKind, fromMm: drawn.fromMm, toMm: drawn.toMm }] }, { words: `${zoneWords[zoneKind]}: stretch drawn` });
        return;
      case 'check':
        setCheck((now) => ({ fromXMm: drawn.a.x, fromYMm: drawn.a.y, toXMm: drawn.b.x, toYMm: drawn.b.y, measuredMm: now?.measuredMm ?? null }));
    }
  };

  return {
    drawing, setDrawing, kind, setKind, foundBy, setFoundBy, zoneKind, setZoneKind, check, setCheck, made,
    /** Takes a tool in hand, or lays it down where it is in hand already. */
    take(tool: Tool) {
      if (drawing?.tool === tool) return setDrawing(null);
      setDrawing(begunWith(tool, drawing?.at ?? { x: Math.round(wall.widthMm / 2), y: Math.round(wall.heightMm / 2) }));
      if (tool === 'check') setCheck((now) => now ?? emptyCheck);
    },
    layDown: () => setDrawing(null),
    closePolygon() {
      if (!drawing) return;
      const done = closed(drawing);
      setDrawing(done.drawing);
      if (done.drawn) made(done.drawn);
    },
  };
}
export type WallTools = ReturnType<typeof useWallTools>;
