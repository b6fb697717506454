const day = new Intl.DateTimeFormat(undefined, { day: 'numeric', month: 'short', year: 'numeric' });
const moment = new Intl.DateTimeFormat(undefined, { day: 'numeric', month: 'short', hour: '2-digit', minute: '2-digit' });

/** The day of an instant, where the reader is: "3 Mar 2026". */
export function dayOf(instant: string): string {
  return day.format(new Date(instant));
}

/** Day and time of an instant, where the reader is: "3 Mar, 14:05". */
export function momentOf(instant: string): string {
  return moment.format(new Date(instant));
}
