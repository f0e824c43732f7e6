/** Waiting that can be cut short. */

/** Resolves after `ms`, or as soon as `kicked` does. */
export function pause(ms: number, kicked: Promise<void>): Promise<void> {
  return new Promise((resolve) => {
    const timer = setTimeout(resolve, ms);
    void kicked.then(() => {
      clearTimeout(timer);
      resolve();
    });
  });
}
