/** Runs a program made of parts that are opened one after the other and closed in reverse order on a signal. */

export type Parts = {
  /** Aborted by the first SIGINT or SIGTERM. */
  signal: AbortSignal;
  /** Registers what closes a part that has just been opened. */
  closeWith(close: () => Promise<void> | void): void;
  /** Throws when a signal has come meanwhile, so that nothing more is opened. */
  goOn(): void;
};

class Stopped extends Error {}

/**
 * Opens the parts, waits for SIGINT or SIGTERM, closes them last first. A failure in opening closes what is open and is
 * thrown. A second signal ends the process at once.
 */
export async function untilStopped(open: (parts: Parts) => Promise<void>, say: (line: string) => void): Promise<void> {
  const abort = new AbortController();
  const closers: (() => Promise<void> | void)[] = [];
  let firstAt: number | undefined;
  const stopped = new Promise<void>((resolve) => {
    const onSignal = () => {
      const now = performance.now();
      if (firstAt === undefined) {
        firstAt = now;
        say('\nStopping … (again to force)');
        abort.abort();
        resolve();
        return;
      }
      // A terminal's Ctrl-C reaches the whole group and npm passes signals on: one press may arrive twice.
      if (now - firstAt > 500) process.exit(130);
    };
    process.on('SIGINT', onSignal);
    process.on('SIGTERM', onSignal);
    process.on('SIGHUP', onSignal);
  });
  try {
    await open({
      signal: abort.signal,
      closeWith: (close) => closers.push(close),
      goOn: () => {
        if (abort.signal.aborted) throw new Stopped();
      },
    });
    await stopped;
  } catch (error) {
    if (!abort.signal.aborted) throw error;
  } finally {
    for (const close of closers.reverse()) {
      try {
        await close();
      } catch (error) {
        say(`A part did not stop cleanly: ${error instanceof Error ? error.message : String(error)}`);
      }
    }
  }
}
