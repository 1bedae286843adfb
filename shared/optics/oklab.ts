export type Triple = [number, number, number];

/** sRGB transfer function of IEC 61966-2-1: linear 0…1 to encoded 0…1. */
export function encodeSrgb(linear: number): number {
  return linear <= 0.0031308 ? 12.92 * linear : 1.055 * linear ** (1 / 2.4) - 0.055;
}

/** Inverse transfer function of IEC 61966-2-1: encoded 0…1 to linear 0…1. */
export function decodeSrgb(encoded: number): number {
  return encoded <= 0.04045 ? encoded / 12.92 : ((encoded + 0.055) / 1.055) ** 2.4;
}

/** CIE XYZ (D65, white Y = 1) to linear sRGB by the matrix of IEC 61966-2-1; values outside 0…1 are kept. */
export function xyzToLinearSrgb([x, y, z]: Triple): Triple {
  return [
    3.2404542 * x - 1.5371385 * y - 0.4985314 * z,
    -0.969266 * x + 1.8760108 * y + 0.041556 * z,
    0.0556434 * x - 0.2040259 * y + 1.0572252 * z,
  ];
}

/** Relative luminance of a linear sRGB colour, white = 1. */
export function luminance([r, g, b]: Triple): number {
  return 0.2126729 * r + 0.7151522 * g + 0.072175 * b;
}

/** Linear sRGB to OKLab (B. Ottosson, "A perceptual color space for image processing", 2020). */
export function linearSrgbToOklab([r, g, b]: Triple): Triple {
  const l = Math.cbrt(0.4122214708 * r + 0.5363325363 * g + 0.0514459929 * b);
  const m = Math.cbrt(0.2119034982 * r + 0.6806995451 * g + 0.1073969566 * b);
  const s = Math.cbrt(0.0883024619 * r + 0.2817188376 * g + 0.6299787005 * b);
  return [
    0.2104542553 * l + 0.793617785 * m - 0.0040720468 * s,
    1.9779984951 * l - 2.428592205 * m + 0.4505937099 * s,
    0.0259040371 * l + 0.7827717662 * m - 0.808675766 * s,
  ];
}

/** OKLab lightness, chroma and hue (radians) to linear sRGB; values outside 0…1 are kept. */
export function oklchToLinearSrgb(lightness: number, chroma: number, hueRad: number): Triple {
  const a = chroma * Math.cos(hueRad);
  const b = chroma * Math.sin(hueRad);
  const l = (lightness + 0.3963377774 * a + 0.2158037573 * b) ** 3;
  const m = (lightness - 0.1055613458 * a - 0.0638541728 * b) ** 3;
  const s = (lightness - 0.0894841775 * a - 1.291485548 * b) ** 3;
  return [
    4.0767416621 * l - 3.3077115913 * m + 0.2309699292 * s,
    -1.2684380046 * l + 2.6097574011 * m - 0.3413193965 * s,
    -0.0041960863 * l - 0.7034186147 * m + 1.707614701 * s,
  ];
}

/** Linear sRGB to `#RRGGBB`; channels are held to 0…1. */
export function toHex(linear: Triple): string {
  return `#${linear
    .map((channel) => Math.round(255 * encodeSrgb(Math.min(1, Math.max(0, channel)))))
    .map((byte) => byte.toString(16).padStart(2, '0').toUpperCase())
    .join('')}`;
}

/** `#RRGGBB` to linear sRGB. */
export function fromHex(hex: string): Triple {
  return [1, 3, 5].map((at) => decodeSrgb(parseInt(hex.slice(at, at + 2), 16) / 255)) as Triple;
}
