/** How the draft stands with the server. */
export type SaveState =
  | { kind: 'saved' }
  /** Changes not sent yet, or on their way. */
  | { kind: 'saving' }
  /** No way to the server; edits are kept on this device and sent when the line is back. */
  | { kind: 'offline' }
  /** The server refused; `words` say why. Edits are kept on this device. */
  | { kind: 'refused'; words: string };

/** The words of the title block. `timeOf` tells an instant as the reader's clock does. */
export function saveWords(save: SaveState, savedAt: string, savedBy: string, timeOf: (instant: string) => string): string {
  switch (save.kind) {
    case 'saved':
      return `Saved ${timeOf(savedAt)} by ${savedBy}`;
    case 'saving':
      return 'Saving…';
    case 'offline':
      return 'Not saved: offline, kept here';
    case 'refused':
      return 'Not saved: refused, kept here';
  }
}

const clock = new Intl.DateTimeFormat(undefined, { hour: '2-digit', minute: '2-digit', hour12: false });

/** An instant as a clock shows it today, with the day before it otherwise. */
export function savedTime(instant: string, dayAndTime: (instant: string) => string, now = new Date()): string {
  const at = new Date(instant);
  return at.toDateString() === now.toDateString() ? clock.format(at) : dayAndTime(instant);
}
