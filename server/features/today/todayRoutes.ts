import { endpoints } from '../../../shared/contracts/endpoints';
import type { Api } from '../../http/Api';
import type { TodayService } from './todayService';

export function todayRoutes(api: Api, today: TodayService): void {
  api.register(endpoints.today, ({ actor }) => today.get(actor));
}
