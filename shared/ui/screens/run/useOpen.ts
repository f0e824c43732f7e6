/** Whether a row may be answered yet. */
import { useEffect, useState } from 'react';

/** True from `opensAt` (epoch milliseconds) on, or at once where there is no wait. */
export function useOpen(opensAt: number | null): boolean {
  const [open, setOpen] = useState(() => opensAt === null || Date.now() >= opensAt);
  useEffect(() => {
    const look = () => setOpen(opensAt === null || Date.now() >= opensAt);
    look();
    if (opensAt === null) return undefined;
    const timer = setInterval(look, 250);
    document.addEventListener('visibilitychange', look);
    return () => {
      clearInterval(timer);
      document.removeEventListener('visibilitychange', look);
    };
  }, [opensAt]);
  return open;
}
