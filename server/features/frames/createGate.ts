/** Lets a limited number of callers in at once; the others wait their turn. */
export interface Gate {
  /** Resolves when there is room, with the function that leaves again (once; further calls do nothing). */
  enter(): Promise<() => void>;
}

export function createGate(room: number): Gate {
  let inside = 0;
  const waiting: (() => void)[] = [];
  const leaving = () => {
    let left = false;
    return () => {
      if (left) return;
      left = true;
      const next = waiting.shift();
      if (next) next();
      else inside -= 1;
    };
  };
  return {
    enter() {
      if (inside < room) {
        inside += 1;
        return Promise.resolve(leaving());
      }
      return new Promise((resolve) => waiting.push(() => resolve(leaving())));
    },
  };
}
