import { useEffect, useRef, type RefObject } from 'react';
import type { View } from 'react-native';
import type { Point } from './place';

export interface SheetPointers {
  /** A finger or button goes down; answers whether what it holds is dragged instead of the frame. */
  onGrab(at: Point, touch: boolean): boolean;
  onDragGrip(dx: number, dy: number): void;
  onPan(dx: number, dy: number): void;
  onZoom(about: Point, factor: number): void;
  /** Pressed and let go without moving. */
  onTap(at: Point, touch: boolean): void;
  onDoubleTap(at: Point): void;
  /** A pointer without a button over the sheet; null when it leaves. */
  onHover(at: Point | null): void;
}

/** Movement within which a press is still a touch, px. */
const TAP_PX = 6;
const DOUBLE_TAP_MS = 320;

/**
 * Pointer and wheel events of an element: drag, two-finger pinch, wheel and trackpad pinch, touch and double touch.
 * Wheel and drag are taken from the page only where `holds` says so.
 */
export function useSheetPointers(
  host: RefObject<View | null>,
  handlers: SheetPointers,
  active: boolean,
  holds: (at: Point) => boolean,
): void {
  const latest = useRef({ handlers, holds });
  useEffect(() => {
    latest.current = { handlers, holds };
  });
  useEffect(() => {
    const element = host.current as unknown as HTMLElement | null;
    if (!element || typeof element.addEventListener !== 'function') return undefined;
    const down = new Map<number, Point>();
    let start: Point | null = null;
    let moved = false;
    let gripped = false;
    let panning = false;
    let lastTap = { time: 0, x: 0, y: 0 };
    const at = (event: MouseEvent): Point => {
      const box = element.getBoundingClientRect();
      return { x: event.clientX - box.left, y: event.clientY - box.top };
    };
    const onWheel = (event: WheelEvent) => {
      const point = at(event);
      if (!latest.current.holds(point)) return;
      event.preventDefault();
      const px = event.deltaMode === 1 ? event.deltaY * 16 : event.deltaY;
      latest.current.handlers.onZoom(point, Math.exp(-px * (event.ctrlKey ? 0.01 : 0.0015)));
    };
    const onDown = (event: PointerEvent) => {
      const point = at(event);
      if (active && latest.current.holds(point)) element.setPointerCapture(event.pointerId);
      down.set(event.pointerId, point);
      if (down.size > 1) {
        moved = true;
        gripped = false;
        return;
      }
      start = point;
      moved = false;
      panning = active && latest.current.holds(point);
      gripped = panning && latest.current.handlers.onGrab(point, event.pointerType === 'touch');
    };
    const onMove = (event: PointerEvent) => {
      const point = at(event);
      let before = down.get(event.pointerId);
      if (!before) {
        if (down.size === 0) latest.current.handlers.onHover(point);
        return;
      }
      down.set(event.pointerId, point);
      if (!moved && start && Math.hypot(point.x - start.x, point.y - start.y) > TAP_PX) {
        moved = true;
        before = start;
      }
      if (!panning || !moved) return;
      const dx = point.x - before.x;
      const dy = point.y - before.y;
      if (down.size === 1) {
        if (gripped) latest.current.handlers.onDragGrip(dx, dy);
        else latest.current.handlers.onPan(dx, dy);
        return;
      }
      let other: Point | undefined;
      for (const [id, p] of down) if (id !== event.pointerId) other = p;
      if (!other) return;
      const was = Math.hypot(before.x - other.x, before.y - other.y);
      const is = Math.hypot(point.x - other.x, point.y - other.y);
      latest.current.handlers.onPan(dx / 2, dy / 2);
      if (was > 1) latest.current.handlers.onZoom({ x: (point.x + other.x) / 2, y: (point.y + other.y) / 2 }, is / was);
    };
    const onUp = (event: PointerEvent) => {
      const before = down.get(event.pointerId);
      down.delete(event.pointerId);
      if (!before || moved || event.type === 'pointercancel') return;
      const touch = event.pointerType === 'touch';
      const again =
        event.timeStamp - lastTap.time < DOUBLE_TAP_MS && Math.hypot(before.x - lastTap.x, before.y - lastTap.y) < 24;
      lastTap = again ? { time: 0, x: 0, y: 0 } : { time: event.timeStamp, x: before.x, y: before.y };
      if (again && panning) latest.current.handlers.onDoubleTap(before);
      else latest.current.handlers.onTap(before, touch);
    };
    const onLeave = () => latest.current.handlers.onHover(null);
    if (active) {
      element.style.touchAction = 'none';
      element.addEventListener('wheel', onWheel, { passive: false });
    }
    element.addEventListener('pointerdown', onDown);
    element.addEventListener('pointermove', onMove);
    element.addEventListener('pointerup', onUp);
    element.addEventListener('pointercancel', onUp);
    element.addEventListener('pointerleave', onLeave);
    return () => {
      element.style.touchAction = '';
      element.removeEventListener('wheel', onWheel);
      element.removeEventListener('pointerdown', onDown);
      element.removeEventListener('pointermove', onMove);
      element.removeEventListener('pointerup', onUp);
      element.removeEventListener('pointercancel', onUp);
      element.removeEventListener('pointerleave', onLeave);
    };
  }, [host, active]);
}
