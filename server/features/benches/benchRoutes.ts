import { endpoints } from '../../../shared/contracts/endpoints';
import type { Api } from '../../http/Api';
import type { BenchService } from './benchService';
import { presentBench, presentBenchDetail } from './presentBench';

export function benchRoutes(api: Api, benches: BenchService): void {
  api.register(endpoints.benches, async ({ actor }) => (await benches.list(actor)).map(presentBench));
  api.register(endpoints.bench, async ({ actor, params }) =>
    presentBenchDetail(await benches.get(actor, params.benchId)),
  );
  api.register(endpoints.createBench, async ({ actor, body }) => presentBenchDetail(await benches.add(actor, body)));
  api.register(endpoints.reviseBench, async ({ actor, params, body }) =>
    presentBenchDetail(await benches.revise(actor, params.benchId, body)),
  );
}
