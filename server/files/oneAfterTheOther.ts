/** Work that must not run side by side in this process. */

/** A runner that starts each piece of work when the one before has ended, well or not. */
export function oneAfterTheOther(): <T>(work: () => Promise<T>) => Promise<T> {
  let last: Promise<unknown> = Promise.resolve();
  return (work) => {
    const next = last.then(work, work);
    last = next.catch(() => undefined);
    return next;
  };
}
