import type { CalibratedFrame } from '../calibrate/CalibratedFrame';
import type { Rounded } from '../calibrate/rounding';
import type { FoundCentre } from '../centre/findCentre';
import { reducePlane } from '../centre/reducePlane';
import { expectedInCell, radiusOf } from '../fit/fitCells';
import type { PinholeFit } from '../fit/fitPinhole';
import { illuminationOf } from '../fit/startSizes';
import type { PinholeOptics } from '../fit/PinholeOptics';
import type { Refusal } from './Refusal';
import type { SecondPattern } from './secondPattern';
import { straightness } from './straightness';

/** Gain in chi-square below which nothing is there. */
const LEAST_GAIN = 80;
/** Share of the rings' own power that may stay unexplained. */
const MOST_UNEXPLAINED = 0.06;
/** The same within the core. */
const MOST_UNEXPLAINED_CORE = 0.02;
/** v of the first dark ring. */
const FIRST_DARK = 3.83;
/** λz/D in pixels under which neighbouring rings fall together (Nyquist: 2). */
const LEAST_FRINGE_PX = 2.3;
/** Relative uncertainty beyond which the signal is too low to be of use. */
const MOST_UNCERTAIN = 0.03;
/** (a/w)² of a beam so narrow that the hole hardly shapes it. */
const MOST_NARROW = 1.5;
const STRAIGHT = 0.5;
/** Counts. */
const COARSE_LEVEL = 0.1;
/** A second pattern stronger than this part of the first is refused. */
const STRONG_SECOND = 0.2;

const STRAIGHT_WORDS =
  'The fringes run straight across the frame, as those of a slit, a wire or an edge do, not in rings. Check which aperture stands in the beam and give its kind.';
const NOTHING_WORDS =
  'No diffraction rings were found in this frame. Check that the laser is on and reaches the aperture, that the pattern falls on the sensor, and that the exposure shows its rings.';

export interface PinholeJudgement {
  second: SecondPattern | null;
  /** Share of the rings' power that the model leaves unexplained; about 0 for a clean frame. */
  unexplained: number;
  /** Largest v of a pixel that was used. */
  largestV: number;
}

/** Decides whether a fitted frame is a pinhole's pattern at all. */
export function judgePinhole(
  frame: CalibratedFrame,
  optics: PinholeOptics,
  centres: FoundCentre[],
  found: PinholeFit | null,
): { refusal: Refusal } | { judgement: PinholeJudgement } {
  const straight = () => straightness(reducePlane(frame)) > STRAIGHT;
  const refuse = (reason: Refusal['reason'], message: string) => ({ refusal: { reason, message } });
  if (frame.clippedFraction > 0.7) {
    return refuse(
      'clipped',
      `${Math.round(100 * frame.clippedFraction)} % of the frame is clipped, too much to see rings. Shorten the exposure or attenuate the laser.`,
    );
  }
  if (centres.length === 0) return refuse('no-pattern', NOTHING_WORDS);
  if (found === null) {
    return straight() ? refuse('wrong-pattern', STRAIGHT_WORDS) : refuse('no-pattern', NOTHING_WORDS);
  }
  const { fit, cells, evaluated, fringePx } = found;
  const perCell = Math.max(1, fit.cellChiSquare / fit.cellCount);
  const gain = (found.flatChiSquare - fit.cellChiSquare) / perCell;
  if (gain < LEAST_GAIN) return refuse('no-pattern', NOTHING_WORDS);

  const { noise } = found;
  const expected: Rounded = { offset: 0, slope: 1, variance: 1 };
  const { values } = fit;
  // Where rounding rules, no level is known better than this.
  const coarse = noise.rounding === undefined ? 0 : COARSE_LEVEL ** 2;
  let rings = 0;
  let ringsLeft = 0;
  let core = 0;
  let coreLeft = 0;
  let largestV = 0;
  for (let c = 0; c < cells.length; c++) {
    const v = (Math.PI * Math.hypot(cells.x[c], cells.y[c])) / fringePx;
    largestV = Math.max(largestV, v);
    expectedInCell(noise, evaluated.model[c], evaluated.blur[c], expected);
    const variance = expected.variance / cells.pixels[c] + coarse;
    const signal = evaluated.model[c] - values.background - values.slopeX * cells.x[c] - values.slopeY * cells.y[c];
    const left = (cells.mean[c] - evaluated.model[c] - expected.offset) ** 2 / variance - 1;
    if (v > 2.6) {
      rings += signal ** 2 / variance;
      ringsLeft += left;
    } else {
      core += signal ** 2 / variance;
      coreLeft += left;
    }
  }
  const unexplained = rings > 0 ? Math.max(0, ringsLeft) / rings : 0;
  const coreUnexplained = core > 0 ? Math.max(0, coreLeft) / core : 0;
  const believed = illuminationOf(optics, radiusOf(values));
  const odd = values.illumination < -0.4 || (values.illumination > MOST_NARROW && values.illumination > 2 * believed);
  // Unexplained light must be more than noise: several times the scatter of its own sum.
  const certain = ringsLeft > 6 * Math.sqrt(2 * cells.length);
  const bad = (unexplained > MOST_UNEXPLAINED && certain) || coreUnexplained > MOST_UNEXPLAINED_CORE || odd;
  const { second } = found;
  if (bad) {
    if (second !== null && second.explained > 0.5 && second.relative > 0.08) {
      return refuse(
        'two-patterns',
        `A second pattern of about ${Math.round(100 * second.relative)} % of the first lies ${Math.round(Math.hypot(second.x - values.x, second.y - values.y))} pixels beside it; a size from both would be wrong. Find the reflection (window, filter, second hole) and remove it, or tilt it off the sensor.`,
      );
    }
    if (straight()) return refuse('wrong-pattern', STRAIGHT_WORDS);
    if (centres[0].score < 0.7)
      return refuse('no-pattern', `${NOTHING_WORDS} What is there is light without rings, such as speckle.`);
    return refuse(
      'wrong-pattern',
      'There is a round or symmetric spot, but its light does not fall off in the rings of a round hole. It may be the bare beam, or a hole of another shape. Check which aperture stands in the beam.',
    );
  }
  if (second !== null && second.explained > 0.5 && second.relative > STRONG_SECOND) {
    return refuse(
      'two-patterns',
      `A second pattern of about ${Math.round(100 * second.relative)} % of the first lies in the frame. Remove the reflection or block the second hole.`,
    );
  }
  if (fringePx < LEAST_FRINGE_PX) {
    return refuse(
      'under-sampled',
      `Neighbouring rings lie ${fringePx.toFixed(1)} pixels apart, too close for the sensor to tell them. Move the camera further away or use smaller pixels.`,
    );
  }
  if (largestV < FIRST_DARK + 0.4) {
    return refuse(
      'too-few-rings',
      'Not even the first dark ring lies whole on the sensor, so the size cannot be told from the brightness. Move the camera nearer or use a larger sensor.',
    );
  }
  const relative = Math.sqrt(fit.covariance.get(0, 0));
  if (!(relative < MOST_UNCERTAIN)) {
    return refuse(
      'low-signal',
      `The pattern stands so little out of the noise that its size would be uncertain by ${(100 * relative).toFixed(0)} %. Lengthen the exposure, or average more frames.`,
    );
  }
  return { judgement: { second, unexplained, largestV } };
}
