import { z } from 'zod';
import { Edit } from '../../../../../shared/layouts/layout.ts';

/** Edits that have not reached the server, kept on this device beyond the page's life. */
export interface KeptEdits {
  read: () => Edit[];
  write: (edits: readonly Edit[]) => void;
  clear: () => void;
}

/** Kept in the browser's storage, one entry for each person and layout. Where storage is refused or full, they last as long as the page. */
export function keptEdits(userId: string, layoutId: string, storage: Storage | undefined = globalThis.localStorage): KeptEdits {
  const name = `combwright.layout-edits.${userId}.${layoutId}`;
  const clear = () => attempt(() => storage?.removeItem(name));
  return {
    clear,
    read() {
      const text = attempt(() => storage?.getItem(name));
      const read = z.array(Edit).safeParse(attempt(() => JSON.parse(text ?? '[]') as unknown));
      return read.success ? read.data : [];
    },
    write(edits) {
      if (edits.length === 0) clear();
      else attempt(() => storage?.setItem(name, JSON.stringify(edits)));
    },
  };
}

function attempt<T>(work: () => T): T | undefined {
  try {
    return work();
  } catch {
    return undefined;
  }
}
