import { useEffect, useState } from 'react';

const minuteMs = 60_000;

/** The time in ms, moving on by the minute: for what runs out while the page is open. */
export function useNow(): number {
  const [now, setNow] = useState(() => Date.now());
  useEffect(() => {
    const timer = setInterval(() => setNow(Date.now()), minuteMs);
    return () => clearInterval(timer);
  }, []);
  return now;
}
