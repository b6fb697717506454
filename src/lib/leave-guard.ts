import { useEffect } from 'react';
import { type Blocker, useBlocker } from 'react-router-dom';

/** Holds the reader back from leaving while something typed is unsaved: closing the tab asks, a link waits for the blocker. */
export function useLeaveGuard(unsaved: boolean): Blocker {
  useEffect(() => {
    if (!unsaved) return;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', ask);
    return () => window.removeEventListener('beforeunload', ask);
  }, [unsaved]);
  return useBlocker(({ currentLocation, nextLocation }) => unsaved && currentLocation.pathname !== nextLocation.pathname);
}
