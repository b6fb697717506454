/** Pages drawn and pages in all, in a few bytes that both threads see. */
export function pageCell(): SharedArrayBuffer {
  return new SharedArrayBuffer(8);
}

export function setPages(cell: SharedArrayBuffer | undefined, drawn: number, pages: number): void {
  if (!cell) return;
  const view = new Int32Array(cell);
  Atomics.store(view, 0, drawn);
  Atomics.store(view, 1, pages);
}

export function pagesOf(cell: SharedArrayBuffer): { drawn: number; pages: number } {
  const view = new Int32Array(cell);
  return { drawn: Atomics.load(view, 0), pages: Atomics.load(view, 1) };
}
