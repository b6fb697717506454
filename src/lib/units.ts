import { createContext, useContext } from 'react';
import { useMaybeMe } from './session.ts';

export type Units = 'in' | 'mm';

/** Units of a page without a session, such as the client's; null takes the shop's. */
export const UnitsContext = createContext<Units | null>(null);

/** The units lengths are shown in: those the page sets, else the shop's. */
export function useUnits(): Units {
  const set = useContext(UnitsContext);
  const me = useMaybeMe();
  return set ?? me?.shop.units ?? 'in';
}
