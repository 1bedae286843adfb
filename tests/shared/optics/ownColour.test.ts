import { fromHex, linearSrgbToOklab, luminance } from '../../../shared/optics/oklab';
import { accentForWavelength, ownColourMap } from '../../../shared/optics/ownColour';
import type { Theme } from '../../../shared/optics/ownColour';
import { cieObserver } from '../../../shared/optics/cieObserver';

describe('cieObserver', () => {
  // Chromaticities of the spectrum from the CIE 1 nm table (doi 10.25039/CIE.DS.xvudnb9b), four decimals; computed
  // from that table for the design, independently of the 5 nm table used here.
  test.each([
    [405, 0.173, 0.0048],
    [450, 0.1566, 0.0177],
    [520, 0.0743, 0.8338],
    [532, 0.1702, 0.7965],
    [589, 0.5693, 0.4301],
    [633, 0.7117, 0.2882],
    [650, 0.726, 0.274],
    [670, 0.732, 0.268],
  ])('%d nm has chromaticity %d, %d', (nm, x, y) => {
    const [bigX, bigY, bigZ] = cieObserver(nm);
    const sum = bigX + bigY + bigZ;
    expect(Math.abs(bigX / sum - x)).toBeLessThan(1.6e-4);
    expect(Math.abs(bigY / sum - y)).toBeLessThan(1.6e-4);
  });

  test('gives the peak of the luminous efficiency at 555 nm and the ends of the table beyond it', () => {
    expect(cieObserver(555)[1]).toBe(1);
    expect(cieObserver(1064)).toEqual(cieObserver(720));
    expect(cieObserver(355)).toEqual(cieObserver(380));
  });
});

describe('accentForWavelength', () => {
  // The values of the product's palette.
  test.each<[number, Theme, string, string, string]>([
    [405, 'dark', '#9C5CFF', '#511695', '#2F0C59'],
    [405, 'light', '#8C0BFF', '#CFBBFF', '#E6DEFE'],
    [450, 'dark', '#746EFF', '#362895', '#1E1759'],
    [450, 'light', '#5E3DFF', '#BBC1FF', '#DDE0FF'],
    [520, 'dark', '#00945E', '#00462A', '#002816'],
    [520, 'light', '#007449', '#87D6AA', '#C8EAD6'],
    [532, 'dark', '#00954D', '#004621', '#002911'],
    [532, 'light', '#00753B', '#8FD5A3', '#CBEAD2'],
    [589, 'dark', '#C16C00', '#5D3100', '#371B00'],
    [589, 'light', '#985400', '#F8B884', '#FADDC6'],
    [633, 'dark', '#FF1336', '#7E0014', '#4D0008'],
    [633, 'light', '#CC0027', '#FFB2AC', '#FFD9D6'],
    [650, 'dark', '#FF103F', '#7E0019', '#4D000B'],
    [650, 'light', '#CC002F', '#FFB2AF', '#FFD9D7'],
    [670, 'dark', '#FF0F42', '#7E001B', '#4D000C'],
    [670, 'light', '#CC0031', '#FFB1B0', '#FFD9D8'],
  ])('%d nm on the %s theme', (nm, theme, accent, soft, faint) => {
    expect(accentForWavelength(nm, theme)).toEqual({ accent, soft, faint });
  });

  test('every wavelength has the same luminance, so the same contrast', () => {
    for (let nm = 380; nm <= 720; nm += 7.3) {
      expect(Math.abs(luminance(fromHex(accentForWavelength(nm, 'dark').accent)) - 0.22)).toBeLessThan(0.002);
      expect(Math.abs(luminance(fromHex(accentForWavelength(nm, 'light').accent)) - 0.13)).toBeLessThan(0.002);
    }
  });

  test('has no hue without a wavelength', () => {
    expect(accentForWavelength(null, 'dark').accent).toBe('#A69C91');
  });
});

describe('ownColourMap', () => {
  const lightnessAt = (map: Uint8Array, index: number) => {
    const hex = `#${[...map.slice(index * 3, index * 3 + 3)].map((byte) => byte.toString(16).padStart(2, '0')).join('')}`;
    return linearSrgbToOklab(fromHex(hex));
  };

  test.each<[number | null, Theme, number, number]>([
    [405, 'dark', 0.13, 0.7],
    [532, 'dark', 0.13, 0.7],
    [632.8, 'dark', 0.13, 0.7],
    [null, 'dark', 0.13, 0.7],
    [532, 'light', 0.985, 0.27],
    [632.8, 'light', 0.985, 0.27],
  ])('%s nm, %s: lightness is even in the tone, and chroma has no corner', (nm, theme, first, last) => {
    const map = ownColourMap(nm, theme);
    expect(map).toHaveLength(768);
    for (let index = 0; index < 256; index += 1) {
      const even = first + ((last - first) * index) / 255;
      // Eight bits a channel: half a count near black is 0.01 of lightness.
      expect(Math.abs((lightnessAt(map, index)[0] as number) - even)).toBeLessThan(0.012);
    }
    for (let index = 16; index < 240; index += 1) {
      const chroma = [-8, 0, 8].map((step) =>
        Math.hypot(lightnessAt(map, index + step)[1], lightnessAt(map, index + step)[2]),
      ) as [number, number, number];
      expect(Math.abs(chroma[0] - 2 * chroma[1] + chroma[2])).toBeLessThan(0.02);
    }
  });
});
