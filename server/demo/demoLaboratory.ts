import type { z } from 'zod';
import type { cameraBody, laserBody, RevisionBody } from '../../shared/contracts/benches';
import type { apertureBody } from '../../shared/contracts/lots';
import type { SimulatedSensor } from '../simulator/SimulatedSensor';

/** An invented laboratory: nobody and nothing here exists. */
export const laboratoryName = 'Osier Bank Laboratory';
export const clientCompany = { name: 'Lanternhill Instruments', address: '4 Weir Lane, Lanternhill' };

interface DemoBench {
  name: string;
  laser: z.input<typeof laserBody>;
  camera: z.input<typeof cameraBody>;
  revision: Pick<RevisionBody, 'distanceMm' | 'distanceUncertaintyMm' | 'note'>;
  /** The camera as the simulator makes it. */
  sensor: SimulatedSensor;
}

export const redBench: DemoBench = {
  name: 'Bench 1',
  laser: {
    name: 'Red gas laser',
    serial: 'RG-114',
    wavelengthNm: 632.8,
    wavelengthUncertaintyNm: 0.01,
    laserClass: '2',
    powerMw: 0.8,
    note: 'Warm for half an hour before use.',
  },
  camera: {
    name: 'Sensor K-12',
    serial: 'K-12-0231',
    pixelPitchUm: 5.2,
    pixelPitchUncertaintyUm: 0.001,
    widthPx: 1280,
    heightPx: 1024,
    bitDepth: 12,
    electronsPerCount: 4,
    readNoiseElectrons: 10,
    blackCount: 64,
    whiteCount: 4095,
    note: 'Cover glass taken off.',
  },
  revision: { distanceMm: 500, distanceUncertaintyMm: 0.25, note: 'Distance set with the gauge rod.' },
  sensor: {
    widthPx: 1280,
    heightPx: 1024,
    pixelPitchUm: 5.2,
    bitDepth: 12,
    electronsPerCount: 4,
    readNoiseElectrons: 10,
    blackCount: 64,
    darkElectrons: 24,
    darkUnevennessElectrons: 6,
    hotFraction: 1e-4,
    hotElectrons: 900,
    responseUnevenness: 0.005,
    seed: 4112,
  },
};

export const greenBench: DemoBench = {
  name: 'Bench 2',
  laser: {
    name: 'Green laser',
    serial: 'GN-027',
    wavelengthNm: 532,
    wavelengthUncertaintyNm: 0.05,
    laserClass: '3R',
    powerMw: 3.5,
    note: '',
  },
  camera: {
    name: 'Sensor M-12',
    serial: 'M-12-0077',
    pixelPitchUm: 3.6,
    pixelPitchUncertaintyUm: 0.001,
    widthPx: 1224,
    heightPx: 1024,
    bitDepth: 12,
    electronsPerCount: 2.5,
    readNoiseElectrons: 6,
    blackCount: 80,
    whiteCount: 4095,
    coverGlassMm: 0.5,
    coverGlassIndex: 1.52,
    note: '',
  },
  revision: { distanceMm: 80, distanceUncertaintyMm: 0.04, note: '' },
  sensor: {
    widthPx: 1224,
    heightPx: 1024,
    pixelPitchUm: 3.6,
    bitDepth: 12,
    electronsPerCount: 2.5,
    readNoiseElectrons: 6,
    blackCount: 80,
    darkElectrons: 15,
    darkUnevennessElectrons: 4,
    hotFraction: 1e-4,
    hotElectrons: 700,
    responseUnevenness: 0.005,
    coverGlassMm: 0.5,
    coverGlassIndex: 1.52,
    seed: 7703,
  },
};

/** One light: how bright its pattern is, in parts of what the sensor can hold; 0: the laser is off. */
interface DemoLight {
  exposure: number;
}

interface DemoCapture {
  bench: DemoBench;
  serial: string;
  /** What the simulator makes; the laboratory has to find it out. */
  diameterUm: number;
  lights: DemoLight[];
  note?: string;
}

const pinhole = (serial: string, nominalSizeUm: number, toleranceUm: number): z.input<typeof apertureBody> => ({
  serial,
  kind: 'pinhole',
  nominalSizeUm,
  toleranceUm,
});

/** Lots with the days from now on which they are due. */
export const lots = [
  {
    number: 'L-2607',
    orderReference: 'LH 4471',
    dueInDays: 3,
    apertures: [
      pinhole('OB-200-01', 200, 2),
      pinhole('OB-200-02', 200, 2),
      pinhole('OB-250-01', 250, 1.5),
      pinhole('OB-250-02', 250, 1.5),
      pinhole('OB-300-01', 300, 2),
      pinhole('OB-300-02', 300, 2),
      pinhole('OB-400-01', 400, 3),
      pinhole('OB-400-02', 400, 3),
    ],
  },
  {
    number: 'L-2611',
    orderReference: 'LH 4490',
    dueInDays: 12,
    apertures: [pinhole('OB-100-01', 100, 1), pinhole('OB-100-02', 100, 1), pinhole('OB-100-03', 100, 1)],
  },
];

const well = { exposure: 0.8 };
export const DARKS_PER_CAPTURE = 3;
export const captures: DemoCapture[] = [
  { bench: redBench, serial: 'OB-200-01', diameterUm: 200.42, lights: [well, { exposure: 0.7 }, well] },
  {
    bench: redBench,
    serial: 'OB-250-01',
    diameterUm: 250.31,
    lights: [well, { exposure: 0.75 }, { exposure: 6 }, well],
    note: 'One exposure long, for the outer rings.',
  },
  { bench: redBench, serial: 'OB-250-02', diameterUm: 248.62, lights: [well, { exposure: 0.72 }] },
  { bench: redBench, serial: 'OB-300-01', diameterUm: 299.24, lights: [well, well] },
  { bench: redBench, serial: 'OB-300-02', diameterUm: 303.17, lights: [{ exposure: 0.66 }, well] },
  { bench: redBench, serial: 'OB-400-01', diameterUm: 400.88, lights: [well, well] },
  { bench: redBench, serial: 'OB-400-02', diameterUm: 400.1, lights: [{ exposure: 0 }] },
  { bench: greenBench, serial: 'OB-200-01', diameterUm: 200.42, lights: [well, { exposure: 0.7 }] },
];
