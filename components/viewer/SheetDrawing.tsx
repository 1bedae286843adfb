import { memo, useCallback, useEffect, useImperativeHandle, useMemo, useRef } from 'react';
import { PixelRatio, View } from 'react-native';
import { reachMm } from '@/components/charts/profileSeries';
import { darkRings, ringNear, stepRing } from '@/components/charts/ringChoice';
import { coloursFor } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import { webProps } from '@/components/ui/webProps';
import { lineProfile } from '@/shared/optics/lineProfile';
import { ownColourMap } from '@/shared/optics/ownColour';
import { drawSheet, radialAxis } from './drawSheet';
import { ColourStrip, FrameTexture } from './FrameTexture';
import { hasWebGl } from './hasWebGl';
import { gripAt, moveGrip, type Grip } from './lineGrip';
import type { Pen } from './Pen';
import { PictureSurface, type PictureSurfaceHandle } from './PictureSurface';
import {
  bottom,
  hold,
  holds,
  pan,
  placeCentre,
  placeWhole,
  right,
  toFrame,
  toSheet,
  zoomAbout,
  type Place,
  type Point,
} from './place';
import { ringRows } from './ringRows';
import type { SheetProps } from './Sheet';
import type { SheetScene } from './SheetScene';
import { useDisposable } from './useDisposable';
import { sheetKeys } from './sheetKeys';
import { useSheetPointers } from './useSheetPointers';

const FINGER_PX = 24;
const POINTER_PX = 12;
/** Rest after which a moved frame is drawn from all its samples. */
const SETTLE_MS = 140;
const noRows: ReadonlyMap<number, number> = new Map();

/** What `Sheet` shows once the drawing engine is there. */
export const SheetDrawing = memo(function SheetDrawing(props: SheetProps) {
  const {
    layout,
    plane,
    misfit,
    measured,
    wavelengthNm,
    ownColour,
    negative,
    movable = true,
    handle,
    rowsBetween,
  } = props;
  const { colours, theme } = useLook();
  const surface = useRef<PictureSurfaceHandle>(null);
  const host = useRef<View>(null);
  const frameRegion = useRef<View>(null);
  const place = useRef<Place | null>(null);
  const moved = useRef(false);
  const grip = useRef<Grip | null>(null);
  const told = useRef(0);
  const settling = useRef<ReturnType<typeof setTimeout> | null>(null);

  const texture = useDisposable(useCallback(() => (plane ? new FrameTexture(plane, misfit) : null), [plane, misfit]));
  const strip = useDisposable(
    useCallback(
      () => new ColourStrip(ownColourMap(ownColour ? wavelengthNm : null, negative ? 'light' : 'dark')),
      [ownColour, wavelengthNm, negative],
    ),
  );
  const dark = useMemo(() => (measured ? darkRings(measured.rings) : []), [measured]);
  const onFrame = useMemo(() => coloursFor(negative ? 'light' : 'dark', wavelengthNm), [negative, wavelengthNm]);
  const line = useMemo(
    () => (plane && props.segment && props.below === 'line' ? lineProfile(plane, props.segment) : null),
    [plane, props.segment, props.below],
  );

  const fitted = useMemo((): Place | null => {
    if (measured) {
      const reach =
        reachMm(
          measured.profile,
          dark.map((r) => r.radiusMm),
        ) /
        (measured.pixelPitchUm / 1000);
      const end = layout.plot ? right(layout.plot) : right(layout.frame);
      return placeCentre(measured.centrePx, { x: layout.zeroX, y: layout.centreY }, reach, end - layout.zeroX);
    }
    return plane ? placeWhole(layout.frame, plane.widthPx, plane.heightPx) : null;
  }, [measured, dark, layout, plane]);
  const whole = useMemo(
    () => (plane ? placeWhole(layout.frame, plane.widthPx, plane.heightPx) : null),
    [plane, layout],
  );
  const minScale = Math.min(whole?.k ?? 1, fitted?.k ?? 1) * 0.5;

  const { onPlace } = props;
  const show = useCallback(
    (next: Place | null) => {
      place.current = next;
      surface.current?.invalidate();
      if (!next || !onPlace || told.current !== 0) return;
      told.current = requestAnimationFrame(() => {
        told.current = 0;
        if (place.current) onPlace(place.current);
      });
    },
    [onPlace],
  );
  useEffect(() => {
    if (!moved.current || !place.current) show(fitted);
  }, [fitted, show]);
  useEffect(
    () => () => {
      cancelAnimationFrame(told.current);
      told.current = 0;
      if (settling.current !== null) clearTimeout(settling.current);
      settling.current = null;
    },
    [],
  );

  const move = (next: (now: Place) => Place) => {
    if (!place.current || !plane) return;
    moved.current = true;
    // A moving frame is drawn from fewer samples, so that it keeps up with the hand; it is drawn whole once it rests.
    if (settling.current !== null) clearTimeout(settling.current);
    settling.current = setTimeout(() => {
      settling.current = null;
      surface.current?.invalidate();
    }, SETTLE_MS);
    show(hold(next(place.current), layout.frame, plane.widthPx, plane.heightPx));
  };
  const middle: Point = {
    x: layout.frame.left + layout.frame.width / 2,
    y: layout.frame.top + layout.frame.height / 2,
  };
  const fit = () => {
    moved.current = false;
    show(fitted);
  };
  const showWhole = () => {
    moved.current = true;
    show(whole);
  };
  useImperativeHandle(handle, () => ({
    zoom: (factor) => move((now) => zoomAbout(now, middle, factor, minScale)),
    fit,
    whole: showWhole,
  }));

  const chooseAt = (at: Point, touch: boolean) => {
    if (!measured || !place.current || !props.onChooseRing) return;
    const axis = radialAxis({ place: place.current }, measured);
    const centre = toSheet(place.current, measured.centrePx);
    const reach = touch ? FINGER_PX : POINTER_PX;
    let order: number | null = null;
    if (layout.unwrapped && holds(layout.unwrapped, at)) {
      order = ringNear(dark, centre.y - at.y, axis.pxPerMm, reach);
    } else if (holds(layout.frame, at)) {
      const distance = props.view === 'unwrapped' ? at.x - centre.x : Math.hypot(at.x - centre.x, at.y - centre.y);
      order = ringNear(dark, distance, axis.pxPerMm, reach);
    } else if (layout.plot && props.below === 'radial' && at.x >= layout.plot.left - FINGER_PX) {
      order = ringNear(dark, Math.abs(at.x - axis.zeroX), axis.pxPerMm, FINGER_PX);
    }
    if (order !== null) props.onChooseRing(order === props.chosenOrder ? null : order);
  };
  useSheetPointers(
    host,
    {
      onGrab: (at, touch) => {
        grip.current =
          props.layers.line && props.segment && props.onSegment && place.current && holds(layout.frame, at)
            ? gripAt(place.current, props.segment, at, touch ? FINGER_PX + 4 : POINTER_PX + 2)
            : null;
        return grip.current !== null;
      },
      onDragGrip: (dx, dy) => {
        if (!plane || !place.current || !props.segment || !grip.current) return;
        const { k } = place.current;
        props.onSegment?.(moveGrip(props.segment, grip.current, dx / k, dy / k, plane.widthPx, plane.heightPx));
      },
      onPan: (dx, dy) => {
        if (!plane) return;
        move((now) => pan(now, dx, props.view === 'unwrapped' ? 0 : dy, layout.frame, plane.widthPx, plane.heightPx));
      },
      onZoom: (about, factor) => move((now) => zoomAbout(now, about, factor, minScale)),
      onTap: chooseAt,
      onDoubleTap: (at) => {
        if (moved.current) fit();
        else move((now) => zoomAbout(now, at, 3, minScale));
      },
      onHover: (at) => {
        if (!props.onHover) return;
        const inside = at !== null && place.current !== null && props.view !== 'unwrapped' && holds(layout.frame, at);
        props.onHover(inside && place.current ? toFrame(place.current, at) : null);
      },
    },
    movable,
    (at) => at.y < bottom(layout.frame) || (layout.plot !== null && at.y < layout.height),
  );
  const frameKeys = sheetKeys((key) => {
    if (key === 'fit') fit();
    else if (key === 'in' || key === 'out') move((now) => zoomAbout(now, middle, key === 'in' ? 1.25 : 0.8, minScale));
    else
      move((now) => ({
        ...now,
        xPx: now.xPx + (key === 'left' ? 40 : key === 'right' ? -40 : 0),
        yPx: now.yPx + (key === 'up' ? 40 : key === 'down' ? -40 : 0),
      }));
  });
  const chartKeys = sheetKeys((key) => {
    if (key === 'left' || key === 'down') props.onChooseRing?.(stepRing(dark, props.chosenOrder, -1));
    if (key === 'right' || key === 'up') props.onChooseRing?.(stepRing(dark, props.chosenOrder, 1));
  });

  const draw = (pen: Pen) => {
    if (!strip) return;
    const at = place.current ?? fitted ?? { xPx: 0, yPx: 0, k: 1 };
    const scene: SheetScene = {
      layout,
      place: at,
      plane,
      texture,
      strip,
      hasMisfit: misfit !== null,
      measured,
      dark,
      chosenOrder: props.chosenOrder,
      view: props.view,
      tone: props.tone,
      levels: props.levels,
      floorCounts: props.floorCounts,
      layers: props.layers,
      segment: props.segment,
      line,
      below: props.below,
      rowYs:
        rowsBetween && measured
          ? ringRows(
              dark,
              at.yPx + at.k * measured.centrePx.y,
              at.k / (measured.pixelPitchUm / 1000),
              rowsBetween.top,
              rowsBetween.foot,
            )
          : noRows,
      colours,
      onFrame,
      ground: theme === 'light' ? colours.plate : colours.gap,
      theme,
      negative,
      density: PixelRatio.get(),
      maxTaps: settling.current !== null ? 1 : hasWebGl() ? 4 : 2,
    };
    drawSheet(pen, scene);
  };
  const chosen = dark.find((r) => r.order === props.chosenOrder);
  const choiceText = chosen ? `Dark ring ${chosen.order}, ${chosen.radiusMm.toFixed(4)} mm` : 'No ring chosen';
  const chartTop = layout.tags?.top ?? layout.height;
  return (
    <View ref={host} style={{ width: layout.width, height: layout.height, overflow: 'hidden' }}>
      <PictureSurface ref={surface} draw={draw} />
      <View
        ref={frameRegion}
        role={movable ? 'group' : 'img'}
        aria-label={movable ? `${props.label} Plus and minus magnify, arrows move, 0 fits.` : props.label}
        {...(movable ? { ...webProps({ tabIndex: 0 }), ...frameKeys } : {})}
        style={{ position: 'absolute', left: 0, top: 0, width: layout.frame.width, height: layout.frame.height }}
      />
      {layout.plot && dark.length > 0 && props.onChooseRing ? (
        <View
          role="slider"
          aria-label="Dark ring chosen on the profile"
          {...webProps({
            tabIndex: 0,
            'aria-valuemin': 0,
            'aria-valuemax': dark.length,
            'aria-valuenow': chosen ? dark.indexOf(chosen) + 1 : 0,
            'aria-valuetext': choiceText,
          })}
          {...chartKeys}
          style={{
            position: 'absolute',
            left: 0,
            top: chartTop,
            width: layout.frame.width,
            height: layout.height - chartTop,
          }}
        />
      ) : null}
    </View>
  );
});
