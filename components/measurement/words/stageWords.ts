import type { Stage } from '@/shared/contracts/measureResult';
import type { MeasurementState } from '@/shared/contracts/measurements';

const stages: Record<Stage, string> = {
  decode: 'reading the file',
  calibrate: 'taking the dark off',
  centre: 'finding the centre',
  profile: 'averaging the rings',
  fit: 'fitting the size',
};
const states: Record<MeasurementState, string> = {
  waiting: 'waits its turn',
  measuring: 'measuring',
  measured: 'measured',
  refused: 'refused',
  failed: 'failed',
};

/** What the engine is doing. */
export const stageWord = (stage: Stage): string => stages[stage];

/** Where a measurement stands, with its stage while it runs. */
export function stateWord(state: MeasurementState, stage: Stage | null): string {
  return state === 'measuring' && stage ? stages[stage] : states[state];
}
