import strd from '../data/strd.json';
import { leastSquares } from '../../../shared/metrology/leastSquares';
import { seededRandom } from '../../../shared/metrology/seededRandom';

type Values = (index: number) => number;
/** Value of a model at x and its derivatives, b counted from 0. */
type Model = (x: number, b: Values) => { value: number; derivatives: number[] };

const exponentials =
  (pairs: [amplitude: number, rate: number][], offset: number | null): Model =>
  (x, b) => {
    const derivatives: number[] = [];
    let value = 0;
    if (offset !== null) {
      value = b(offset);
      derivatives[offset] = 1;
    }
    for (const [amplitude, rate] of pairs) {
      const decay = Math.exp(-b(rate) * x);
      value += b(amplitude) * decay;
      derivatives[amplitude] = decay;
      derivatives[rate] = -b(amplitude) * x * decay;
    }
    return { value, derivatives };
  };

const saturating: Model = (x, b) => {
  const decay = Math.exp(-b(1) * x);
  return { value: b(0) * (1 - decay), derivatives: [1 - decay, b(0) * x * decay] };
};

const models: Record<string, Model> = {
  Misra1a: saturating,
  BoxBOD: saturating,
  Lanczos3: exponentials(
    [
      [0, 1],
      [2, 3],
      [4, 5],
    ],
    null,
  ),
  MGH17: exponentials(
    [
      [1, 3],
      [2, 4],
    ],
    0,
  ),
  MGH10: (x, b) => {
    const growth = Math.exp(b(1) / (x + b(2)));
    return {
      value: b(0) * growth,
      derivatives: [growth, (b(0) * growth) / (x + b(2)), (-b(0) * growth * b(1)) / (x + b(2)) ** 2],
    };
  },
  Eckerle4: (x, b) => {
    const z = (x - b(2)) / b(1);
    const value = (b(0) / b(1)) * Math.exp(-0.5 * z * z);
    return { value, derivatives: [value / b(0), (value * (z * z - 1)) / b(1), (value * z) / b(1)] };
  },
  Gauss1: (x, b) => {
    const decay = Math.exp(-b(1) * x);
    const first = Math.exp(-(((x - b(3)) / b(4)) ** 2));
    const second = Math.exp(-(((x - b(6)) / b(7)) ** 2));
    return {
      value: b(0) * decay + b(2) * first + b(5) * second,
      derivatives: [
        decay,
        -b(0) * x * decay,
        first,
        (b(2) * first * 2 * (x - b(3))) / b(4) ** 2,
        (b(2) * first * 2 * (x - b(3)) ** 2) / b(4) ** 3,
        second,
        (b(5) * second * 2 * (x - b(6))) / b(7) ** 2,
        (b(5) * second * 2 * (x - b(6)) ** 2) / b(7) ** 3,
      ],
    };
  },
};

const evaluateWith =
  (x: readonly number[], model: Model, count: number) =>
  (values: Float64Array, out: Float64Array, jacobian: Float64Array | null) => {
    x.forEach((at, point) => {
      const { value, derivatives } = model(at, (index) => values[index]);
      out[point] = value;
      if (jacobian !== null) derivatives.forEach((derivative, index) => (jacobian[point * count + index] = derivative));
    });
  };

describe('NIST StRD nonlinear regression sets (certified values looked up; residual sums recomputed)', () => {
  const cases = Object.entries(strd.sets).flatMap(([name, set]) => [
    { name, set, start: 'first', values: set.start1 },
    { name, set, start: 'second', values: set.start2 },
  ]);
  test.each(cases)('$name from the $start start', ({ name, set, values }) => {
    const model = models[name];
    if (model === undefined) throw new Error(`No model for ${name}.`);
    const fit = leastSquares(
      {
        parameters: values.map((initialValue, index) => ({ name: `b${index + 1}`, unit: '1', initialValue })),
        y: set.y,
        evaluate: evaluateWith(set.x, model, values.length),
      },
      { maxIterations: 2000 },
    );
    expect(fit.status).toBe('converged');
    // Certified to 11 digits; the parameters of a fit in double precision by normal equations: 7 (Lanczos3: 5, its
    // residuals are at the level of the rounding of the data).
    const digits = name === 'Lanczos3' ? 1e-5 : 1e-7;
    const deviation = (value: number, certified: number) => Math.abs(value / certified - 1);
    fit.parameters.forEach(({ value }, index) => expect(deviation(value, set.certified[index])).toBeLessThan(digits));
    expect(deviation(fit.chiSquare, set.certifiedResidualSumOfSquares)).toBeLessThan(1e-9);
    expect(fit.uncertaintyScaling).toBe('reduced-chi-square');
    // Certified standard errors agree with the exact Jacobian's to 4 digits.
    const errors = set.certifiedStandardErrors ?? set.standardErrorsComputed ?? [];
    expect(errors).toHaveLength(values.length);
    fit.parameters.forEach(({ stdUncertainty }, index) =>
      expect(deviation(stdUncertainty as number, errors[index])).toBeLessThan(1e-4),
    );
  });
});

describe('leastSquares', () => {
  const x = Array.from({ length: 60 }, (_, index) => index / 10);
  const line: Model = (at, b) => ({ value: b(0) + b(1) * at, derivatives: [1, at] });
  const lineParameters = [
    { name: 'intercept', unit: 'mm', initialValue: 0 },
    { name: 'slope', unit: '1', initialValue: 0 },
  ];

  test('whitens with unequal uncertainties: stated uncertainties are those that repeated trials show', () => {
    const random = seededRandom(11);
    const sigma = x.map((at) => 0.05 + 0.02 * at);
    const slopes: number[] = [];
    let stated = 0;
    for (let trial = 0; trial < 1500; trial += 1) {
      const fit = leastSquares({
        parameters: lineParameters,
        y: x.map((at, point) => 1 + 0.5 * at + sigma[point] * random.normal()),
        yUncertainty: sigma,
        evaluate: evaluateWith(x, line, 2),
      });
      expect(fit.status).toBe('converged');
      slopes.push(fit.parameters[1]?.value as number);
      stated = fit.parameters[1]?.stdUncertainty as number;
    }
    const mean = slopes.reduce((sum, slope) => sum + slope, 0) / slopes.length;
    const scatter = Math.sqrt(slopes.reduce((sum, slope) => sum + (slope - mean) ** 2, 0) / (slopes.length - 1));
    expect(Math.abs(mean - 0.5)).toBeLessThan((4 * scatter) / Math.sqrt(slopes.length));
    // Three standard deviations of a scatter from 1500 trials.
    expect(Math.abs(scatter / stated - 1)).toBeLessThan(0.055);
  });

  test('a parameter that the data push against its bound stays there and has no uncertainty', () => {
    const fit = leastSquares({
      parameters: [
        lineParameters[0] as (typeof lineParameters)[0],
        { name: 'slope', unit: '1', initialValue: 0, maxValue: 0.2 },
      ],
      y: x.map((at) => 1 + 0.5 * at),
      yUncertainty: x.map(() => 0.1),
      evaluate: evaluateWith(x, line, 2),
    });
    expect(fit.status).toBe('converged');
    expect(fit.parameters[1]).toMatchObject({ value: 0.2, atBound: true, stdUncertainty: null });
    expect(fit.parameters[0]?.value).toBeCloseTo(1 + 0.3 * 2.95, 9);
    expect(fit.warnings).toEqual(['slope lies at its bound.']);
  });

  test('a fixed parameter keeps its value', () => {
    const fit = leastSquares({
      parameters: [
        { name: 'intercept', unit: 'mm', initialValue: 1, fixed: true },
        lineParameters[1] as (typeof lineParameters)[1],
      ],
      y: x.map((at) => 1 + 0.5 * at),
      evaluate: evaluateWith(x, line, 2),
    });
    expect(fit.parameters[0]).toMatchObject({ value: 1, fixed: true, stdUncertainty: null });
    expect(fit.parameters[1]?.value).toBeCloseTo(0.5, 12);
    expect(fit.degreesOfFreedom).toBe(59);
  });

  test('parameters that the data cannot tell apart have no covariance, and that is said', () => {
    const fit = leastSquares({
      parameters: lineParameters,
      y: x.map(() => 3),
      yUncertainty: x.map(() => 0.1),
      evaluate: evaluateWith(x, (_, b) => ({ value: b(0) + b(1), derivatives: [1, 1] }), 2),
    });
    expect(fit.covariance).toBeNull();
    expect(fit.parameters[0]?.stdUncertainty).toBeNull();
    expect(fit.warnings).toContain('The data do not determine every free parameter.');
  });

  test('says when it was stopped, ran out of iterations or met a model that is not finite', () => {
    const set = strd.sets.MGH10;
    const problem = {
      parameters: set.start1.map((initialValue, index) => ({ name: `b${index + 1}`, unit: '1', initialValue })),
      y: set.y,
      evaluate: evaluateWith(set.x, models.MGH10 as Model, 3),
    };
    expect(leastSquares(problem, { maxIterations: 5 }).status).toBe('max-iterations');
    expect(leastSquares(problem, { shouldStop: () => true })).toMatchObject({ status: 'aborted', iterations: 0 });
    const broken = leastSquares({ ...problem, evaluate: (_, model, jacobian) => [model.fill(NaN), jacobian?.fill(0)] });
    expect(broken).toMatchObject({ status: 'non-finite', covariance: null });
  });

  test('refuses what cannot be fitted', () => {
    const problem = { parameters: lineParameters, y: x, evaluate: evaluateWith(x, line, 2) };
    expect(() => leastSquares({ ...problem, y: [1, NaN] })).toThrow(RangeError);
    expect(() => leastSquares({ ...problem, y: [1] })).toThrow(RangeError);
    expect(() => leastSquares({ ...problem, yUncertainty: [1] })).toThrow(RangeError);
    expect(() => leastSquares({ ...problem, yUncertainty: x })).toThrow(RangeError);
    expect(() =>
      leastSquares({ ...problem, parameters: [{ name: 'a', unit: '1', initialValue: 2, maxValue: 1 }] }),
    ).toThrow(RangeError);
    expect(() =>
      leastSquares({ ...problem, parameters: [{ name: 'a', unit: '1', initialValue: 2, fixed: true }] }),
    ).toThrow(RangeError);
  });
});
