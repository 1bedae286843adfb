/** Widths in px of the columns of a capture on a desk; the name takes what is left. */
export const frameColumns = {
  gap: 12,
  thumbnail: 64,
  exposure: 62,
  peak: 122,
  noise: 48,
  outcome: 168,
  more: 48,
} as const;
