/** The wall time, for what counts on the screen. */
import { useEffect, useState } from 'react';

/** Epoch milliseconds, brought up to date every `everyMs` and at once when the page comes back into sight. */
export function useNow(everyMs: number): number {
  const [now, setNow] = useState(() => Date.now());
  useEffect(() => {
    const look = () => setNow(Date.now());
    const timer = setInterval(look, everyMs);
    document.addEventListener('visibilitychange', look);
    return () => {
      clearInterval(timer);
      document.removeEventListener('visibilitychange', look);
    };
  }, [everyMs]);
  return now;
}
