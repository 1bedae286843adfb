import type { Transaction } from '../../database/Database';
import type { ProgressEvent } from '../../../shared/contracts/measurements';

/** Notification channel that carries progress from whoever makes it to every api process. */
export const PROGRESS_CHANNEL = 'ringwright_progress';

/** What travels on the channel. */
export interface ProgressNotice {
  laboratoryId: string;
  event: ProgressEvent;
}

/** Tells the people of a laboratory about progress; within a transaction they hear of it when it commits. */
export async function publishProgress(
  manager: Transaction,
  laboratoryId: string,
  events: readonly ProgressEvent[],
): Promise<void> {
  for (const event of events) {
    const notice: ProgressNotice = { laboratoryId, event };
    await manager.query('select pg_notify($1, $2)', [PROGRESS_CHANNEL, JSON.stringify(notice)]);
  }
}
