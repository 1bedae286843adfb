import { z } from 'zod';
import { id, instant, notNegative, note, positive, shortText } from './common';
import { endpoint } from './endpoint';
import { MANAGER, STAFF } from './roles';

/** Hazard classes of IEC 60825-1, as printed on the laser's label. */
export const laserClasses = ['1', '1M', '2', '2M', '3R', '3B', '4'] as const;

export const laserBody = z.object({
  name: shortText('a name for the laser'),
  serial: z.string().trim().max(80).default(''),
  /** Wavelength in air. */
  wavelengthNm: positive('The wavelength', 'nm', 2000).min(200, 'The wavelength must be at least 200 nm.'),
  /** Standard uncertainty (k = 1). */
  wavelengthUncertaintyNm: notNegative('The uncertainty of the wavelength', 'nm', 50),
  laserClass: z.enum(laserClasses, 'Choose the class printed on the label.'),
  powerMw: positive('The power', 'mW', 100_000).nullable().default(null),
  note: note.default(''),
});
export const laserSchema = laserBody.extend({ id, createdAt: instant });

export const cameraBody = z
  .object({
    name: shortText('a name for the camera'),
    serial: z.string().trim().max(80).default(''),
    pixelPitchUm: positive('The pixel pitch', 'µm', 100),
    /** Standard uncertainty (k = 1). */
    pixelPitchUncertaintyUm: notNegative('The uncertainty of the pixel pitch', 'µm', 5),
    widthPx: z
      .number({ error: 'Enter the width in pixels.' })
      .int('Whole pixels only.')
      .min(16, 'At least 16 pixels.')
      .max(20_000, 'At most 20 000 pixels.'),
    heightPx: z
      .number({ error: 'Enter the height in pixels.' })
      .int('Whole pixels only.')
      .min(16, 'At least 16 pixels.')
      .max(20_000, 'At most 20 000 pixels.'),
    bitDepth: z
      .number({ error: 'Enter the significant bits.' })
      .int('Whole bits only.')
      .min(6, 'At least 6 bits.')
      .max(16, 'At most 16 bits.'),
    electronsPerCount: positive('The gain', 'electrons per count', 10_000).nullable().default(null),
    readNoiseElectrons: notNegative('The read noise', 'electrons', 10_000).nullable().default(null),
    blackCount: notNegative('The black level', 'counts', 65_535).nullable().default(null),
    whiteCount: positive('The white level', 'counts', 65_535).nullable().default(null),
    coverGlassMm: notNegative('The thickness of the cover glass', 'mm', 20).nullable().default(null),
    coverGlassIndex: z
      .number({ error: 'Enter the refractive index.' })
      .min(1, 'A refractive index is at least 1.')
      .max(3, 'A refractive index is at most 3.')
      .nullable()
      .default(null),
    note: note.default(''),
  })
  .refine((c) => c.blackCount === null || c.whiteCount === null || c.whiteCount > c.blackCount, {
    path: ['whiteCount'],
    error: 'The white level must be above the black level.',
  })
  .refine((c) => (c.coverGlassMm ?? 0) === 0 || c.coverGlassIndex !== null, {
    path: ['coverGlassIndex'],
    error: 'Enter the refractive index of the cover glass, about 1.52 for common glass.',
  });
export const cameraSchema = cameraBody.safeExtend({ id, createdAt: instant });

export const illuminationSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('plane') }),
  z.object({ kind: z.literal('diverging'), sourceDistanceMm: positive('The distance of the source', 'mm', 1e6) }),
  z.object({ kind: z.literal('gaussian'), beamRadiusUm: positive('The beam radius', 'µm', 1e6) }),
]);
export type Illumination = z.infer<typeof illuminationSchema>;

export const revisionBody = z.object({
  laserId: z.uuid('Choose the laser.'),
  cameraId: z.uuid('Choose the camera.'),
  /** Aperture to sensitive plane; cover glass is added from the camera. */
  distanceMm: positive('The distance', 'mm', 100_000),
  /** Standard uncertainty (k = 1). */
  distanceUncertaintyMm: notNegative('The uncertainty of the distance', 'mm', 1000),
  illumination: illuminationSchema,
  note: note.default(''),
});
export const benchBody = z.object({ name: shortText('a name for the bench'), revision: revisionBody });
export const revisionSchema = revisionBody.extend({
  id,
  revision: z.number().int(),
  createdAt: instant,
  createdBy: z.string(),
  laser: laserSchema,
  camera: cameraSchema,
});
export const benchSchema = z.object({ id, name: z.string(), createdAt: instant, current: revisionSchema });
export const benchDetailSchema = benchSchema.extend({ revisions: z.array(revisionSchema) });

export type LaserBody = z.output<typeof laserBody>;
export type Laser = z.infer<typeof laserSchema>;
export type CameraBody = z.output<typeof cameraBody>;
export type Camera = z.infer<typeof cameraSchema>;
export type RevisionBody = z.output<typeof revisionBody>;
export type BenchRevision = z.infer<typeof revisionSchema>;
export type BenchBody = z.output<typeof benchBody>;
export type Bench = z.infer<typeof benchSchema>;
export type BenchDetail = z.infer<typeof benchDetailSchema>;

const laserParams = z.object({ laserId: id });
const cameraParams = z.object({ cameraId: id });
const benchParams = z.object({ benchId: id });

export const benchEndpoints = {
  lasers: endpoint({ method: 'get', path: '/lasers', summary: 'Lasers', access: STAFF, answer: z.array(laserSchema) }),
  createLaser: endpoint({
    method: 'post',
    path: '/lasers',
    summary: 'Add a laser',
    access: MANAGER,
    body: laserBody,
    answer: laserSchema,
  }),
  updateLaser: endpoint({
    method: 'put',
    path: '/lasers/:laserId',
    summary: 'Change a laser; measurements keep the values they used',
    access: MANAGER,
    params: laserParams,
    body: laserBody,
    answer: laserSchema,
  }),
  cameras: endpoint({
    method: 'get',
    path: '/cameras',
    summary: 'Cameras',
    access: STAFF,
    answer: z.array(cameraSchema),
  }),
  createCamera: endpoint({
    method: 'post',
    path: '/cameras',
    summary: 'Add a camera',
    access: MANAGER,
    body: cameraBody,
    answer: cameraSchema,
  }),
  updateCamera: endpoint({
    method: 'put',
    path: '/cameras/:cameraId',
    summary: 'Change a camera; measurements keep the values they used',
    access: MANAGER,
    params: cameraParams,
    body: cameraBody,
    answer: cameraSchema,
  }),
  benches: endpoint({
    method: 'get',
    path: '/benches',
    summary: 'Benches with their current revision',
    access: STAFF,
    answer: z.array(benchSchema),
  }),
  bench: endpoint({
    method: 'get',
    path: '/benches/:benchId',
    summary: 'A bench with all its revisions, newest first',
    access: STAFF,
    params: benchParams,
    answer: benchDetailSchema,
  }),
  createBench: endpoint({
    method: 'post',
    path: '/benches',
    summary: 'Add a bench with its first revision',
    access: MANAGER,
    body: benchBody,
    answer: benchDetailSchema,
  }),
  reviseBench: endpoint({
    method: 'post',
    path: '/benches/:benchId/revisions',
    summary: 'Revise a bench; captures already begun keep theirs',
    access: MANAGER,
    params: benchParams,
    body: revisionBody,
    answer: benchDetailSchema,
  }),
};
