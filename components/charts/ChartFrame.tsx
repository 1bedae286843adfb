import { useEffect, useRef, type ReactNode } from 'react';
import { View } from 'react-native';
import { PictureSurface, type SurfaceSize } from '@/components/viewer/PictureSurface';
import type { Pen } from '@/components/viewer/Pen';
import { webProps } from '@/components/ui/webProps';

interface Props {
  heightPx: number;
  /** What the picture says, in a sentence. */
  label: string;
  draw: (pen: Pen, size: SurfaceSize) => void;
  /** A touch at a point of the drawing, px. */
  onTouch?: (x: number, y: number, size: SurfaceSize) => void;
  /** Left and right arrow: −1 and +1. */
  onStep?: (by: 1 | -1) => void;
  /** Place in a row of choices, for a chart that chooses: read out as a slider. */
  choice?: { now: number; count: number; text: string };
  children?: ReactNode;
}

/** A drawing in the page: named for readers, reachable by keys, and aware of where it is touched. */
export function ChartFrame({ heightPx, label, draw, onTouch, onStep, choice, children }: Props) {
  const host = useRef<View>(null);
  const size = useRef<SurfaceSize>({ width: 0, height: 0 });
  const handlers = useRef({ onTouch, onStep });
  useEffect(() => {
    handlers.current = { onTouch, onStep };
  });
  useEffect(() => {
    const element = host.current as unknown as HTMLElement | null;
    if (!element || typeof element.addEventListener !== 'function') return undefined;
    const click = (event: MouseEvent) => {
      const box = element.getBoundingClientRect();
      handlers.current.onTouch?.(event.clientX - box.left, event.clientY - box.top, size.current);
    };
    const key = (event: KeyboardEvent) => {
      const by =
        event.key === 'ArrowRight' || event.key === 'ArrowUp'
          ? 1
          : event.key === 'ArrowLeft' || event.key === 'ArrowDown'
            ? -1
            : null;
      if (by === null || !handlers.current.onStep) return;
      event.preventDefault();
      handlers.current.onStep(by);
    };
    element.addEventListener('click', click);
    element.addEventListener('keydown', key);
    return () => {
      element.removeEventListener('click', click);
      element.removeEventListener('keydown', key);
    };
  }, []);
  const chooses = onStep !== undefined && choice !== undefined;
  return (
    <View
      ref={host}
      role={chooses ? 'slider' : 'img'}
      aria-label={label}
      {...(chooses
        ? webProps({
            tabIndex: 0,
            'aria-valuemin': 0,
            'aria-valuemax': choice.count,
            'aria-valuenow': choice.now,
            'aria-valuetext': choice.text,
          })
        : {})}
      style={{ height: heightPx, alignSelf: 'stretch', overflow: 'hidden' }}
    >
      <PictureSurface
        draw={draw}
        onSize={(next) => {
          size.current = next;
        }}
      />
      {children}
    </View>
  );
}
