import { View } from 'react-native';
import Svg, { G, Path, Rect } from 'react-native-svg';
import { hiddenFromReaders } from './hiddenFromReaders';
import { Text } from './Text';
import { useLook } from './useLook';

/** Two walls and a bar. `open`: nothing to judge yet, or no tolerance agreed. */
export type Verdict = 'conforms' | 'undecided' | 'above' | 'below' | 'refused' | 'open';

export const verdictWords: Record<Verdict, string> = {
  conforms: 'conforms',
  undecided: 'undecided',
  above: 'does not conform',
  below: 'does not conform',
  refused: 'refused',
  open: 'not yet',
};

export interface VerdictGlyphProps {
  verdict: Verdict;
  /** 1 is 30 × 16 px. */
  scale?: number;
  /** Colour of the surface under it. */
  ground?: string;
}

/** A verdict at icon size; its word must stand beside it. */
export function VerdictGlyph({ verdict, scale = 1, ground }: VerdictGlyphProps) {
  const { colours } = useLook();
  const walls = (
    <>
      <Rect x={4} y={0} width={3} height={16} fill={colours.ink1} />
      <Rect x={20} y={0} width={3} height={16} fill={colours.ink1} />
    </>
  );
  const beyond = <Rect x={25.5} y={2} width={4.5} height={12} fill={colours.accent} />;
  return (
    <Svg width={30 * scale} height={16 * scale} viewBox="0 0 30 16" {...hiddenFromReaders}>
      {verdict === 'below' ? (
        <G transform="translate(30 0) scale(-1 1)">
          {walls}
          {beyond}
        </G>
      ) : (
        <G opacity={verdict === 'open' ? 0.55 : 1}>{walls}</G>
      )}
      {verdict === 'conforms' ? <Rect x={11} y={2} width={5} height={12} fill={colours.accent} /> : null}
      {verdict === 'undecided' ? (
        <>
          <Rect
            x={17.5}
            y={2.75}
            width={8}
            height={10.5}
            fill={ground ?? colours.plate}
            stroke={colours.accent}
            strokeWidth={1.5}
          />
          <Rect x={20} y={0} width={3} height={16} fill={colours.ink1} opacity={0.9} />
        </>
      ) : null}
      {verdict === 'above' ? beyond : null}
      {verdict === 'refused' ? (
        <Path d="M9.2 13 12.6 3M14.2 13 17.6 3" stroke={colours.ink1} strokeWidth={1.8} fill="none" />
      ) : null}
    </Svg>
  );
}

/** Glyph and word together. */
export function VerdictChip({ verdict, words, strong }: { verdict: Verdict; words?: string; strong?: boolean }) {
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: 9 }}>
      <VerdictGlyph verdict={verdict} />
      <Text variant={strong ? 'strong' : 'body'} lines={1}>
        {words ?? verdictWords[verdict]}
      </Text>
    </View>
  );
}
