import {
  AlphaType,
  ColorType,
  Skia,
  SkiaPictureView,
  type SkPicture,
  type SkSurface,
} from '@shopify/react-native-skia';
import { createElement, useCallback, useEffect, useImperativeHandle, useRef, useState, type Ref } from 'react';
import { PixelRatio, View } from 'react-native';
import { hasWebGl } from './hasWebGl';
import { Pen } from './Pen';
import { loadTypefaces, type Typefaces } from './typefaces';

export interface SurfaceSize {
  width: number;
  height: number;
}
export interface PictureSurfaceHandle {
  /** Draws again before the next screen refresh; many calls make one drawing. */
  invalidate(): void;
}

interface Props {
  /** Draws everything, in px of the layout. A new function draws again. */
  draw: (pen: Pen, size: SurfaceSize) => void;
  onSize?: (size: SurfaceSize) => void;
  ref?: Ref<PictureSurfaceHandle>;
}

/** What the view of the web build offers beyond its shared type. */
interface PictureView {
  setPicture(picture: SkPicture): void;
}

/**
 * One drawing surface that fills its parent. With WebGL the recorded picture is played on the graphics processor;
 * without it Skia draws the same on the main processor and the pixels are copied to a plain canvas.
 */
export function PictureSurface({ draw, onSize, ref }: Props) {
  const gpu = hasWebGl();
  const view = useRef<PictureView | null>(null);
  const shown = useRef<SkPicture | null>(null);
  const canvas = useRef<HTMLCanvasElement>(null);
  const raster = useRef<{ surface: SkSurface; width: number; height: number } | null>(null);
  const pen = useRef<Pen | null>(null);
  const request = useRef(0);
  const [size, setSize] = useState<SurfaceSize>({ width: 0, height: 0 });
  const [typefaces, setTypefaces] = useState<Typefaces | null>(null);

  const keepView = useCallback((handle: unknown) => {
    view.current = handle as PictureView | null;
  }, []);

  useEffect(() => {
    let live = true;
    loadTypefaces().then(
      (faces) => live && setTypefaces(faces),
      () => undefined,
    );
    return () => {
      live = false;
    };
  }, []);
  useEffect(() => {
    const made = new Pen(typefaces);
    pen.current = made;
    return () => {
      pen.current = null;
      made.dispose();
    };
  }, [typefaces]);

  const paint = useCallback(() => {
    request.current = 0;
    const tool = pen.current;
    if (!tool || size.width < 1 || size.height < 1) return;
    if (gpu) {
      const recorder = Skia.PictureRecorder();
      draw(tool.on(recorder.beginRecording(Skia.XYWHRect(0, 0, size.width, size.height))), size);
      const picture = recorder.finishRecordingAsPicture();
      recorder.dispose();
      view.current?.setPicture(picture);
      shown.current?.dispose();
      shown.current = picture;
      return;
    }
    const element = canvas.current;
    if (!element) return;
    const density = PixelRatio.get();
    const width = Math.round(size.width * density);
    const height = Math.round(size.height * density);
    if (raster.current?.width !== width || raster.current.height !== height) {
      raster.current?.surface.dispose();
      const surface = Skia.Surface.Make(width, height);
      raster.current = surface && { surface, width, height };
    }
    if (!raster.current) return;
    const { surface } = raster.current;
    const target = surface.getCanvas();
    target.clear(Skia.Color('transparent'));
    target.save();
    target.scale(density, density);
    draw(tool.on(target), size);
    target.restore();
    surface.flush();
    const image = surface.makeImageSnapshot();
    const pixels = image.readPixels(0, 0, {
      width,
      height,
      alphaType: AlphaType.Unpremul,
      colorType: ColorType.RGBA_8888,
    });
    image.dispose();
    if (!pixels) return;
    element.width = width;
    element.height = height;
    element.getContext('2d')?.putImageData(new ImageData(Uint8ClampedArray.from(pixels), width, height), 0, 0);
  }, [draw, gpu, size]);

  const latest = useRef(paint);
  useEffect(() => {
    latest.current = paint;
    paint();
  }, [paint, typefaces]);
  useImperativeHandle(
    ref,
    () => ({
      invalidate: () => {
        if (request.current === 0) request.current = requestAnimationFrame(() => latest.current());
      },
    }),
    [],
  );
  useEffect(
    () => () => {
      cancelAnimationFrame(request.current);
      request.current = 0;
      raster.current?.surface.dispose();
      raster.current = null;
      shown.current?.dispose();
      shown.current = null;
    },
    [],
  );

  return (
    <View
      style={{ flex: 1 }}
      onLayout={({ nativeEvent: { layout } }) => {
        const next = { width: layout.width, height: layout.height };
        setSize((now) => (now.width === next.width && now.height === next.height ? now : next));
        onSize?.(next);
      }}
    >
      {gpu ? (
        <SkiaPictureView ref={keepView} style={{ flex: 1 }} />
      ) : (
        createElement('canvas', {
          ref: canvas,
          style: { position: 'absolute', inset: 0, width: '100%', height: '100%' },
        })
      )}
    </View>
  );
}
