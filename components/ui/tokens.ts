import { accentForWavelength } from '@/shared/optics/ownColour';
import type { ThemeName } from '@/hooks/theme/ThemeProvider';

/** The neutrals. Set by luminance, so that contrast is the same whatever stands on them. */
export interface Neutrals {
  /** Ground between plates; inside of every slot in the dark theme. */
  gap: string;
  /** A surface. */
  plate: string;
  /** Raised, chosen or pressed surface. */
  lift: string;
  /** Sunk surface: fields, plots. */
  well: string;
  /** Hairlines that carry no information alone. */
  rule: string;
  /** Diagonal lines in the walls of a slot. */
  hatch: string;
  /** Graphics, ticks, icons at rest; never text. */
  ink3: string;
  /** Secondary text. */
  ink2: string;
  /** Text. */
  ink1: string;
  /** The measured number and the one line that matters. */
  ink0: string;
  /** Body of a slot's wall, under the hatch. */
  wall: string;
  /** The open part of a slot. */
  slotGap: string;
}

export interface Colours extends Neutrals {
  /** The laser's hue at the luminance of the theme; neutral where no bench is chosen. */
  accent: string;
  /** Bands of uncertainty. */
  soft: string;
  /** The weakest trace of the accent. */
  faint: string;
  /** Text on the accent. */
  onAccent: string;
}

const neutrals: Record<ThemeName, Neutrals> = {
  dark: {
    gap: '#040403',
    plate: '#0F0E0E',
    lift: '#181716',
    well: '#080807',
    rule: '#383531',
    hatch: '#57524C',
    ink3: '#6E6860',
    ink2: '#91887C',
    ink1: '#B3A89B',
    ink0: '#D9CDBE',
    wall: '#1D1B19',
    slotGap: '#040403',
  },
  light: {
    gap: '#CACCC8',
    plate: '#EDEFED',
    lift: '#FAFBFA',
    well: '#F6F7F5',
    rule: '#B6B9B5',
    hatch: '#A0A39F',
    ink3: '#838682',
    ink2: '#525451',
    ink1: '#282928',
    ink0: '#121211',
    wall: '#E0E2DF',
    slotGap: '#FAFBFA',
  },
};

const onAccent: Record<ThemeName, string> = { dark: '#040403', light: '#FFFFFF' };

const known = new Map<string, Colours>();

/**
 * All colours of a screen.
 * @param wavelengthNm of the bench's laser in air; null where no bench is chosen: then there is no hue at all.
 */
export function coloursFor(theme: ThemeName, wavelengthNm: number | null): Colours {
  const key = `${theme} ${wavelengthNm}`;
  const found = known.get(key);
  if (found) return found;
  const colours = { ...neutrals[theme], ...accentForWavelength(wavelengthNm, theme), onAccent: onAccent[theme] };
  known.set(key, colours);
  return colours;
}

/** Archivo (width 125) stands alone; B612 is read. Static cuts, one family name each. */
export const fontFamily = {
  figureLight: 'ArchivoWide-300',
  figure: 'ArchivoWide-400',
  figureMedium: 'ArchivoWide-500',
  text: 'B612-400',
  textBold: 'B612-700',
} as const;

export interface TypeStyle {
  fontFamily: string;
  fontSize: number;
  lineHeight: number;
  letterSpacing?: number;
}
export type TypeName = 'hero' | 'large' | 'medium' | 'title' | 'section' | 'body' | 'strong' | 'small' | 'label';

const figureStyle = (family: string, fontSize: number, lineHeight: number, tracking: number): TypeStyle => ({
  fontFamily: family,
  fontSize,
  lineHeight,
  letterSpacing: tracking * fontSize,
});
const textStyle = (family: string, fontSize: number, lineHeight: number): TypeStyle => ({
  fontFamily: family,
  fontSize,
  lineHeight,
});

/** Type scale for a hand (phone, tablet) and for a desk. Sizes and lines in px; tracking is part of the size. */
export const typeScale: Record<'hand' | 'desk', Record<TypeName, TypeStyle>> = {
  hand: {
    hero: figureStyle(fontFamily.figureLight, 97, 92, -0.045),
    large: figureStyle(fontFamily.figureLight, 40, 44, -0.025),
    medium: figureStyle(fontFamily.figure, 24, 28, -0.015),
    title: figureStyle(fontFamily.figureMedium, 20, 26, -0.005),
    section: figureStyle(fontFamily.figureMedium, 17, 22, -0.005),
    body: textStyle(fontFamily.text, 16, 23),
    strong: textStyle(fontFamily.textBold, 16, 23),
    small: textStyle(fontFamily.text, 14, 19),
    label: textStyle(fontFamily.text, 12, 16),
  },
  desk: {
    hero: figureStyle(fontFamily.figureLight, 108, 100, -0.05),
    large: figureStyle(fontFamily.figureLight, 36, 40, -0.03),
    medium: figureStyle(fontFamily.figure, 24, 28, -0.015),
    title: figureStyle(fontFamily.figureMedium, 20, 26, -0.005),
    section: figureStyle(fontFamily.figureMedium, 15, 20, -0.005),
    body: textStyle(fontFamily.text, 14, 20),
    strong: textStyle(fontFamily.textBold, 14, 20),
    small: textStyle(fontFamily.text, 13, 18),
    label: textStyle(fontFamily.text, 12, 16),
  },
};

/** Distances in px on a grid of 4; plates meet at `hair`, groups at `blocks`. */
export const space = { hair: 2, xs: 4, s: 8, m: 12, l: 16, xl: 24, xxl: 40, xxxl: 64, blocks: 10 } as const;

/** Only light is round; everything else has corners of 2. */
export const radius = { plate: 2, tag: 1 } as const;

export const stroke = { hair: 1, line: 1.5, mark: 2.5, icon: 1.75, bar: 3, focus: 2, focusOffset: 2 } as const;

/** Heights in px of what is touched. */
export const target = { min: 48, control: 56, primary: 64 } as const;

/** Milliseconds; all become 0 where the person wants less motion. */
export const motion = { press: 90, settle: 240, unwrap: 320 } as const;

/** Lowest width in px of each layout. */
export const breakpoint = { tablet: 600, desk: 1200, wide: 1600 } as const;
export type LayoutName = 'phone' | 'tablet' | 'desk' | 'wide';

export function layoutForWidth(widthPx: number): LayoutName {
  if (widthPx >= breakpoint.wide) return 'wide';
  if (widthPx >= breakpoint.desk) return 'desk';
  return widthPx >= breakpoint.tablet ? 'tablet' : 'phone';
}

/** Fixed parts of the shell, px. */
export const shell = {
  rule: 28,
  ruleDesk: 36,
  rail: 88,
  head: 52,
  panelHead: 60,
  foot: 72,
  rowDesk: 46,
  row: 64,
} as const;
