import { useEffect, useMemo, useRef, useState } from 'react';
import { View } from 'react-native';
import { Text } from '@/components/ui/Text';
import { useLook } from '@/components/ui/useLook';
import { webProps } from '@/components/ui/webProps';
import { formatNumber } from '@/shared/units/format';
import { countOfTone, histogramBars, moveLevel, toneOf, type Levels } from './levels';

interface Props {
  table: Uint32Array;
  whole: Levels;
  levels: Levels;
  floorCounts: number;
  onChange: (levels: Levels) => void;
  heightPx?: number;
}

const BARS = 48;

/** How many pixels have which counts, with the two levels to be dragged: no light left of one, full light right of the other. */
export function LevelsControl({ table, whole, levels, floorCounts, onChange, heightPx = 92 }: Props) {
  const { colours } = useLook();
  const [width, setWidth] = useState(0);
  const host = useRef<View>(null);
  const bars = useMemo(() => histogramBars(table, whole, floorCounts, BARS), [table, whole, floorCounts]);
  const foot = heightPx - 18;
  const at = (count: number) => toneOf(count, whole, 'log', floorCounts) * width;
  const latest = useRef({ levels, whole, floorCounts, width, onChange });
  useEffect(() => {
    latest.current = { levels, whole, floorCounts, width, onChange };
  });

  useEffect(() => {
    const element = host.current as unknown as HTMLElement | null;
    if (!element || typeof element.addEventListener !== 'function') return undefined;
    let held: keyof Levels | null = null;
    const take = (event: PointerEvent) => {
      const now = latest.current;
      if (now.width === 0 || held === null) return;
      const x = event.clientX - element.getBoundingClientRect().left;
      const t = Math.min(1, Math.max(0, x / now.width));
      now.onChange(moveLevel(now.levels, held, countOfTone(t, now.whole, 'log', now.floorCounts), now.whole));
    };
    const down = (event: PointerEvent) => {
      const now = latest.current;
      const t = (event.clientX - element.getBoundingClientRect().left) / Math.max(1, now.width);
      const low = toneOf(now.levels.low, now.whole, 'log', now.floorCounts);
      const high = toneOf(now.levels.high, now.whole, 'log', now.floorCounts);
      held = Math.abs(t - low) < Math.abs(t - high) ? 'low' : 'high';
      element.setPointerCapture(event.pointerId);
      take(event);
    };
    const up = () => {
      held = null;
    };
    element.style.touchAction = 'none';
    element.addEventListener('pointerdown', down);
    element.addEventListener('pointermove', take);
    element.addEventListener('pointerup', up);
    element.addEventListener('pointercancel', up);
    return () => {
      element.removeEventListener('pointerdown', down);
      element.removeEventListener('pointermove', take);
      element.removeEventListener('pointerup', up);
      element.removeEventListener('pointercancel', up);
    };
  }, []);

  return (
    <View
      ref={host}
      style={{ height: heightPx, cursor: 'pointer' }}
      onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)}
    >
      {bars.map((height, i) => (
        <View
          key={i}
          style={{
            position: 'absolute',
            left: `${(100 * i) / BARS}%`,
            width: `${100 / BARS - 0.5}%`,
            top: foot - height * (foot - 4),
            height: height * (foot - 4),
            backgroundColor: colours.ink3,
          }}
        />
      ))}
      <View style={{ position: 'absolute', left: 0, right: 0, top: foot, height: 1, backgroundColor: colours.ink3 }} />
      <Handle
        name="No light below"
        which="low"
        {...{ levels, whole, floorCounts, onChange, foot }}
        x={at(levels.low)}
        width={width}
      />
      <Handle
        name="Full light above"
        which="high"
        {...{ levels, whole, floorCounts, onChange, foot }}
        x={at(levels.high)}
        width={width}
      />
    </View>
  );
}

interface HandleProps {
  name: string;
  which: keyof Levels;
  levels: Levels;
  whole: Levels;
  floorCounts: number;
  onChange: (levels: Levels) => void;
  x: number;
  width: number;
  foot: number;
}

function Handle({ name, which, levels, whole, floorCounts, onChange, x, width, foot }: HandleProps) {
  const { colours } = useLook();
  const host = useRef<View>(null);
  const step = useRef<(by: number) => void>(() => undefined);
  useEffect(() => {
    step.current = (by) => {
      const t = toneOf(levels[which], whole, 'log', floorCounts) + 0.02 * by;
      const count = countOfTone(Math.min(1, Math.max(0, t)), whole, 'log', floorCounts);
      const moved = Math.round(count) === levels[which] ? levels[which] + by : count;
      onChange(moveLevel(levels, which, moved, whole));
    };
  });
  useEffect(() => {
    const element = host.current as unknown as HTMLElement | null;
    if (!element || typeof element.addEventListener !== 'function') return undefined;
    const key = (event: KeyboardEvent) => {
      const by =
        event.key === 'ArrowRight' || event.key === 'ArrowUp'
          ? 1
          : event.key === 'ArrowLeft' || event.key === 'ArrowDown'
            ? -1
            : 0;
      if (by === 0) return;
      event.preventDefault();
      step.current(by);
    };
    element.addEventListener('keydown', key);
    return () => element.removeEventListener('keydown', key);
  }, []);
  const leftSide = x > width - 60;
  return (
    <View
      ref={host}
      role="slider"
      aria-label={name}
      {...webProps({
        tabIndex: 0,
        'aria-valuemin': Math.round(whole.low),
        'aria-valuemax': Math.round(whole.high),
        'aria-valuenow': Math.round(levels[which]),
        'aria-valuetext': `${Math.round(levels[which])} counts`,
      })}
      style={{ position: 'absolute', left: x - 12, width: 24, top: 0, bottom: 0 }}
    >
      <View
        style={{ position: 'absolute', left: 10.75, width: 2.5, top: 2, bottom: 0, backgroundColor: colours.accent }}
      />
      <View style={{ position: 'absolute', top: foot + 2, ...(leftSide ? { right: 18 } : { left: 18 }) }}>
        <Text variant="label" lines={1} style={{ width: 60, textAlign: leftSide ? 'right' : 'left' }}>
          {formatNumber(levels[which], { places: 0 })}
        </Text>
      </View>
    </View>
  );
}
