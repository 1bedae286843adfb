import type { ReactNode } from 'react';
import { View } from 'react-native';
import Svg, { Path } from 'react-native-svg';
import { arcPath } from './arcPath';
import { useLook } from './useLook';

/** One file, or one aperture of a lot. `part` from 0 to 1 is how much of it has been sent. */
export type RingSegment =
  { state: 'waiting' | 'measuring' | 'measured' | 'refused' } | { state: 'uploading'; part: number };

export interface ProgressRingProps {
  segments: readonly RingSegment[];
  /** px */
  size?: number;
  /** The whole in words: “4 of 12 measured, 2 refused”. */
  label: string;
  /** In the middle: the count. */
  children?: ReactNode;
}

/** One segment for each file, with dark gaps between. */
export function ProgressRing({ segments, size = 104, label, children }: ProgressRingProps) {
  const { colours } = useLook();
  const radius = size / 2 - 6;
  const count = Math.max(1, segments.length);
  const gap = count === 1 ? 0.0005 : Math.min(0.075, 1.1 / count);
  return (
    <View role="img" aria-label={label} style={{ width: size, height: size }}>
      <Svg width={size} height={size} fill="none" aria-hidden>
        {segments.map((segment, i) => {
          const from = (i / count) * 2 * Math.PI + gap;
          const to = ((i + 1) / count) * 2 * Math.PI - gap;
          const at = (part: number) => from + (to - from) * part;
          const arc = (r: number, a: number, b: number, colour: string, width: number) => (
            <Path
              key={`${i}-${r}-${width}-${colour}`}
              d={arcPath(size / 2, r, a, b)}
              stroke={colour}
              strokeWidth={width}
            />
          );
          switch (segment.state) {
            case 'measured':
              return arc(radius, from, to, colours.accent, 8);
            case 'refused':
              return [
                arc(radius + 3.2, from, to, colours.ink1, 1.6),
                arc(radius - 3.2, from, to, colours.ink1, 1.6),
                arc(radius, at(0.3), at(0.7), colours.ink1, 2),
              ];
            case 'uploading':
              return [
                arc(radius, from, to, colours.rule, 2),
                arc(radius, from, at(Math.min(1, Math.max(0.02, segment.part))), colours.ink1, 4),
              ];
            case 'measuring':
              return [arc(radius, from, to, colours.rule, 8), arc(radius + 0.01, from, at(0.45), colours.accent, 8)];
            case 'waiting':
              return arc(radius, from, to, colours.rule, 2);
          }
        })}
      </Svg>
      <View style={{ position: 'absolute', inset: 0, alignItems: 'center', justifyContent: 'center' }}>{children}</View>
    </View>
  );
}
