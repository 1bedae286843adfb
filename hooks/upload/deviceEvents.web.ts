/** Calls back when the network may be back: the browser says so, or the page is looked at again. */
export function onNetworkBack(listener: () => void): () => void {
  const seen = () => {
    if (document.visibilityState === 'visible') listener();
  };
  window.addEventListener('online', listener);
  document.addEventListener('visibilitychange', seen);
  return () => {
    window.removeEventListener('online', listener);
    document.removeEventListener('visibilitychange', seen);
  };
}

/** Lets the browser ask before the page is left while `isBusy`: files chosen here cannot be read again after a reload. */
export function guardLeaving(isBusy: () => boolean): () => void {
  const ask = (event: BeforeUnloadEvent) => {
    if (isBusy()) event.preventDefault();
  };
  window.addEventListener('beforeunload', ask);
  return () => window.removeEventListener('beforeunload', ask);
}
