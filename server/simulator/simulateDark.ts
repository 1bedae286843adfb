import { expose } from './SimulatedSensor';
import type { SimulatedSensor } from './SimulatedSensor';

/** A frame with the light off: counts, row-major. The same sensor object keeps its hot pixels from frame to frame. */
export function simulateDark({ sensor, seed }: { sensor: SimulatedSensor; seed: number }): Uint16Array {
  return expose(sensor, null, seed).counts;
}
