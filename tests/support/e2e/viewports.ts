/** The two sizes at which the product is looked at, px: a phone held in one hand and a desk. */
export const viewports = {
  phone: { width: 390, height: 844 },
  desk: { width: 1440, height: 900 },
} as const;

export type ViewportName = keyof typeof viewports;
export const viewportNames: ViewportName[] = ['phone', 'desk'];
