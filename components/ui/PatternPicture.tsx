import besselj1 from '@stdlib/math-base-special-besselj1';
import { useId, useMemo, useState } from 'react';
import { View, type StyleProp, type ViewStyle } from 'react-native';
import Svg, { Defs, Path, RadialGradient, Rect, Stop, Text as SvgText } from 'react-native-svg';
import { fontFamily } from './tokens';
import { useLook } from './useLook';

/** Zeros of J1 over π: radii of the dark rings in units of wavelength × distance / diameter (Abramowitz and Stegun, table 9.5). */
const darkRings = [1.219669891, 2.233130594, 3.238315484, 4.241062864, 5.242764377, 6.24392169, 7.244759869];
const reach = 9;
const stops = 150;

/** Tone 0 to 1 of the pattern at a radius, logarithmic, as frames are shown. */
function toneAt(q: number): number {
  const v = Math.PI * q;
  const light = v < 1e-4 ? 1 : (2 * besselj1(v)) ** 2 / v ** 2;
  const peak = 3380;
  const floor = 0.8;
  return Math.log(1 + (light * peak + 0.8) / floor) / Math.log(1 + peak / floor);
}

const channels = (hex: string) => [1, 3, 5].map((at) => parseInt(hex.slice(at, at + 2), 16));

export interface PatternPictureProps {
  /** px from the top to the rule on which the rings fall. */
  frameHeight: number;
  /** px below the rule, for the ring numbers. */
  footHeight: number;
  rings: number;
  style?: StyleProp<ViewStyle>;
}

/** The pattern of a round hole, its dark rings falling as plumbs onto a rule. Computed, not a picture of a frame. */
export function PatternPicture({ frameHeight, footHeight, rings, style }: PatternPictureProps) {
  const { colours, theme, layout } = useLook();
  const [width, setWidth] = useState(0);
  const id = `pattern${useId().replace(/\W/g, '')}`;
  const gradient = useMemo(() => {
    const ground = channels(theme === 'dark' ? colours.gap : colours.lift);
    const light = channels(theme === 'dark' ? colours.ink1 : colours.ink0);
    return Array.from({ length: stops + 1 }, (_, i) => {
      const tone = toneAt((i / stops) * reach);
      const mixed = ground.map((from, k) => Math.round(from + ((light[k] ?? 0) - from) * tone));
      return { offset: i / stops, colour: `rgb(${mixed.join(',')})` };
    });
  }, [theme, colours]);
  const margin = layout === 'phone' ? 16 : 48;
  const unit = (width - margin - 24) / ((darkRings[rings - 1] ?? 5.2) + 0.1);
  const centreX = margin;
  const centreY = Math.round(frameHeight * 0.62);
  const x = (q: number) => centreX + q * unit;
  const step = layout === 'phone' ? 0.1 : 0.05;
  let ticks = '';
  for (let k = 0; x(k * step) < width; k += 1) {
    const near = darkRings.slice(0, rings).some((q) => Math.abs(x(q) - x(k * step)) < 4);
    const whole = Math.round(1 / step);
    if (!near)
      ticks += `M${x(k * step).toFixed(1)} ${frameHeight}v${k % whole === 0 ? 12 : k % (whole / 2) === 0 ? 8 : 4}`;
  }
  return (
    <View
      role="img"
      aria-label="The ring pattern of a round hole. Its dark rings stand at 1.220, 2.233, 3.238, 4.241 and 5.243 times wavelength times distance over diameter."
      onLayout={(event) => setWidth(event.nativeEvent.layout.width)}
      style={[{ height: frameHeight + footHeight, overflow: 'hidden' }, style]}
    >
      {width > 0 ? (
        <Svg width={width} height={frameHeight + footHeight} aria-hidden>
          <Defs>
            <RadialGradient id={id} gradientUnits="userSpaceOnUse" cx={centreX} cy={centreY} r={reach * unit}>
              {gradient.map((stop) => (
                <Stop key={stop.offset} offset={stop.offset} stopColor={stop.colour} />
              ))}
            </RadialGradient>
          </Defs>
          <Rect x={0} y={0} width={width} height={frameHeight} fill={`url(#${id})`} />
          <Path d={ticks} stroke={colours.ink3} />
          <Path d={`M0 ${frameHeight}H${width}`} stroke={colours.ink1} strokeWidth={2} />
          {darkRings.slice(0, rings).map((q, i) => {
            const length = footHeight * (0.62 - 0.075 * i);
            return (
              <Path key={q} d={`M${x(q)} ${centreY}V${frameHeight + length}`} stroke={colours.ink1} strokeWidth={1.6} />
            );
          })}
          {darkRings.slice(0, rings).map((q, i) => (
            <SvgText
              key={q}
              x={Math.min(width - 22, x(q))}
              y={frameHeight + footHeight * (0.62 - 0.075 * i) + 17}
              textAnchor="middle"
              fontFamily={fontFamily.text}
              fontSize={layout === 'phone' ? 12 : 14}
              fill={colours.ink2}
            >
              {q.toFixed(3)}
            </SvgText>
          ))}
        </Svg>
      ) : null}
    </View>
  );
}
