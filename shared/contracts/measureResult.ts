import { z } from 'zod';
import { patterns } from './measureCase';

/** The contract of `npm run measure`: what comes out. What does not exist for a case is null. */
export const noteFlags = [
  'no-darks',
  'no-flat',
  'clipped-core',
  'cropped',
  'near-field',
  'camera-rendered',
  'low-signal',
  'mosaic',
  'no-second-opinion',
] as const;
export const warningFlags = [
  'wrong-pattern',
  'second-pattern',
  'out-of-round',
  'tilted-sensor',
  'uneven-illumination',
  'stray-light',
  'fringes',
  'dust',
  'hot-pixels',
  'under-sampled',
  'motion',
  'opinions-disagree',
  'poor-fit',
] as const;
export const flags = [...noteFlags, ...warningFlags] as const;
export type Flag = (typeof flags)[number];

export const refusalReasons = [
  'no-pattern',
  'two-patterns',
  'wrong-pattern',
  'too-few-rings',
  'clipped',
  'under-sampled',
  'centre-not-found',
  'low-signal',
] as const;
export type RefusalReason = (typeof refusalReasons)[number];
export const failureReasons = ['unreadable', 'unsupported', 'too-large', 'timed-out', 'bad-case'] as const;
export type FailureReason = (typeof failureReasons)[number];

export const budgetSources = [
  'fit',
  'pixel-response',
  'illumination',
  'repeat-frames',
  'wavelength',
  'distance',
  'pixel-pitch',
  'cover-glass',
  'tilt',
  'model',
] as const;
export type BudgetSource = (typeof budgetSources)[number];
export const budgetLineSchema = z.object({
  source: z.enum(budgetSources),
  /** Contribution to the standard uncertainty of the size. */
  contributionUm: z.number(),
  /** Standard uncertainty of the input in its own unit, where it has one. */
  standardUncertainty: z.number().nullable(),
  unit: z.string().nullable(),
  /** Change of the size for one unit of the input. */
  sensitivity: z.number().nullable(),
  /** Null: infinitely many. */
  degreesOfFreedom: z.number().nullable(),
  evaluation: z.enum(['A', 'B']),
});
export type BudgetLine = z.infer<typeof budgetLineSchema>;

export const ringSchema = z.object({
  order: z.number().int().min(1),
  kind: z.enum(['dark', 'bright']),
  /** Measured on the profile, independent of the global fit. */
  radiusMm: z.number(),
  uncertaintyMm: z.number(),
  predictedMm: z.number(),
  /** The size that this ring alone gives. */
  sizeUm: z.number(),
});
export type Ring = z.infer<typeof ringSchema>;

export const stages = ['decode', 'calibrate', 'centre', 'profile', 'fit'] as const;
export type Stage = (typeof stages)[number];
export const timingsSchema = z.object({
  decode: z.number(),
  calibrate: z.number(),
  centre: z.number(),
  profile: z.number(),
  fit: z.number(),
  total: z.number(),
});

const axesSchema = z.object({ major: z.number(), minor: z.number(), angleDeg: z.number() });

export const measuredSchema = z.object({
  id: z.string(),
  status: z.literal('measured'),
  pattern: z.enum(patterns),
  model: z.string(),
  sizeUm: z.number().nullable(),
  standardUncertaintyUm: z.number().nullable(),
  fitUncertaintyUm: z.number().nullable(),
  expandedUncertaintyUm: z.number().nullable(),
  coverageFactor: z.number().nullable(),
  effectiveDegreesOfFreedom: z.number().nullable(),
  axesUm: axesSchema.nullable(),
  angleDeg: z.number().nullable(),
  fringeScaleUm: z.number().nullable(),
  fringeScaleUncertaintyUm: z.number().nullable(),
  impliedDistanceMm: z.number().nullable(),
  edgePx: z.number().nullable(),
  beamRadiusUm: axesSchema.extend({ majorUncertainty: z.number(), minorUncertainty: z.number() }).nullable(),
  secondMomentWidthUm: z.object({ major: z.number(), minor: z.number() }).nullable(),
  /** Full-frame pixels; centre of the top-left pixel is 0, 0. */
  centrePx: z.object({ x: z.number(), y: z.number() }).nullable(),
  rings: z.array(ringSchema),
  /** Size from the dark rings together, as a witness beside the whole-pattern fit. */
  ringSizeUm: z.number().nullable(),
  ringSizeUncertaintyUm: z.number().nullable(),
  secondOpinion: z.object({
    sizeUm: z.number().nullable(),
    standardUncertaintyUm: z.number().nullable(),
    reason: z.string().nullable(),
  }),
  reducedChiSquare: z.number().nullable(),
  fresnelNumber: z.number().nullable(),
  flags: z.array(z.enum(flags)),
  budget: z.array(budgetLineSchema),
  /** What the engine found out or assumed where the case said nothing. */
  assumed: z.array(z.string()),
  engine: z.string(),
  timingsMs: timingsSchema,
});
export const refusedSchema = z.object({
  id: z.string(),
  status: z.literal('refused'),
  reason: z.enum(refusalReasons),
  /** What is wrong and what to do. */
  message: z.string(),
  engine: z.string(),
  timingsMs: timingsSchema.nullable(),
});
export const failedSchema = z.object({
  id: z.string(),
  status: z.literal('failed'),
  reason: z.enum(failureReasons),
  message: z.string(),
});
export const measureResultSchema = z.discriminatedUnion('status', [measuredSchema, refusedSchema, failedSchema]);
export type Measured = z.infer<typeof measuredSchema>;
export type Refused = z.infer<typeof refusedSchema>;
export type Failed = z.infer<typeof failedSchema>;
export type MeasureResult = z.infer<typeof measureResultSchema>;

/** Radial profile about the fitted centre; arrays of equal length, one entry a bin. */
export const radialProfileSchema = z.object({
  /** Mean radius of the pixels of the bin. */
  radiusMm: z.array(z.number()),
  /** Robust azimuthal mean above black, counts. */
  meanCounts: z.array(z.number()),
  /** Standard error of the mean from the azimuthal scatter, counts. */
  standardErrorCounts: z.array(z.number()),
  pixelCount: z.array(z.number()),
  /** Fitted model averaged over the same pixels, counts. */
  modelCounts: z.array(z.number()),
});
export type RadialProfile = z.infer<typeof radialProfileSchema>;
