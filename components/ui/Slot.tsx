import { useId, useState } from 'react';
import { View, type StyleProp, type ViewStyle } from 'react-native';
import Svg, { Defs, Path, Rect, Text as SvgText } from 'react-native-svg';
import { HatchPattern } from './HatchPattern';
import { slotScale } from './slotGeometry';
import { fontFamily } from './tokens';
import { useLook } from './useLook';
import { useSettled } from './useSettled';

export interface SlotMark {
  value: number;
  /** To look at: drawn in ink0. */
  odd?: boolean;
}

export interface SlotProps {
  /** Walls, in the unit of the value; null: no wall on that side. */
  lower: number | null;
  upper: number | null;
  value?: number | null;
  /** Expanded uncertainty: the band around the value. */
  uncertainty?: number | null;
  /** Width of the guard band inside each wall. */
  guard?: number;
  nominal?: number | null;
  /** Several values in one slot. */
  marks?: readonly SlotMark[];
  size?: 'lg' | 'md' | 'sm';
  /** Decimals of the labels under lg and md. */
  decimals?: number;
  /** The whole in words, with unit: “100.37 µm, between 99.0 and 101.0 µm”. */
  label: string;
  style?: StyleProp<ViewStyle>;
}

const heights = {
  lg: { top: 12, body: 46, foot: 24 },
  md: { top: 6, body: 26, foot: 18 },
  sm: { top: 0, body: 16, foot: 0 },
} as const;

/** A judgement as a gap between two hatched walls: in the gap good, at a wall look, in the wall no. */
export function Slot({
  lower,
  upper,
  value = null,
  uncertainty = null,
  guard = 0,
  nominal = null,
  marks = [],
  size = 'md',
  decimals = 1,
  label,
  style,
}: SlotProps) {
  const { colours } = useLook();
  const [width, setWidth] = useState(0);
  const id = `slot${useId().replace(/\W/g, '')}`;
  const shown = useSettled(value, size === 'lg');
  const spread = useSettled(uncertainty, size === 'lg');
  const { top, body, foot } = heights[size];
  const bottom = top + body;
  const height = bottom + foot;
  const reach = uncertainty ?? 0;
  const scale = slotScale({ lower, upper }, width, [
    ...(value === null ? [] : [value - reach, value + reach]),
    ...marks.map((mark) => mark.value),
    ...(nominal === null ? [] : [nominal]),
  ]);
  const left = lower === null ? 0 : scale.x(lower);
  const right = upper === null ? width : scale.x(upper);
  const wallLine = size === 'lg' ? 2 : 1.5;
  const pattern = size === 'sm' ? { step: 4, line: 1.1 } : { step: 6, line: 1.3 };
  const text = (x: number, words: string, key: string) => (
    <SvgText
      key={key}
      x={Math.min(width - 20, Math.max(20, x))}
      y={bottom + 16}
      textAnchor="middle"
      fontFamily={fontFamily.text}
      fontSize={12}
      fill={colours.ink2}
    >
      {words.replace('-', '\u2212')}
    </SvgText>
  );
  const guardX =
    guard > 0 && lower !== null && upper !== null ? { a: scale.x(lower + guard), b: scale.x(upper - guard) } : null;

  return (
    <View
      role="img"
      aria-label={label}
      onLayout={(event) => setWidth(event.nativeEvent.layout.width)}
      style={[{ height }, style]}
    >
      {width > 0 ? (
        <Svg width={width} height={height} aria-hidden>
          <Defs>
            <HatchPattern id={id} step={pattern.step} line={pattern.line} angleDeg={45} colour={colours.hatch} />
            <HatchPattern id={`${id}g`} step={6} line={1} angleDeg={-45} colour={colours.rule} />
          </Defs>
          <Rect x={left} y={top} width={Math.max(0, right - left)} height={body} fill={colours.slotGap} />
          {guardX ? (
            <>
              <Rect x={left} y={top} width={guardX.a - left} height={body} fill={`url(#${id}g)`} />
              <Rect x={guardX.b} y={top} width={right - guardX.b} height={body} fill={`url(#${id}g)`} />
              {size === 'sm' ? null : (
                <Path
                  d={`M${guardX.a} ${top}V${bottom}M${guardX.b} ${top}V${bottom}`}
                  stroke={colours.ink3}
                  strokeDasharray="2 3"
                />
              )}
            </>
          ) : null}
          {lower === null ? null : (
            <>
              <Rect x={0} y={top} width={left} height={body} fill={colours.wall} />
              <Rect x={0} y={top} width={left} height={body} fill={`url(#${id})`} />
              <Path d={`M${left} ${top}V${bottom}`} stroke={colours.ink1} strokeWidth={wallLine} />
            </>
          )}
          {upper === null ? null : (
            <>
              <Rect x={right} y={top} width={width - right} height={body} fill={colours.wall} />
              <Rect x={right} y={top} width={width - right} height={body} fill={`url(#${id})`} />
              <Path d={`M${right} ${top}V${bottom}`} stroke={colours.ink1} strokeWidth={wallLine} />
            </>
          )}
          {marks.map((mark, i) => {
            const x = Math.min(width - 2, Math.max(2, scale.x(mark.value)));
            return (
              <Path
                key={i}
                d={`M${x} ${top + body * 0.16}V${top + body * 0.84}`}
                stroke={mark.odd ? colours.ink0 : colours.accent}
                strokeWidth={2.5}
              />
            );
          })}
          {shown === null ? null : (
            <ValueMark x={scale.x} value={shown} spread={spread} size={size} top={top} body={body} width={width} />
          )}
          {size === 'sm' ? null : (
            <>
              {lower === null ? null : text(left, lower.toFixed(decimals), 'lower')}
              {upper === null ? null : text(right, upper.toFixed(decimals), 'upper')}
              {nominal !== null && size === 'lg' ? (
                <>
                  <Path d={`M${scale.x(nominal)} ${bottom}v5`} stroke={colours.ink2} strokeWidth={1.5} />
                  {text(scale.x(nominal), nominal.toFixed(decimals), 'nominal')}
                </>
              ) : null}
            </>
          )}
        </Svg>
      ) : null}
    </View>
  );
}

interface ValueMarkProps {
  x: (value: number) => number;
  value: number;
  spread: number | null;
  size: 'lg' | 'md' | 'sm';
  top: number;
  body: number;
  width: number;
}

function ValueMark({ x, value, spread, size, top, body, width }: ValueMarkProps) {
  const { colours } = useLook();
  const large = size === 'lg';
  const at = Math.min(width - 1.5, Math.max(1.5, x(value)));
  const band = body * (large ? 0.42 : 0.5);
  const bandTop = top + (body - band) / 2;
  const from = spread === null ? at : x(value - spread);
  const to = spread === null ? at : x(value + spread);
  return (
    <>
      {spread === null ? null : (
        <>
          <Rect x={from} y={bandTop} width={Math.max(3, to - from)} height={band} fill={colours.soft} />
          {large ? (
            <Path
              d={`M${from} ${bandTop - 3}v${band + 6}M${to} ${bandTop - 3}v${band + 6}`}
              stroke={colours.accent}
              strokeWidth={1.5}
            />
          ) : null}
        </>
      )}
      <Path
        d={`M${at} ${top - (large ? 8 : size === 'md' ? 4 : 0)}V${top + body + (large ? 4 : 0)}`}
        stroke={colours.accent}
        strokeWidth={large ? 3 : 2.5}
      />
    </>
  );
}
