import { coloursFor, layoutForWidth, typeScale } from '@/components/ui/tokens';

const channel = (value: number) => (value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4);
/** Relative luminance and contrast as WCAG 2.2 defines them (from memory). */
function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => channel(parseInt(hex.slice(at, at + 2), 16) / 255));
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}
function contrast(a: string, b: string): number {
  const [high, low] = [luminance(a), luminance(b)].sort((x, y) => y - x) as [number, number];
  return (high + 0.05) / (low + 0.05);
}

/** The design's own table of contrasts: ink on plate and on lift. */
const wanted = {
  dark: { ink0: [12.32, 11.45], ink1: [8.25, 7.67], ink2: [5.52, 5.13], ink3: [3.5, 3.25] },
  light: { ink0: [16.22, 18.07], ink1: [12.64, 14.08], ink2: [6.62, 7.37], ink3: [3.19, 3.55] },
} as const;

describe.each(['dark', 'light'] as const)('colours of the %s theme', (theme) => {
  const colours = coloursFor(theme, null);

  test.each(['ink0', 'ink1', 'ink2', 'ink3'] as const)('%s has the contrast that the design states', (ink) => {
    const [onPlate, onLift] = wanted[theme][ink];
    expect(contrast(colours[ink], colours.plate)).toBeCloseTo(onPlate, 1);
    expect(contrast(colours[ink], colours.lift)).toBeCloseTo(onLift, 1);
  });

  test('text is readable on every surface', () => {
    for (const ground of ['gap', 'plate', 'lift', 'well'] as const) {
      for (const ink of ['ink0', 'ink1', 'ink2'] as const) {
        expect(contrast(colours[ink], colours[ground])).toBeGreaterThanOrEqual(4.5);
      }
    }
  });

  test.each([405, 450, 520, 532, 589, 633, 650, 670])(
    'the accent of a %d nm laser carries text, and text stands on it',
    (nm) => {
      const lit = coloursFor(theme, nm);
      expect(contrast(lit.accent, lit.plate)).toBeGreaterThanOrEqual(4.5);
      expect(contrast(lit.accent, lit.lift)).toBeGreaterThanOrEqual(4.5);
      expect(contrast(lit.onAccent, lit.accent)).toBeGreaterThanOrEqual(4.5);
    },
  );

  test('without a bench there is no hue', () => {
    const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => parseInt(colours.accent.slice(at, at + 2), 16));
    expect(Math.max(r, g, b) - Math.min(r, g, b)).toBeLessThanOrEqual(24);
  });
});

test('layouts change at 600, 1200 and 1600 px', () => {
  expect([360, 599, 600, 1199, 1200, 1599, 1600].map(layoutForWidth)).toEqual([
    'phone',
    'phone',
    'tablet',
    'tablet',
    'desk',
    'desk',
    'wide',
  ]);
});

test('no text is smaller than 12 px', () => {
  for (const scale of Object.values(typeScale)) {
    for (const style of Object.values(scale)) expect(style.fontSize).toBeGreaterThanOrEqual(12);
  }
});
