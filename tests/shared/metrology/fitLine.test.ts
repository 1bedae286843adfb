import { fitLine, fitLineBothErrors } from '../../../shared/metrology/fitLine';
import { seededRandom } from '../../../shared/metrology/seededRandom';

describe('fitLine', () => {
  test('calibration of a thermometer, JCGM 100:2008, H.3 (from memory)', () => {
    const temperature = [21.521, 22.012, 22.512, 23.003, 23.507, 23.999, 24.513, 25.002, 25.503, 26.01, 26.511];
    const correction = [-0.171, -0.169, -0.166, -0.159, -0.164, -0.165, -0.156, -0.157, -0.159, -0.161, -0.16];
    const fit = fitLine(temperature.map((t, index) => ({ x: t - 20, y: correction[index] as number })));
    // y1 = −0.1712, s = 0.0029; y2 = 0.00218, s = 0.00067; r = −0.930; s of the fit 0.0035.
    expect(fit.intercept).toBeCloseTo(-0.1712, 4);
    expect(fit.slope).toBeCloseTo(0.00218, 5);
    expect(fit.interceptUncertainty).toBeCloseTo(0.0029, 4);
    expect(fit.slopeUncertainty).toBeCloseTo(0.00067, 5);
    expect(
      (fit.covariance as number) / (fit.interceptUncertainty as number) / (fit.slopeUncertainty as number),
    ).toBeCloseTo(-0.93, 3);
    expect(Math.sqrt(fit.reducedChiSquare as number)).toBeCloseTo(0.0035, 4);
    expect(fit.uncertaintyScaling).toBe('reduced-chi-square');
  });

  test('given uncertainties are taken as they are', () => {
    // Two points: the line passes through them and its uncertainties follow by propagation.
    const fit = fitLine([
      { x: 0, y: 1, yUncertainty: 0.1 },
      { x: 2, y: 5, yUncertainty: 0.2 },
    ]);
    expect(fit.slope).toBeCloseTo(2, 12);
    expect(fit.intercept).toBeCloseTo(1, 12);
    expect(fit.interceptUncertainty).toBeCloseTo(0.1, 12);
    expect(fit.slopeUncertainty).toBeCloseTo(Math.hypot(0.1, 0.2) / 2, 12);
    expect(fit.reducedChiSquare).toBeNull();
    expect(fit.uncertaintyScaling).toBe('none');
  });

  test('refuses what is no line', () => {
    expect(() => fitLine([{ x: 1, y: 1 }])).toThrow(RangeError);
    expect(() =>
      fitLine([
        { x: 1, y: 1 },
        { x: 1, y: 2 },
      ]),
    ).toThrow(RangeError);
    expect(() =>
      fitLine([
        { x: 1, y: 1, yUncertainty: 1 },
        { x: 2, y: 2 },
      ]),
    ).toThrow(RangeError);
    expect(() =>
      fitLine([
        { x: 1, y: NaN },
        { x: 2, y: 2 },
      ]),
    ).toThrow(RangeError);
  });
});

describe('fitLineBothErrors', () => {
  test("Pearson's data with York's weights", () => {
    // Data: K. Pearson, Phil. Mag. 2, 559 (1901); weights: D. York, Can. J. Phys. 44, 1079 (1966) (from memory).
    // Result of York et al., Am. J. Phys. 72, 367 (2004): slope −0.4805 ± 0.0580, intercept 5.4799 ± 0.2950,
    // reduced chi-square 1.483 (from memory; the last digits of the uncertainties computed).
    const x = [0, 0.9, 1.8, 2.6, 3.3, 4.4, 5.2, 6.1, 6.5, 7.4];
    const y = [5.9, 5.4, 4.4, 4.6, 3.5, 3.7, 2.8, 2.8, 2.4, 1.5];
    const xWeight = [1000, 1000, 500, 800, 200, 80, 60, 20, 1.8, 1];
    const yWeight = [1, 1.8, 4, 8, 20, 20, 70, 70, 100, 500];
    const fit = fitLineBothErrors(
      x.map((value, index) => ({
        x: value,
        y: y[index],
        xUncertainty: 1 / Math.sqrt(xWeight[index]),
        yUncertainty: 1 / Math.sqrt(yWeight[index]),
      })),
    );
    expect(fit.status).toBe('converged');
    expect(fit.slope).toBeCloseTo(-0.4805, 4);
    expect(fit.intercept).toBeCloseTo(5.4799, 4);
    expect(fit.slopeUncertainty).toBeCloseTo(0.058, 4);
    expect(fit.interceptUncertainty).toBeCloseTo(0.295, 4);
    expect(fit.reducedChiSquare).toBeCloseTo(1.483, 3);
  });

  test('without errors in x it is the weighted line', () => {
    const points = [1, 2, 3, 4.5, 7].map((x, index) => ({
      x,
      y: 2 - 0.3 * x + 0.05 * (-1) ** index,
      xUncertainty: 0,
      yUncertainty: 0.03 + 0.01 * index,
    }));
    const both = fitLineBothErrors(points);
    const plain = fitLine(points);
    expect(both.slope).toBeCloseTo(plain.slope, 12);
    expect(both.intercept).toBeCloseTo(plain.intercept, 12);
    expect(both.slopeUncertainty).toBeCloseTo(plain.slopeUncertainty as number, 12);
    expect(both.covariance).toBeCloseTo(plain.covariance as number, 12);
  });

  test('exchanging the axes inverts the line, correlated errors included', () => {
    const points = [0, 1, 2, 3, 4, 5].map((x, index) => ({
      x,
      y: 1 + 2 * x + 0.1 * Math.sin(5 * index),
      xUncertainty: 0.05,
      yUncertainty: 0.1,
      correlation: 0.4,
    }));
    const fit = fitLineBothErrors(points);
    const exchanged = fitLineBothErrors(
      points.map(({ x, y, xUncertainty, yUncertainty, correlation }) => ({
        x: y,
        y: x,
        xUncertainty: yUncertainty,
        yUncertainty: xUncertainty,
        correlation,
      })),
    );
    expect(exchanged.slope).toBeCloseTo(1 / fit.slope, 9);
    expect(exchanged.intercept).toBeCloseTo(-fit.intercept / fit.slope, 9);
    expect(exchanged.chiSquare).toBeCloseTo(fit.chiSquare, 9);
  });

  test('stated uncertainties are those that repeated trials show', () => {
    const random = seededRandom(20_261_201).normal;
    const slopes: number[] = [];
    const stated: number[] = [];
    for (let trial = 0; trial < 1500; trial += 1) {
      const fit = fitLineBothErrors(
        [1, 2, 3, 4, 5, 6].map((x) => ({
          x: x + 0.05 * random(),
          y: 0.5 + 1.5 * x + 0.08 * random(),
          xUncertainty: 0.05,
          yUncertainty: 0.08,
        })),
      );
      slopes.push(fit.slope);
      stated.push(fit.slopeUncertainty as number);
    }
    const mean = slopes.reduce((sum, slope) => sum + slope, 0) / slopes.length;
    const scatter = Math.sqrt(slopes.reduce((sum, slope) => sum + (slope - mean) ** 2, 0) / (slopes.length - 1));
    const meanStated = stated.reduce((sum, value) => sum + value, 0) / stated.length;
    // The scatter of 1500 trials is known to 1.8 %; three of that.
    expect(scatter / meanStated).toBeGreaterThan(0.945);
    expect(scatter / meanStated).toBeLessThan(1.055);
    expect(Math.abs(mean - 1.5)).toBeLessThan((4 * scatter) / Math.sqrt(slopes.length));
  });
});
