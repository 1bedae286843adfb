/** Reasons for which a pixel takes no part in a measurement, as bits of one byte. */
export const MASK = {
  /** Hot, dead or unsteady pixel. */
  defect: 1,
  /** At or near the clipping level, with a margin. */
  clipped: 2,
  /** Site of another colour of the mosaic. */
  otherColour: 4,
  /** Does not fit the model: dust, a cosmic ray. */
  outlier: 8,
} as const;
