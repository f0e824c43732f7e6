/** A run from this device, where the server does not answer. */
import { useEffect, useState } from 'react';

import { readKeptRun } from '@/shared/ui/api/runStore';
import type { KeptRun } from '@/shared/ui/api/runStore';

/** Wi-Fi at a bench may hang rather than fail: after this time the device helps itself. */
const PATIENCE_MS = 5_000;

/**
 * What this device holds of the run; null while it is not asked for, or holds nothing.
 * @param wanting the server has not given the run yet
 * @param failed it could not be reached
 */
export function useKeptRun(run: string, { wanting, failed }: { wanting: boolean; failed: boolean }): KeptRun | null {
  const [kept, setKept] = useState<KeptRun | null>(null);
  const [slow, setSlow] = useState(false);
  const asked = wanting && (failed || slow || !globalThis.navigator.onLine);
  useEffect(() => {
    if (!wanting) return undefined;
    const timer = setTimeout(() => setSlow(true), PATIENCE_MS);
    return () => clearTimeout(timer);
  }, [wanting]);
  useEffect(() => {
    if (!asked) return undefined;
    let over = false;
    void readKeptRun(run).then((found) => {
      if (!over) setKept(found);
    });
    return () => {
      over = true;
    };
  }, [asked, run]);
  return kept;
}
