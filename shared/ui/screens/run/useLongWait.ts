/** Whether answers wait for longer than the network usually takes. */
import { useEffect, useState } from 'react';

import type { Saved } from '@/shared/ui/api/outbox';

const USUAL_MS = 1_500;

/** True once something is amiss or has waited for a while: an answer that goes out at once is not worth a word. */
export function useLongWait({ waiting, trouble }: Pick<Saved, 'waiting' | 'trouble'>): boolean {
  const waits = waiting > 0;
  const [long, setLong] = useState(false);
  useEffect(() => {
    if (!waits) return undefined;
    const timer = setTimeout(() => setLong(true), USUAL_MS);
    return () => {
      clearTimeout(timer);
      setLong(false);
    };
  }, [waits]);
  return waits && (long || trouble !== null);
}
