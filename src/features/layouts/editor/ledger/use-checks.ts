import { useDeferredValue, useMemo, useState } from 'react';
import { createLedger, type Ledger } from '../../../../../shared/findings/ledger.ts';
import { usualLimits, type Surroundings } from '../../../../../shared/findings/scene.ts';
import type { HardwareBook } from '../../../../../shared/hardware/hardware-book.ts';
import type { Pattern } from '../../../../../shared/patterns/pattern.ts';
import type { Wall } from '../../../../../shared/walls/wall.ts';
import { useUnits } from '../../../../lib/units.ts';
import { useEditor } from '../state/editor-store.ts';

/** What the checks say of the bench, with what they reckoned with. */
export interface Checks extends Ledger {
  around: Surroundings;
}

interface Needs {
  wall: Wall;
  patterns: readonly Pattern[];
  book: HardwareBook | undefined;
  changedSinceSigned: boolean;
}

/** Findings and loads of the bench as it stands, a moment behind the hand; null while the hardware book is missing. */
export function useChecks({ wall, patterns, book, changedSinceSigned }: Needs): Checks | null {
  const units = useUnits();
  const bench = useDeferredValue(useEditor((e) => e.bench));
  const [ledgerOf] = useState(createLedger);
  const limits = useMemo(() => ({ ...usualLimits, units }), [units]);
  return useMemo(
    () => (book ? { ...ledgerOf({ wall, sheet: bench.sheet, frames: bench.frames, patterns, book, limits, changedSinceSigned }), around: { wall, book, limits } } : null),
    [ledgerOf, wall, bench, patterns, book, limits, changedSinceSigned],
  );
}
