import { refusalName } from '@/components/measurement/words/refusalWords';
import { stateWord } from '@/components/measurement/words/stageWords';
import type { CaptureFrame } from '@/shared/contracts/captures';
import type { MeasurementDetail } from '@/shared/contracts/measurements';
import type { NoRings } from './ViewerProps';

/** Why no rings are drawn over a frame; null where there are some. */
export function noRings(frame: CaptureFrame, measurement: MeasurementDetail | null): NoRings | null {
  if (frame.state === 'unusable') {
    return { title: 'This file cannot be used', message: frame.problem ?? 'It could not be decoded. Send it again.' };
  }
  if (frame.kind !== 'light') {
    const word = frame.kind === 'dark' ? 'A dark frame' : 'A flat frame';
    const use =
      frame.kind === 'dark' ? 'It is taken off the frames of its capture.' : 'It evens out the pixels of its capture.';
    return { title: `${word} has no rings`, message: use };
  }
  if (!measurement)
    return { title: 'Not measured yet', message: 'Measure the capture: rings, profile and size then stand here.' };
  if (measurement.state === 'waiting' || measurement.state === 'measuring') {
    return {
      title: 'On its way',
      message: `This frame ${measurement.state === 'measuring' ? 'is being measured: ' : ''}${stateWord(measurement.state, measurement.stage)}.`,
    };
  }
  if (measurement.state === 'refused' || measurement.state === 'failed') {
    return {
      title: refusalName(measurement.reason),
      message: measurement.message ?? 'No reason was given. Measure it again.',
    };
  }
  if (measurement.result?.status === 'measured' && measurement.result.centrePx === null) {
    return { title: 'No centre', message: 'This pattern has no centre, so there are no rings to show.' };
  }
  return null;
}
