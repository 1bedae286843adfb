import type { RefusalReason } from '../../../shared/contracts/measureResult';

/** A reasoned "this cannot be measured": what is wrong and what to do. */
export interface Refusal {
  reason: RefusalReason;
  message: string;
}
