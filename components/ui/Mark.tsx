import { useId } from 'react';
import Svg, { Mask, Path, Rect, G } from 'react-native-svg';
import { hiddenFromReaders } from './hiddenFromReaders';
import { useLook } from './useLook';

/** Radii of the dark rings of a round aperture in units of wavelength × distance / diameter: zeros of J1 over π. */
const darkRings = [1.219669891, 2.233130594, 3.238315484, 4.241062864, 5.242764377] as const;

const large = { unit: 14.4, widths: [6, 5.2, 4.5, 3.9, 3.4], legs: [30, 23.5, 17.5, 12, 7] };
const small = { unit: 22, widths: [9, 7.5, 6], legs: [28, 19, 11] };

/** The mark: five dark rings as gaps in a lit plate, falling into the strokes of a rule. Up to 20 px it has three. */
export function Mark({ size = 40 }: { size?: number }) {
  const { colours } = useLook();
  const id = `mark${useId().replace(/\W/g, '')}`;
  const drawing = size <= 20 ? small : large;
  return (
    <Svg width={size} height={size} viewBox="0 0 84 84" {...hiddenFromReaders}>
      <Mask id={id}>
        <Rect width={84} height={84} fill="#fff" />
        <G fill="none">
          {drawing.widths.map((width, i) => {
            const r = (darkRings[i] ?? 0) * drawing.unit;
            return (
              <Path
                key={width}
                d={`M0 ${48 - r}A${r} ${r} 0 0 1 ${r} 48V${48 + (drawing.legs[i] ?? 0)}`}
                stroke="#000"
                strokeWidth={width}
              />
            );
          })}
        </G>
      </Mask>
      <Rect width={84} height={84} fill={colours.ink0} mask={`url(#${id})`} />
    </Svg>
  );
}
