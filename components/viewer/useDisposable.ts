import { useEffect, useRef, useState } from 'react';

/**
 * Something in the memory of the drawing engine. It is made anew when `make` changes; what was there before stays until
 * its successor is shown and is given back then, the last one when the component goes. `dispose` may be called twice.
 */
export function useDisposable<T extends { dispose(): void }>(make: () => T | null): T | null {
  const [held, setHeld] = useState<T | null>(null);
  const newest = useRef<T | null>(null);
  useEffect(() => {
    newest.current = make();
    setHeld(newest.current);
  }, [make]);
  useEffect(() => () => held?.dispose(), [held]);
  useEffect(() => () => newest.current?.dispose(), []);
  return held;
}
