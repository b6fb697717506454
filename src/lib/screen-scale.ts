import { useSyncExternalStore } from 'react';

/** CSS px for a millimetre where the screen is as CSS supposes: 96 px to the inch. */
export const supposedPxPerMm = 96 / 25.4;

const name = 'combwright.screen-px-per-mm';
const listeners = new Set<() => void>();

/** How many CSS px this screen shows for a millimetre, as its reader has measured; null before that. Kept on this device. */
export function readPxPerMm(): number | null {
  try {
    const value = Number(globalThis.localStorage?.getItem(name));
    return value >= 0.5 && value <= 40 ? value : null;
  } catch {
    return null;
  }
}

/** Remembers what was measured; told to all that show a scale. */
export function writePxPerMm(pxPerMm: number): void {
  try {
    globalThis.localStorage?.setItem(name, String(pxPerMm));
  } catch {
    // Without storage the screen is measured anew next time.
  }
  for (const listener of listeners) listener();
}

/** This screen's px for a millimetre as measured, or null. */
export function useMeasuredPxPerMm(): number | null {
  return useSyncExternalStore(
    (changed) => {
      listeners.add(changed);
      return () => listeners.delete(changed);
    },
    readPxPerMm,
    () => null,
  );
}
