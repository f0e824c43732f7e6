/** Runs kept on this device, so that a run opens while the network is away. */
import { runBundleSchema } from '@/shared/contract/runs';
import type { RunBundle } from '@/shared/contract/runs';
import { openDevice } from '@/shared/ui/api/device';

/** Keeps a run as fetched; a device that keeps nothing loses only the way to open it without the network. */
export async function keepBundle(bundle: RunBundle): Promise<void> {
  try {
    await (await openDevice())?.put('bundles', { run: bundle.run.id, bundle });
  } catch {
    // no room: the run can still be led while the server is there
  }
}

/** The run as last fetched, or null when it is not here or an older page wrote it in a form that this one does not know. */
export async function readBundle(run: string): Promise<RunBundle | null> {
  try {
    const kept = await (await openDevice())?.get('bundles', run);
    const parsed = runBundleSchema.safeParse(kept?.bundle);
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}
