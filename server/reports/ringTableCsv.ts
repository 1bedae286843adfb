import type { MeasurementDetail } from '../../shared/contracts/measurements';
import { toCsv } from './toCsv';

/**
 * The ring table of a measurement, one row a ring; the uncertainty is a standard uncertainty (k = 1). A run that gave
 * no size has no rings: only the header stands.
 */
export function ringTableCsv({ result }: Pick<MeasurementDetail, 'result'>): string {
  const rings = result?.status === 'measured' ? result.rings : [];
  return toCsv(
    ['order', 'kind', 'radius_mm', 'radius_standard_uncertainty_mm', 'predicted_radius_mm', 'size_um'],
    rings.map((ring) => [ring.order, ring.kind, ring.radiusMm, ring.uncertaintyMm, ring.predictedMm, ring.sizeUm]),
  );
}
