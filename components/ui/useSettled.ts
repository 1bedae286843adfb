import { useEffect, useRef, useState } from 'react';
import { motion } from './tokens';
import { useReducedMotion } from './useReducedMotion';

/**
 * A number that moves to its new value in 240 ms and then stands still. The first value is there at once.
 * @param moves false, or less motion wanted by the person: the number jumps.
 */
export function useSettled(target: number | null, moves: boolean): number | null {
  const reduced = useReducedMotion();
  const [shown, setShown] = useState(target);
  const from = useRef(target);
  const still = !moves || reduced || target === null;
  useEffect(() => {
    const start = from.current;
    from.current = target;
    if (still || start === null || start === target) {
      setShown(target);
      return undefined;
    }
    let frame = 0;
    const begun = Date.now();
    const step = () => {
      const t = Math.min(1, (Date.now() - begun) / motion.settle);
      setShown(start + (target - start) * (1 - (1 - t) ** 3));
      if (t < 1) frame = requestAnimationFrame(step);
    };
    frame = requestAnimationFrame(step);
    return () => cancelAnimationFrame(frame);
  }, [target, still]);
  return still ? target : shown;
}
