import { useEffect, useState } from 'react';

/** Something in the memory of the drawing engine, made anew when `make` changes and given back when it is replaced. */
export function useDisposable<T extends { dispose(): void }>(make: () => T | null): T | null {
  const [held, setHeld] = useState<{ make: () => T | null; thing: T | null } | null>(null);
  useEffect(() => {
    const thing = make();
    setHeld({ make, thing });
    return () => {
      setHeld((now) => (now?.thing === thing ? null : now));
      // The picture that still shows it is replaced in the same commit; the memory goes after that.
      if (thing) setTimeout(() => thing.dispose(), 0);
    };
  }, [make]);
  return held && held.make === make ? held.thing : null;
}
