/** Whether snapping holds for this move: Ctrl, or Command on a Mac, held down lets go of it for as long as it is held. */
export function snapsNow(snapping: boolean, { ctrlKey, metaKey }: { ctrlKey: boolean; metaKey: boolean }): boolean {
  return snapping && !ctrlKey && !metaKey;
}
