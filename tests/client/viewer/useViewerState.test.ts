import { act, renderHook } from '@testing-library/react-native';
import type { MeasuredFrame } from '@/components/viewer/SheetScene';
import { useViewerState } from '@/components/viewer/useViewerState';
import type { FramePlane } from '@/shared/optics/framePlane';

const planeOf = (black: number): FramePlane => ({
  widthPx: 200,
  heightPx: 100,
  data: Uint16Array.from({ length: 20_000 }, (_, i) => black + (i % 1000)),
  blackCount: black,
  whiteCount: 4095,
});
const ring = (order: number) => ({
  order,
  kind: 'dark' as const,
  radiusMm: order,
  uncertaintyMm: 1e-4,
  predictedMm: order,
  sizeUm: 100,
});
const measured: MeasuredFrame = {
  centrePx: { x: 90, y: 50 },
  rings: [ring(2), ring(1)],
  profile: { radiusMm: [], meanCounts: [], standardErrorCounts: [], pixelCount: [], modelCounts: [] },
  pixelPitchUm: 5,
};
interface Given {
  frameId: string;
  plane: FramePlane | null;
  measured: MeasuredFrame | null;
  light: boolean;
}
const start = (given: Given) =>
  renderHook((g: Given) => useViewerState(g.frameId, g.plane, g.measured, g.light), { initialProps: given });

test('a measured frame begins with its first dark ring, log tone and levels that fit', () => {
  const { result } = start({ frameId: 'a', plane: planeOf(64), measured, light: false });
  expect(result.current.chosenOrder).toBe(1);
  expect(result.current.tone).toBe('log');
  expect(result.current.levels).toEqual({ low: 163, high: 1063 });
  expect(result.current.negative).toBe(false);
  expect(result.current.segment).toMatchObject({ x0: 90, y0: 50 });
});

test('levels, line and chosen ring belong to the frame; tone and layers stay', () => {
  const { result, rerender } = start({ frameId: 'a', plane: planeOf(64), measured, light: false });
  act(() => {
    result.current.setLevels({ low: 100, high: 500 });
    result.current.setChosenOrder(null);
    result.current.setTone('linear');
    result.current.setLayer('measured', true);
  });
  expect(result.current.levels).toEqual({ low: 100, high: 500 });
  expect(result.current.chosenOrder).toBeNull();
  rerender({ frameId: 'b', plane: planeOf(80), measured, light: false });
  expect(result.current.levels).toEqual({ low: 179, high: 1079 });
  expect(result.current.chosenOrder).toBe(1);
  expect(result.current.tone).toBe('linear');
  expect(result.current.layers.measured).toBe(true);
});

test('tools switch their layer on and off again', () => {
  const { result } = start({ frameId: 'a', plane: planeOf(64), measured: null, light: true });
  expect(result.current.negative).toBe(true);
  act(() => result.current.setTool('line'));
  expect(result.current.layers.line).toBe(true);
  act(() => result.current.setTool('mask'));
  expect([result.current.layers.line, result.current.layers.mask]).toEqual([false, true]);
  act(() => result.current.setTool('rings'));
  expect(result.current.layers.mask).toBe(false);
});
