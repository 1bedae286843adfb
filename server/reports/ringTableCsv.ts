import type { Ring } from '../../shared/contracts/measureResult';
import type { MeasurementDetail } from '../../shared/contracts/measurements';
import { toCsv } from './toCsv';

/**
 * The ring table of a measurement, one row a ring; uncertainties are standard uncertainties (k = 1) of the reading of
 * that ring alone, without what is common to all rings. A run that gave no size has no rings: only the header stands.
 */
export function ringTableCsv({ result, inputs }: Pick<MeasurementDetail, 'result' | 'inputs'>): string {
  const rings = result?.status === 'measured' ? result.rings : [];
  return toCsv(
    [
      ['order', null],
      ['kind', null],
      ['radius_mm', 'mm'],
      ['radius_standard_uncertainty_mm', 'mm'],
      ['predicted_radius_mm', 'mm'],
      ['size_um', 'um'],
      ['size_standard_uncertainty_um', 'um'],
    ],
    rings.map((ring) => [
      ring.order,
      ring.kind,
      ring.radiusMm,
      ring.uncertaintyMm,
      ring.predictedMm,
      ring.sizeUm,
      sizeUncertaintyUm(ring, inputs.distanceMm),
    ]),
  );
}

/**
 * Uncertainty of the size that a ring gives, from that of its radius: the size goes as 1/sin θ with tan θ = r/z, so
 * that u(D)/D = cos² θ · u(r)/r.
 */
function sizeUncertaintyUm({ sizeUm, radiusMm, uncertaintyMm }: Ring, distanceMm: number): number {
  const cosineSquared = distanceMm ** 2 / (distanceMm ** 2 + radiusMm ** 2);
  return (sizeUm * cosineSquared * uncertaintyMm) / radiusMm;
}
