import { Foundation1764547200000 } from './1764547200000-foundation.ts';

/** Oldest first. */
export const migrations = [Foundation1764547200000];
