import { Skia, type SkRuntimeEffect } from '@shopify/react-native-skia';

/**
 * Draws one tile of a frame. Counts come packed in two bytes and are put together here, so all 16 bits take part in
 * levels and tone; interpolation and averaging are done on whole counts, never on the packed bytes.
 *
 * mapping 0: the frame as it lies; 1: unwrapped, radius across and angle down; 2: unwrapped, angle across and radius up.
 * show 0: counts; 1: misfit.
 */
const SOURCE = `
uniform shader texels;
uniform shader colourMap;
uniform float2 tileOrigin;
uniform float2 tileSize;
uniform float4 core;
uniform float4 pane;
uniform float3 place;
uniform float2 centre;
uniform float2 frameSize;
uniform float mapping;
uniform float show;
uniform float2 levels;
uniform float tone;
uniform float floorCounts;
uniform float white;
uniform float masks;
uniform float density;
uniform float maxTaps;
uniform float3 hatchInk;
uniform float3 maskInk;
uniform float3 above;
uniform float3 below;
uniform float3 ground;

const float TAU = 6.283185307179586;

float2 counts(float2 pixel) {
  float2 q = clamp(pixel - tileOrigin, float2(0.0), tileSize - 1.0);
  half4 c = texels.eval(q + 0.5);
  return float2(
    floor(float(c.r) * 255.0 + 0.5) * 256.0 + floor(float(c.g) * 255.0 + 0.5),
    floor(float(c.b) * 255.0 + 0.5));
}

float2 framePoint(float2 p) {
  if (mapping < 0.5) return (p - place.xy) / place.z;
  float r;
  float a;
  if (mapping < 1.5) {
    r = (p.x - place.x) / place.z - centre.x;
    a = TAU * (p.y - pane.y) / pane.w;
  } else {
    r = centre.y - (p.y - place.y) / place.z;
    a = TAU * (p.x - pane.x) / pane.z;
  }
  if (r < 0.0) return float2(-1e6);
  return centre + r * float2(cos(a), -sin(a));
}

float2 across(float2 f) {
  if (mapping < 0.5) return float2(1.0 / place.z, 0.0);
  float2 d = f - centre;
  float r = max(length(d), 1e-3);
  if (mapping < 1.5) return d / (r * place.z);
  return float2(d.y, -d.x) * (TAU / pane.z);
}

float2 down(float2 f) {
  if (mapping < 0.5) return float2(0.0, 1.0 / place.z);
  float2 d = f - centre;
  float r = max(length(d), 1e-3);
  if (mapping < 1.5) return float2(d.y, -d.x) * (TAU / pane.w);
  return -d / (r * place.z);
}

half4 main(float2 p) {
  float2 f = framePoint(p);
  float2 nearest = floor(f + 0.5);
  if (f.x < -0.5 || f.y < -0.5 || f.x >= frameSize.x - 0.5 || f.y >= frameSize.y - 0.5) return half4(0.0);
  if (nearest.x < core.x || nearest.y < core.y || nearest.x >= core.z || nearest.y >= core.w) return half4(0.0);

  float2 ex = across(f) / density;
  float2 ey = down(f) / density;
  float nx = clamp(ceil(length(ex)), 1.0, maxTaps);
  float ny = clamp(ceil(length(ey)), 1.0, maxTaps);
  float sum = 0.0;
  float misfitSum = 0.0;
  float good = 0.0;
  float full = 0.0;
  if (nx * ny < 1.5) {
    float2 base = floor(f);
    float2 t = f - base;
    float2 c00 = counts(base);
    float2 c10 = counts(base + float2(1.0, 0.0));
    float2 c01 = counts(base + float2(0.0, 1.0));
    float2 c11 = counts(base + float2(1.0, 1.0));
    sum = mix(mix(c00.x, c10.x, t.x), mix(c01.x, c11.x, t.x), t.y);
    float2 own = counts(nearest);
    if (place.z * density > 6.0) sum = own.x;
    if (own.x >= white) full = 1.0;
    if (own.y > 0.5) { good = 1.0; misfitSum = own.y - 128.0; }
  } else {
    for (int j = 0; j < 4; j++) {
      if (float(j) >= ny) break;
      for (int i = 0; i < 4; i++) {
        if (float(i) >= nx) break;
        float2 at = f + ex * ((float(i) + 0.5) / nx - 0.5) + ey * ((float(j) + 0.5) / ny - 0.5);
        float2 c = counts(floor(at + 0.5));
        sum += c.x;
        if (c.x >= white) full += 1.0;
        if (c.y > 0.5) { good += 1.0; misfitSum += c.y - 128.0; }
      }
    }
    sum /= nx * ny;
  }

  half3 colour;
  if (show > 0.5) {
    float m = good > 0.0 ? misfitSum / (good * 10.0) : 0.0;
    float strength = pow(clamp(abs(m) / 4.5, 0.0, 1.0), 1.2);
    colour = half3(mix(ground, m > 0.0 ? above : below, strength));
  } else {
    float range = levels.y - levels.x;
    float lift = clamp(sum - levels.x, 0.0, range);
    float t = lift / range;
    if (tone > 1.5) t = log(1.0 + lift / floorCounts) / log(1.0 + range / floorCounts);
    else if (tone > 0.5) t = sqrt(t);
    colour = colourMap.eval(float2(t * 255.0 + 0.5, 0.5)).rgb;
    if (full > 0.5 * nx * ny && mod(p.x + p.y, 6.0) < 1.3) colour = half3(hatchInk);
  }
  if (masks > 0.5 && good < 0.5 && mod(p.x - p.y, 5.0) < 1.2) colour = half3(maskInk);
  return half4(colour, 1.0);
}`;

let effect: SkRuntimeEffect | undefined;

/** The compiled shader; made once. @throws Error when this device's Skia cannot compile it. */
export function frameEffect(): SkRuntimeEffect {
  effect ??= Skia.RuntimeEffect.Make(SOURCE) ?? undefined;
  if (!effect) throw new Error('The frame shader could not be compiled.');
  return effect;
}

type Colour3 = readonly [number, number, number];
/** Values of the shader's uniforms, in its own order. Counts as they are stored, distances as the source says. */
export interface FrameUniforms {
  tileOrigin: readonly [number, number];
  tileSize: readonly [number, number];
  core: readonly [number, number, number, number];
  /** left, top, width, height on the sheet, px. */
  pane: readonly [number, number, number, number];
  /** x, y of frame pixel 0, 0 on the sheet and sheet px for one frame pixel. */
  place: Colour3;
  centre: readonly [number, number];
  frameSize: readonly [number, number];
  mapping: 0 | 1 | 2;
  show: 0 | 1;
  levels: readonly [number, number];
  tone: 0 | 1 | 2;
  floorCounts: number;
  white: number;
  masks: 0 | 1;
  density: number;
  maxTaps: number;
  hatchInk: Colour3;
  maskInk: Colour3;
  above: Colour3;
  below: Colour3;
  ground: Colour3;
}

export function packUniforms(u: FrameUniforms): number[] {
  return [
    ...u.tileOrigin,
    ...u.tileSize,
    ...u.core,
    ...u.pane,
    ...u.place,
    ...u.centre,
    ...u.frameSize,
    u.mapping,
    u.show,
    ...u.levels,
    u.tone,
    u.floorCounts,
    u.white,
    u.masks,
    u.density,
    u.maxTaps,
    ...u.hatchInk,
    ...u.maskInk,
    ...u.above,
    ...u.below,
    ...u.ground,
  ];
}
