import { endpoints } from '../../../shared/contracts/endpoints';
import type { Api } from '../../http/Api';
import { csvFileName } from '../../../shared/units/csvFileName';
import { radialProfileCsv } from '../../reports/radialProfileCsv';
import { ringTableCsv } from '../../reports/ringTableCsv';
import type { MeasurementService } from './measurementService';

export function measurementRoutes(api: Api, measurements: MeasurementService): void {
  api.register(endpoints.measurements, ({ actor, query: { state, ...filter } }) =>
    measurements.list(actor, { ...filter, states: state && [state] }),
  );
  api.register(endpoints.measurement, ({ actor, params }) => measurements.get(actor, params.measurementId));
  api.register(endpoints.measureAgain, ({ actor, params, body }) =>
    measurements.again(actor, params.measurementId, body),
  );
  api.register(endpoints.radialProfile, ({ actor, params }) => measurements.profile(actor, params.measurementId));
  api.registerFile(endpoints.radialProfileCsv, async ({ actor, params }) => {
    const [detail, profile] = await measurements.profileWithDetail(actor, params.measurementId);
    return { content: radialProfileCsv(profile), fileName: csvFileName(detail, 'radial-profile') };
  });
  api.registerFile(endpoints.ringTableCsv, async ({ actor, params }) => {
    const detail = await measurements.get(actor, params.measurementId);
    return { content: ringTableCsv(detail), fileName: csvFileName(detail, 'rings') };
  });
  api.registerFile(endpoints.misfit, async ({ actor, params }) => {
    const { encoding, bytes } = await measurements.misfit(actor, params.measurementId);
    const headers: Record<string, string> = encoding.endsWith('+gzip') ? { 'Content-Encoding': 'gzip' } : {};
    return { content: bytes, headers, immutable: true };
  });
  api.register(endpoints.compared, ({ actor, query }) => measurements.compared(actor, query.ids));
}
