/** Widths in px of the columns of a capture on a desk; the name takes what is left. */
export const frameColumns = {
  gap: 12,
  thumbnail: 64,
  exposure: 58,
  peak: 110,
  noise: 44,
  outcome: 144,
  more: 48,
} as const;
