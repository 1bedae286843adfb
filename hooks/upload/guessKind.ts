import type { FrameKind } from '@/shared/contracts/captures';

/** Guesses from its name what a frame is: `dark` or `flat` as a word or part of one, else a light. A person may change it. */
export function guessKind(name: string): FrameKind {
  if (/dark/i.test(name)) return 'dark';
  if (/flat/i.test(name)) return 'flat';
  return 'light';
}
