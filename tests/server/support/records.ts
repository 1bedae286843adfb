import type { z } from 'zod';
import type { Bench, Camera, cameraBody, Laser, laserBody } from '../../../shared/contracts/benches';
import { endpoints } from '../../../shared/contracts/endpoints';
import type { apertureBody, LotDetail } from '../../../shared/contracts/lots';
import { call } from './call';
import type { TestApp } from './startTestApp';

export const laser: z.input<typeof laserBody> = {
  name: 'HeNe 1',
  serial: 'H-1',
  wavelengthNm: 632.8,
  wavelengthUncertaintyNm: 0.01,
  laserClass: '3R',
  powerMw: 2,
};
export const camera: z.input<typeof cameraBody> = {
  name: 'Sensor 1',
  pixelPitchUm: 5.2,
  pixelPitchUncertaintyUm: 0.001,
  widthPx: 1280,
  heightPx: 1024,
  bitDepth: 12,
  blackCount: 64,
  whiteCount: 4095,
  coverGlassMm: 0.5,
  coverGlassIndex: 1.52,
};
export const pinhole = (serial: string): z.input<typeof apertureBody> => ({
  serial,
  kind: 'pinhole',
  nominalSizeUm: 200,
  toleranceUm: 2,
});

export async function addLaser(app: TestApp, token: string): Promise<Laser> {
  return (await call(app, endpoints.createLaser, { token, body: laser }).expect(201)).body as Laser;
}

export async function addBench(app: TestApp, token: string, name = 'Bench A'): Promise<Bench> {
  const { id: laserId } = await addLaser(app, token);
  const added = await call(app, endpoints.createCamera, { token, body: camera }).expect(201);
  const { id: cameraId } = added.body as Camera;
  const illumination = { kind: 'plane' } as const;
  const revision = { laserId, cameraId, distanceMm: 500, distanceUncertaintyMm: 0.25, illumination };
  return (await call(app, endpoints.createBench, { token, body: { name, revision } }).expect(201)).body as Bench;
}

export async function addClient(app: TestApp, token: string, name = 'Fine Optics'): Promise<string> {
  return ((await call(app, endpoints.createClient, { token, body: { name } }).expect(201)).body as { id: string }).id;
}

export async function addLot(
  app: TestApp,
  token: string,
  lot: { number: string; clientId: string; dueOn?: string | null; note?: string },
  serials: string[] = [],
): Promise<LotDetail> {
  const made = (await call(app, endpoints.createLot, { token, body: lot }).expect(201)).body as LotDetail;
  if (serials.length === 0) return made;
  const body = { apertures: serials.map(pinhole) };
  const params = { lotId: made.id };
  return (await call(app, endpoints.addApertures, { token, params, body }).expect(201)).body as LotDetail;
}
