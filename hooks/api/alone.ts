/**
 * Runs one task of a name at a time over all tabs of the browser, in the order in which they asked.
 * Where there is no lock manager (native, old browsers) the tasks of this page alone take turns.
 */
let tail: Promise<unknown> = Promise.resolve();

export function alone<T>(name: string, task: () => Promise<T>): Promise<T> {
  const locks = typeof navigator === 'undefined' ? undefined : (navigator as { locks?: LockManager }).locks;
  if (locks) return locks.request(name, task) as Promise<T>;
  const turn = tail.then(task, task);
  tail = turn.catch(() => undefined);
  return turn;
}
