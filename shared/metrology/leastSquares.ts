import { levenbergMarquardt } from 'ml-levenberg-marquardt';
import { Matrix } from 'ml-matrix';
import { invertScaled, normalEquations } from './normalEquations';
import { planStep } from './planStep';

export interface LeastSquaresParameter {
  name: string;
  unit: string;
  initialValue: number;
  minValue?: number;
  maxValue?: number;
  /** Kept at its initial value. */
  fixed?: boolean;
}

export interface LeastSquaresProblem {
  parameters: readonly LeastSquaresParameter[];
  /** Measured values. */
  y: ArrayLike<number>;
  /** Standard uncertainties of the measured values, all above 0; left out when they are equal and unknown. */
  yUncertainty?: ArrayLike<number>;
  /**
   * Fills `model` with the model's value at every point and, when `jacobian` is given, that with ∂model/∂parameter:
   * row-major, points × all parameters (fixed ones included, their columns are not read).
   */
  evaluate(values: Float64Array, model: Float64Array, jacobian: Float64Array | null): void;
}

export interface LeastSquaresOptions {
  maxIterations?: number;
  /** Default: 'none' with uncertainties, 'reduced-chi-square' without. */
  uncertaintyScaling?: 'none' | 'reduced-chi-square';
  /** Asked once an iteration; true ends the fit with status 'aborted'. */
  shouldStop?: () => boolean;
}

export interface FittedParameter {
  name: string;
  unit: string;
  value: number;
  /** Null when it is fixed, at a bound, or when the fit does not determine it. */
  stdUncertainty: number | null;
  fixed: boolean;
  atBound: boolean;
  atInitialValue: boolean;
}

export interface LeastSquaresFit {
  parameters: FittedParameter[];
  /** Over all parameters in their order, zeros for fixed ones and those at a bound; null when it does not exist. */
  covariance: number[][] | null;
  chiSquare: number;
  /** Null without degrees of freedom. */
  reducedChiSquare: number | null;
  degreesOfFreedom: number;
  /** Whether the uncertainties were multiplied by the root of the reduced chi-square. */
  uncertaintyScaling: 'none' | 'reduced-chi-square';
  iterations: number;
  status: 'converged' | 'max-iterations' | 'non-finite' | 'aborted';
  message: string;
  warnings: string[];
}

export const LEAST_SQUARES_DEFAULTS = {
  maxIterations: 400,
  /** Converged when the undamped step is shorter than this part of the standard uncertainty of every parameter. */
  stepOverUncertainty: 1e-8,
  /** Converged as well when an accepted step changes no parameter by more than this part of itself. */
  relativeStep: 1e-13,
  /** First limit of a step, over the length of the scaled starting values. */
  firstRadius: 10,
} as const;

interface State {
  values: Float64Array;
  /** Whitened residuals, measured minus model. */
  residuals: Float64Array;
  /** Whitened derivatives of the model, row-major, points × free parameters. */
  jacobian: Float64Array;
  chiSquare: number;
}

/**
 * Non-linear least squares by Levenberg-Marquardt, with bounds, covariance and an honest account of how it ended.
 *
 * Each step is one iteration of ml-levenberg-marquardt on whitened data (measured and model over the uncertainty), with
 * its parameters scaled by the longest column of the Jacobian met so far. Its own weights, damping, end of iteration
 * and acceptance of worse steps are not used: the damping comes from a limit on the step that widens and narrows with the
 * success of the last one (J. J. Moré, "The Levenberg-Marquardt algorithm: implementation and theory", Lecture Notes in
 * Mathematics 630, 105 (1978), from memory), and a step that does not lower chi-square is undone. The fit has
 * converged when a full Gauss-Newton step would move the parameters by less than a hundred-millionth of their standard
 * uncertainties. The covariance is (JᵀJ)⁻¹ of the whitened Jacobian at the solution.
 *
 * @throws RangeError for lengths that differ, no free parameter, uncertainties that are not above 0, numbers that are not finite,
 *   or an initial value outside its bounds
 */
export function leastSquares(problem: LeastSquaresProblem, options: LeastSquaresOptions = {}): LeastSquaresFit {
  const { parameters, y, yUncertainty } = problem;
  const { maxIterations = LEAST_SQUARES_DEFAULTS.maxIterations } = options;
  const uncertaintyScaling = options.uncertaintyScaling ?? (yUncertainty === undefined ? 'reduced-chi-square' : 'none');
  const pointCount = y.length;
  const parameterCount = parameters.length;
  const free = parameters.flatMap((parameter, index) => (parameter.fixed === true ? [] : [index]));
  const freeCount = free.length;
  checkProblem(problem, freeCount);

  const sigma = Float64Array.from({ length: pointCount }, (_, point) => yUncertainty?.[point] ?? 1);
  const lower = free.map((index) => parameters[index]?.minValue ?? -Infinity);
  const upper = free.map((index) => parameters[index]?.maxValue ?? Infinity);
  const model = new Float64Array(pointCount);
  const fullJacobian = new Float64Array(pointCount * parameterCount);

  const fullValues = (freeValues: ArrayLike<number>) => {
    const values = Float64Array.from(parameters, ({ initialValue }) => initialValue);
    free.forEach((index, at) => (values[index] = freeValues[at]));
    return values;
  };
  const evaluateAt = (freeValues: ArrayLike<number>): State => {
    const values = fullValues(freeValues);
    problem.evaluate(values, model, fullJacobian);
    const residuals = new Float64Array(pointCount);
    const jacobian = new Float64Array(pointCount * freeCount);
    let chiSquare = 0;
    for (let point = 0; point < pointCount; point += 1) {
      const inverse = 1 / sigma[point];
      const residual = (y[point] - model[point]) * inverse;
      residuals[point] = residual;
      chiSquare += residual * residual;
      for (let at = 0; at < freeCount; at += 1)
        jacobian[point * freeCount + at] = fullJacobian[point * parameterCount + free[at]] * inverse;
    }
    return { values: Float64Array.from(freeValues), residuals, jacobian, chiSquare };
  };

  let state = evaluateAt(free.map((index) => parameters[index]?.initialValue ?? NaN));
  const finite = ({ chiSquare, jacobian }: State) =>
    Number.isFinite(chiSquare) && jacobian.every((value) => Number.isFinite(value));
  const degreesOfFreedom = pointCount - freeCount;
  const points = Array.from({ length: pointCount }, (_, point) => point);
  const scales = new Float64Array(freeCount);
  /** Largest length of a step in scaled parameters. */
  let radius: number | undefined;
  let iterations = 0;
  let status: LeastSquaresFit['status'] = finite(state) ? 'max-iterations' : 'non-finite';
  let message =
    status === 'non-finite'
      ? 'The model is not finite at the starting values.'
      : `It had not converged after ${maxIterations} iterations.`;

  const blocked = (gradient: Float64Array, at: number) =>
    (state.values[at] <= lower[at] && gradient[at] <= 0) || (state.values[at] >= upper[at] && gradient[at] >= 0);

  while (status === 'max-iterations') {
    const { matrix, gradient } = normalEquations(state.jacobian, state.residuals, freeCount);
    const open = Array.from({ length: freeCount }, (_, at) => at).filter((at) => !blocked(gradient, at));
    if (open.length === 0) {
      status = 'converged';
      message = 'Every free parameter lies at a bound.';
      break;
    }
    const inverse = invertScaled(matrix.selection(open, open));
    const perPoint = degreesOfFreedom > 0 ? state.chiSquare / degreesOfFreedom : 1;
    const variance = uncertaintyScaling === 'none' ? Math.max(1, perPoint) : perPoint;
    if (inverse !== null) {
      const pull = Matrix.columnVector(open.map((at) => gradient[at]));
      const decrement = pull.transpose().mmul(inverse).mmul(pull).get(0, 0);
      if (decrement <= variance * LEAST_SQUARES_DEFAULTS.stepOverUncertainty ** 2) {
        status = 'converged';
        message = 'A further step would move no parameter by a hundred-millionth of its uncertainty.';
        break;
      }
    }
    if (iterations >= maxIterations) break;
    if (options.shouldStop?.() === true) {
      status = 'aborted';
      message = 'It was stopped before it had converged.';
      break;
    }
    iterations += 1;

    for (let at = 0; at < freeCount; at += 1) {
      const length = Math.sqrt(matrix.get(at, at));
      scales[at] = Math.max(scales[at], length);
      if (scales[at] === 0) scales[at] = 1;
    }
    const plan = planStep(
      matrix.selection(open, open),
      open.map((at) => gradient[at]),
      open.map((at) => scales[at]),
      (radius ??= LEAST_SQUARES_DEFAULTS.firstRadius * scaledLength(open)),
    );
    const next = takeStep(state, open, plan.damping);
    const gain = next === null ? 0 : (state.chiSquare - next.chiSquare) / plan.predictedDecrease;
    if (gain > 0.75 || (gain > 0.25 && plan.full)) radius = Math.max(radius, 2 * plan.length);
    else if (gain <= 0.25) radius = (next === null ? 0.25 : 0.5) * Math.min(radius, plan.length);
    if (next !== null) {
      const moved = next.values.some(
        (value, at) => Math.abs(value - state.values[at]) > LEAST_SQUARES_DEFAULTS.relativeStep * Math.abs(value),
      );
      state = next;
      if (!moved) {
        status = 'converged';
        message = 'The last step changed no parameter within the precision of the arithmetic.';
      }
    } else if (radius <= LEAST_SQUARES_DEFAULTS.relativeStep * scaledLength(open)) {
      status = 'converged';
      message = 'No step lowers chi-square any further.';
    }
  }
  return report();

  function scaledLength(open: readonly number[]): number {
    return Math.hypot(...open.map((at) => state.values[at] * scales[at])) || 1;
  }

  /** One damped step of the open parameters, scaled; null when it does not lower chi-square. */
  function takeStep(from: State, open: readonly number[], withDamping: number): State | null {
    const scaleOf = (at: number) => scales[at];
    const start = open.map((at) => from.values[at] * scaleOf(at));
    const minValues = open.map((at) => lower[at] * scaleOf(at));
    const maxValues = open.map((at) => upper[at] * scaleOf(at));
    let trial: { scaled: number[]; state: State } | null = null;
    const stateAt = (scaled: number[]): State => {
      if (scaled.every((value, index) => value === start[index])) return from;
      if (trial === null || !trial.scaled.every((value, index) => value === scaled[index])) {
        const values = Float64Array.from(from.values);
        open.forEach((at, index) => {
          const value = scaled[index];
          if (value <= minValues[index]) values[at] = lower[at];
          else if (value >= maxValues[index]) values[at] = upper[at];
          else values[at] = value / scaleOf(at);
        });
        trial = { scaled: scaled.slice(), state: evaluateAt(values) };
      }
      return trial.state;
    };
    // What is fitted is 0 = residual: the step depends on the residuals and their derivatives alone.
    levenbergMarquardt(
      { x: points, y: new Float64Array(pointCount) },
      (scaled) => {
        const { residuals } = stateAt(scaled);
        return (point) => -residuals[point];
      },
      {
        initialValues: start,
        minValues,
        maxValues,
        damping: withDamping,
        maxIterations: 1,
        errorTolerance: 0,
        jacobianFunction: (scaled) => {
          const { jacobian } = stateAt(scaled);
          return (point) => open.map((at) => jacobian[point * freeCount + at] / scaleOf(at));
        },
      },
    );
    const reached = (trial as { state: State } | null)?.state;
    return reached !== undefined && finite(reached) && reached.chiSquare < from.chiSquare ? reached : null;
  }

  function report(): LeastSquaresFit {
    const reducedChiSquare = degreesOfFreedom > 0 ? state.chiSquare / degreesOfFreedom : null;
    const values = fullValues(state.values);
    const warnings: string[] = [];
    const atBound = parameters.map(
      ({ fixed, minValue, maxValue }, index) =>
        fixed !== true && (values[index] === minValue || values[index] === maxValue),
    );
    const open = free.flatMap((index, at) => (atBound[index] === true ? [] : [at]));
    let covariance: number[][] | null = null;
    if (status !== 'non-finite' && open.length > 0) {
      const inverse = invertScaled(
        normalEquations(state.jacobian, state.residuals, freeCount).matrix.selection(open, open),
      );
      const scale = uncertaintyScaling === 'none' ? 1 : reducedChiSquare;
      if (inverse === null) warnings.push('The data do not determine every free parameter.');
      else if (scale === null) warnings.push('Without degrees of freedom the scatter gives no uncertainty.');
      else {
        covariance = parameters.map(() => parameters.map(() => 0));
        open.forEach((at, row) =>
          open.forEach((other, column) => {
            ((covariance as number[][])[free[at]] as number[])[free[other]] = inverse.get(row, column) * scale;
          }),
        );
      }
    }
    const fitted = parameters.map(({ name, unit, initialValue, fixed = false }, index): FittedParameter => {
      const value = values[index];
      const variance = fixed || atBound[index] === true ? undefined : covariance?.[index]?.[index];
      if (atBound[index] === true) warnings.push(`${name} lies at its bound.`);
      return {
        name,
        unit,
        value,
        stdUncertainty: variance === undefined ? null : Math.sqrt(variance),
        fixed,
        atBound: atBound[index] === true,
        atInitialValue: value === initialValue,
      };
    });
    return {
      parameters: fitted,
      covariance,
      chiSquare: state.chiSquare,
      reducedChiSquare,
      degreesOfFreedom,
      uncertaintyScaling,
      iterations,
      status,
      message,
      warnings,
    };
  }
}

function checkProblem({ parameters, y, yUncertainty }: LeastSquaresProblem, freeCount: number): void {
  if (freeCount === 0) throw new RangeError('At least one parameter must be free.');
  if (y.length < 2 || y.length < freeCount) throw new RangeError('There are fewer points than free parameters.');
  if (yUncertainty !== undefined && yUncertainty.length !== y.length)
    throw new RangeError('Values and uncertainties differ in number.');
  for (let point = 0; point < y.length; point += 1) {
    if (!Number.isFinite(y[point])) throw new RangeError(`Value ${point} is not finite.`);
    const sigma = yUncertainty?.[point] ?? 1;
    if (!(sigma > 0 && Number.isFinite(sigma))) throw new RangeError(`Uncertainty ${point} is not above zero.`);
  }
  for (const { name, initialValue, minValue = -Infinity, maxValue = Infinity } of parameters)
    if (!(initialValue >= minValue && initialValue <= maxValue))
      throw new RangeError(`${name} starts outside its bounds.`);
}
