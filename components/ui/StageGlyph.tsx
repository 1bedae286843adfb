import { View } from 'react-native';
import Svg, { Circle, Path } from 'react-native-svg';
import { hiddenFromReaders } from './hiddenFromReaders';
import { Text } from './Text';
import { useLook } from './useLook';

/** How mature a record is: the pattern fills ring by ring. */
export type RecordStage =
  | 'waiting'
  | 'measuring'
  | 'measured'
  | 'submitted'
  | 'approved'
  | 'released'
  | 'returned'
  | 'refused'
  | 'failed'
  | 'withdrawn';

export interface StageGlyphProps {
  stage: RecordStage;
  size?: number;
}

/** The stage of a record at icon size; its word must stand beside it or in its row. */
export function StageGlyph({ stage, size = 20 }: StageGlyphProps) {
  const { colours } = useLook();
  const ink = colours.ink1;
  const core = (r: number) => <Circle cx={10} cy={10} r={r} fill={ink} />;
  const ring = (r: number, width: number, dash?: string) => (
    <Circle cx={10} cy={10} r={r} fill="none" stroke={ink} strokeWidth={width} strokeDasharray={dash} />
  );
  const line = (d: string, width: number) => <Path d={d} fill="none" stroke={ink} strokeWidth={width} />;
  const drawings: Record<RecordStage, React.ReactNode> = {
    waiting: ring(2.6, 1.4),
    measuring: (
      <>
        {core(3)}
        <Path d="M10 3.2A6.8 6.8 0 0 1 16.8 10" fill="none" stroke={colours.accent} strokeWidth={2.2} />
      </>
    ),
    measured: core(3.2),
    submitted: (
      <>
        {core(3.2)}
        {line('M10 4A6 6 0 0 0 10 16', 1.7)}
      </>
    ),
    approved: (
      <>
        {core(3.2)}
        {ring(6, 1.7)}
      </>
    ),
    released: (
      <>
        {core(3.2)}
        {ring(5.9, 1.6)}
        {ring(9, 1.2)}
      </>
    ),
    returned: (
      <>
        {ring(3, 1.5)}
        {line('M10 4A6 6 0 0 0 4.2 11.5M1.6 8.8 4.2 11.8 7 9.4', 1.5)}
      </>
    ),
    refused: (
      <>
        {ring(6.6, 1.6)}
        {line('M5.6 11.6 11 5.4M6.8 14 13.2 6.4M9.4 15 14.6 8.8', 1.4)}
      </>
    ),
    failed: <Path d="M4 4h12v12H4z" fill="none" stroke={ink} strokeWidth={1.6} strokeDasharray="3 2.4" />,
    withdrawn: (
      <>
        {core(3)}
        {ring(6, 1.5, '2 2')}
      </>
    ),
  };
  return (
    <Svg width={size} height={size} viewBox="0 0 20 20" {...hiddenFromReaders}>
      {drawings[stage]}
    </Svg>
  );
}

/** Glyph and word together. */
export function StageChip({ stage, words }: { stage: RecordStage; words?: string }) {
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: 7 }}>
      <StageGlyph stage={stage} />
      <Text variant="small" tone="ink1" lines={1}>
        {words ?? stage}
      </Text>
    </View>
  );
}
