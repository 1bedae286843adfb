import Svg, { Circle, Path, Rect } from 'react-native-svg';
import { iconDrawings, type IconName, type IconPart } from './iconDrawings';
import { stroke } from './tokens';
import { useLook } from './useLook';
import { hiddenFromReaders } from './hiddenFromReaders';

export interface IconProps {
  name: IconName;
  /** Side in px: 24, or 20 in dense rows. */
  size?: number;
  /** Defaults to ink1. */
  colour?: string;
  strokeWidth?: number;
}

/** A drawing from assets/icons. Decoration beside a word: screen readers skip it. */
export function Icon({ name, size = 24, colour, strokeWidth = stroke.icon }: IconProps) {
  const { colours } = useLook();
  const ink = colour ?? colours.ink1;
  const parts: readonly IconPart[] = iconDrawings[name];
  return (
    <Svg width={size} height={size} viewBox="0 0 24 24" fill="none" {...hiddenFromReaders}>
      {parts.map((part, i) => {
        if ('path' in part) return <Path key={i} d={part.path} stroke={ink} strokeWidth={strokeWidth} />;
        if ('square' in part) {
          const [x, y, side] = part.square;
          return <Rect key={i} x={x} y={y} width={side} height={side} fill={ink} />;
        }
        const [cx, cy, r] = 'dot' in part ? part.dot : part.ring;
        return 'dot' in part ? (
          <Circle key={i} cx={cx} cy={cy} r={r} fill={ink} />
        ) : (
          <Circle key={i} cx={cx} cy={cy} r={r} stroke={ink} strokeWidth={strokeWidth} />
        );
      })}
    </Svg>
  );
}
