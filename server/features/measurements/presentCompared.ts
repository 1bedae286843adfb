import type { Compared, Measurement } from '../../../shared/contracts/measurements';
import type { MeasurementExtra } from './measurementRepository';

/** A measured size with its rings, as Compare wants it; null when the run gave no size. */
export function presentCompared(measurement: Measurement, extra: MeasurementExtra): Compared | null {
  const { sizeUm, standardUncertaintyUm, fitUncertaintyUm, finishedAt } = measurement;
  const { result } = extra;
  if (result?.status !== 'measured' || sizeUm === null || standardUncertaintyUm === null) return null;
  if (fitUncertaintyUm === null || finishedAt === null) return null;
  return {
    measurementId: measurement.id,
    apertureSerial: measurement.apertureSerial,
    lotNumber: measurement.lotNumber,
    benchName: measurement.benchName,
    nominalSizeUm: extra.nominalSizeUm,
    sizeUm,
    standardUncertaintyUm,
    fitUncertaintyUm,
    wavelengthNm: measurement.wavelengthNm,
    distanceMm: measurement.distanceMm,
    rings: result.rings,
    measuredAt: finishedAt,
  };
}
