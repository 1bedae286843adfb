import type { Transaction } from '../../database/Database';
import type { MeasurementSettings } from '../../../shared/contracts/measurements';
import type { LaboratoryScope } from '../../database/LaboratoryScope';
import { FrameEntity } from '../../entities/FrameEntity';
import { MeasurementEntity } from '../../entities/MeasurementEntity';
import type { Queue } from '../../worker/queue/createQueue';
import { publishProgress } from '../events/publishProgress';
import { endRun, failedOutput } from './endRun';

export interface RunRequest {
  captureId: string;
  captureFrameId: string;
  frameId: string;
  settings: MeasurementSettings;
  createdBy: string;
}

/**
 * Adds a run of the engine over a frame, within the caller's transaction. Its job is queued when the frame is ready;
 * for a frame that has not been looked at, the inspection queues it. A frame that cannot be read fails its run at once.
 * @returns the id of the measurement
 */
export async function addRun(
  laboratory: LaboratoryScope,
  manager: Transaction,
  queue: Queue,
  request: RunRequest,
): Promise<string> {
  const { captureId, captureFrameId, frameId, settings, createdBy } = request;
  // Held until the end of the transaction: an inspection that ends meanwhile sees this run, or is seen by it.
  const frame = await laboratory.findOne(FrameEntity, { where: { id: frameId }, lock: 'share' });
  const measurementId = await laboratory.insert(MeasurementEntity, {
    captureId,
    captureFrameId,
    settings,
    createdBy,
    // Not the transaction's time: runs that one transaction adds, and ends, keep their order.
    createdAt: new Date(),
  });
  if (frame?.state === 'ready') await queue.send(manager, 'run-measurement', measurementId);
  if (frame?.state === 'unusable') {
    await endRun(laboratory, measurementId, 'waiting', failedOutput(measurementId, 'unreadable', frame.problem ?? ''));
  }
  await publishProgress(manager, laboratory.laboratoryId, [
    {
      type: 'measurement',
      captureId,
      captureFrameId,
      measurementId,
      state: frame?.state === 'unusable' ? 'failed' : 'waiting',
      stage: null,
    },
  ]);
  return measurementId;
}
