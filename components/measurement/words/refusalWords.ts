import type { FailureReason, RefusalReason } from '@/shared/contracts/measureResult';

export interface RefusalWords {
  name: string;
  /** Why no size is given, where the engine's own message is missing. */
  why: string;
  /** What to do, in order. */
  steps: readonly string[];
}

const words: Record<RefusalReason | FailureReason, RefusalWords> = {
  'no-pattern': {
    name: 'No pattern',
    why: 'No diffraction pattern stands out of the noise. No size is given.',
    steps: [
      'Look whether the laser is on, the shutter open and the beam on the aperture.',
      'Look whether the sensor faces the aperture and nothing stands between.',
      'Take a frame with a longer exposure.',
    ],
  },
  'two-patterns': {
    name: 'Two patterns',
    why: 'A second pattern lies over the first. No size is given: it would be wrong by an unknown amount.',
    steps: [
      'Close the shutter, then tilt the cover glass. If the second pattern moves, it is a reflection.',
      'Block stray light, then take the frames again.',
      'If it stays, look at the foil: two holes close together.',
    ],
  },
  'wrong-pattern': {
    name: 'Another pattern',
    why: 'The pattern is not that of a round hole. No size is given.',
    steps: [
      'Look whether the right piece is in the holder.',
      'If the piece is right, look at its edge for dirt or a tear.',
      'Measure again with the pattern that the piece has.',
    ],
  },
  'too-few-rings': {
    name: 'Too few rings',
    why: 'Too few dark rings lie on the sensor. No size is given.',
    steps: [
      'Move the sensor nearer to the aperture, so that more rings fall on it.',
      'Bring the pattern to the middle of the sensor.',
      'Revise the bench with the new distance, then take the frames again.',
    ],
  },
  clipped: {
    name: 'Clipped too far',
    why: 'Too much of the frame is at full scale. No size is given.',
    steps: [
      'Shorten the exposure, or attenuate the beam before it reaches the sensor.',
      'Take the frame again. The peak should lie between half and nine tenths of full scale.',
    ],
  },
  'under-sampled': {
    name: 'Rings too fine',
    why: 'The rings are finer than the pixels can resolve. No size is given.',
    steps: [
      'Move the sensor away from the aperture, so that the rings grow.',
      'Revise the bench with the new distance, then take the frames again.',
    ],
  },
  'centre-not-found': {
    name: 'Centre not found',
    why: 'The centre of the rings cannot be told. No size is given.',
    steps: ['Bring the pattern nearer to the middle of the sensor.', 'Take the frame again.'],
  },
  'low-signal': {
    name: 'Too little light',
    why: 'The rings are lost in the noise. No size is given.',
    steps: ['Lengthen the exposure.', 'Shut out stray light, take darks, then take the frame again.'],
  },
  unreadable: {
    name: 'File cannot be read',
    why: 'The file is damaged or cut short.',
    steps: ['Copy the file from the camera again.', 'Send it once more. If it stays, take the frame again.'],
  },
  unsupported: {
    name: 'Kind of file not supported',
    why: 'This kind of file cannot be decoded.',
    steps: ['Save the frame as 16-bit TIFF or PNG, without any adjustment.', 'Send that file.'],
  },
  'too-large': {
    name: 'Frame too large',
    why: 'The frame has more pixels than can be measured.',
    steps: ['Set the camera to read a part of the sensor.', 'Take the frame again.'],
  },
  'timed-out': {
    name: 'Took too long',
    why: 'The measurement was stopped because it took too long.',
    steps: ['Measure again.', 'If it is stopped again, tell the manager and quote the number of the measurement.'],
  },
  'bad-case': {
    name: 'Frames or settings do not fit',
    why: 'The frames and settings of this measurement do not fit together.',
    steps: [
      'Take darks and flats with the camera set as for the light.',
      'Look at the bench revision and the camera, then measure again.',
    ],
  },
};

/** Name of a refusal or failure, as it stands in lists. */
export function refusalName(reason: RefusalReason | FailureReason | null): string {
  return reason === null ? 'No size' : words[reason].name;
}

/** What a refusal or failure means and what to do about it. */
export function refusalWords(reason: RefusalReason | FailureReason | null): RefusalWords {
  return reason === null ? { name: 'No size', why: 'No size is given.', steps: ['Measure again.'] } : words[reason];
}
