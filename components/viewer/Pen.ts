import {
  ClipOp,
  PaintStyle,
  Skia,
  StrokeCap,
  StrokeJoin,
  type SkCanvas,
  type SkColor,
  type SkFont,
  type SkPaint,
  type SkPathEffect,
  type SkShader,
} from '@shopify/react-native-skia';
import type { Box, Point } from './place';
import type { Typefaces } from './typefaces';

export type Anchor = 'start' | 'middle' | 'end';
export interface TextStyle {
  color: string;
  size?: number;
  bold?: boolean;
  anchor?: Anchor;
}
/** Dots of a pixel, gaps of `gap` px. */
export type Dash = 'solid' | 'dots' | 'sparse-dots' | 'dashes';

const dashes: Record<Exclude<Dash, 'solid'>, [number, number]> = {
  dots: [1, 3],
  'sparse-dots': [1, 4],
  dashes: [3, 3],
};

/**
 * Draws on a Skia canvas in the manner of this product: hairlines, hatches, labels. Paints, fonts and dash patterns are
 * made once and used for every redraw; `dispose` gives them back.
 */
export class Pen {
  private readonly filling: SkPaint;
  private readonly stroking: SkPaint;
  private readonly fonts = new Map<string, SkFont>();
  private readonly colours = new Map<string, SkColor>();
  private readonly effects = new Map<Dash, SkPathEffect>();
  private readonly widths = new Map<string, number>();
  private target: SkCanvas | null = null;

  constructor(private readonly typefaces: Typefaces | null) {
    this.filling = Skia.Paint();
    this.filling.setAntiAlias(true);
    this.stroking = Skia.Paint();
    this.stroking.setAntiAlias(true);
    this.stroking.setStyle(PaintStyle.Stroke);
    this.stroking.setStrokeCap(StrokeCap.Butt);
    this.stroking.setStrokeJoin(StrokeJoin.Miter);
  }

  /** Draws on `canvas` until it is given another. */
  on(canvas: SkCanvas): this {
    this.target = canvas;
    return this;
  }

  get canvas(): SkCanvas {
    if (!this.target) throw new Error('The pen has no canvas.');
    return this.target;
  }

  private colour(name: string): SkColor {
    let colour = this.colours.get(name);
    if (!colour) {
      colour = Skia.Color(name);
      this.colours.set(name, colour);
    }
    return colour;
  }

  private fill(color: string, alpha = 1): SkPaint {
    this.filling.setColor(this.colour(color));
    this.filling.setAlphaf(alpha);
    return this.filling;
  }

  private stroke(color: string, width: number, dash: Dash = 'solid', alpha = 1): SkPaint {
    this.stroking.setColor(this.colour(color));
    this.stroking.setAlphaf(alpha);
    this.stroking.setStrokeWidth(width);
    this.stroking.setPathEffect(dash === 'solid' ? null : this.effect(dash));
    return this.stroking;
  }

  private effect(dash: Exclude<Dash, 'solid'>): SkPathEffect {
    let effect = this.effects.get(dash);
    if (!effect) {
      effect = Skia.PathEffect.MakeDash(dashes[dash], 0);
      this.effects.set(dash, effect);
    }
    return effect;
  }

  rect(box: Box, color: string, alpha = 1): void {
    this.canvas.drawRect(Skia.XYWHRect(box.left, box.top, box.width, box.height), this.fill(color, alpha));
  }

  outline(box: Box, color: string, width = 1, dash: Dash = 'solid'): void {
    this.canvas.drawRect(Skia.XYWHRect(box.left, box.top, box.width, box.height), this.stroke(color, width, dash));
  }

  line(
    x0: number,
    y0: number,
    x1: number,
    y1: number,
    color: string,
    width = 1,
    dash: Dash = 'solid',
    alpha = 1,
  ): void {
    this.canvas.drawLine(x0, y0, x1, y1, this.stroke(color, width, dash, alpha));
  }

  ring(centre: Point, radius: number, color: string, width = 1, dash: Dash = 'solid'): void {
    this.canvas.drawCircle(centre.x, centre.y, radius, this.stroke(color, width, dash));
  }

  dot(x: number, y: number, radius: number, color: string): void {
    this.canvas.drawCircle(x, y, radius, this.fill(color));
  }

  /** A stroked line through points; breaks where a coordinate is not a number. */
  polyline(xs: ArrayLike<number>, ys: ArrayLike<number>, color: string, width: number): void {
    const builder = Skia.PathBuilder.Make();
    let open = false;
    for (let i = 0; i < xs.length; i += 1) {
      const x = xs[i]!;
      const y = ys[i]!;
      if (!Number.isFinite(x) || !Number.isFinite(y)) {
        open = false;
      } else if (open) {
        builder.lineTo(x, y);
      } else {
        builder.moveTo(x, y);
        open = true;
      }
    }
    const path = builder.detach();
    this.canvas.drawPath(path, this.stroke(color, width));
    path.dispose();
    builder.dispose();
  }

  /** Fills between an upper and a lower line over the same x. */
  band(xs: ArrayLike<number>, upper: ArrayLike<number>, lower: ArrayLike<number>, color: string, alpha = 1): void {
    if (xs.length < 2) return;
    const builder = Skia.PathBuilder.Make();
    builder.moveTo(xs[0]!, upper[0]!);
    for (let i = 1; i < xs.length; i += 1) builder.lineTo(xs[i]!, upper[i]!);
    for (let i = xs.length - 1; i >= 0; i -= 1) builder.lineTo(xs[i]!, lower[i]!);
    builder.close();
    const path = builder.detach();
    this.canvas.drawPath(path, this.fill(color, alpha));
    path.dispose();
    builder.dispose();
  }

  /** A caret that says: the point lies beyond, this way. */
  caret(x: number, y: number, up: boolean, color: string): void {
    const s = up ? 1 : -1;
    this.polyline([x - 3, x, x + 3], [y + 2.5 * s, y - 2.5 * s, y + 2.5 * s], color, 1.6);
  }

  /** Diagonal lines in a box, `gap` px apart, rising to the right. */
  hatch(box: Box, color: string, gap = 5, width = 1): void {
    if (box.width <= 0 || box.height <= 0) return;
    this.clipped(box, () => {
      const builder = Skia.PathBuilder.Make();
      const step = gap * Math.SQRT2;
      const y1 = bottomOf(box);
      const first = Math.floor((box.left + box.top) / step) * step;
      for (let s = first; s < box.left + box.width + y1; s += step) {
        builder.moveTo(s - y1, y1);
        builder.lineTo(s - box.top, box.top);
      }
      const path = builder.detach();
      this.canvas.drawPath(path, this.stroke(color, width));
      path.dispose();
      builder.dispose();
    });
  }

  clipped(box: Box, draw: () => void): void {
    this.canvas.save();
    this.canvas.clipRect(Skia.XYWHRect(box.left, box.top, box.width, box.height), ClipOp.Intersect, true);
    draw();
    this.canvas.restore();
  }

  shaded(box: Box, shader: SkShader): void {
    this.filling.setAlphaf(1);
    this.filling.setShader(shader);
    this.filling.setAntiAlias(false);
    this.canvas.drawRect(Skia.XYWHRect(box.left, box.top, box.width, box.height), this.filling);
    this.filling.setAntiAlias(true);
    this.filling.setShader(null);
  }

  private font(bold: boolean, size: number): SkFont | null {
    if (!this.typefaces) return null;
    const key = `${bold ? 'b' : 'r'}${size}`;
    let font = this.fonts.get(key);
    if (!font) {
      font = Skia.Font(bold ? this.typefaces.bold : this.typefaces.regular, size);
      font.setSubpixel(true);
      this.fonts.set(key, font);
    }
    return font;
  }

  /** Width of a text in px. */
  textWidth(text: string, size = 12, bold = false): number {
    const font = this.font(bold, size);
    if (!font) return 0;
    const key = `${bold ? 'b' : 'r'}${size} ${text}`;
    let width = this.widths.get(key);
    if (width === undefined) {
      if (this.widths.size > 500) this.widths.clear();
      width = font.getTextWidth(text);
      this.widths.set(key, width);
    }
    return width;
  }

  /** Text on the base line y. Nothing is drawn until the face is there. */
  text(text: string, x: number, y: number, { color, size = 12, bold = false, anchor = 'start' }: TextStyle): void {
    const font = this.font(bold, size);
    if (!font) return;
    const width = anchor === 'start' ? 0 : this.textWidth(text, size, bold);
    this.canvas.drawText(text, x - (anchor === 'middle' ? width / 2 : width), y, this.fill(color), font);
  }

  dispose(): void {
    this.target = null;
    this.filling.dispose();
    this.stroking.dispose();
    for (const font of this.fonts.values()) font.dispose();
    for (const effect of this.effects.values()) effect.dispose();
    this.fonts.clear();
    this.effects.clear();
  }
}

const bottomOf = (box: Box): number => box.top + box.height;
