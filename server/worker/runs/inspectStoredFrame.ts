import type { CameraRecord } from '../../../shared/contracts/measureCase';
import type { FailureReason } from '../../../shared/contracts/measureResult';
import type { ProgressEvent } from '../../../shared/contracts/measurements';
import { inLaboratory, scoped } from '../../database/LaboratoryScope';
import { FrameEntity } from '../../entities/FrameEntity';
import { publishProgress } from '../../features/events/publishProgress';
import { addFrameRendition } from '../../features/frames/frameRepository';
import { endRun, failedOutput } from '../../features/measurements/endRun';
import { readCameraOf } from '../../features/measurements/readRunInputs';
import type { InspectAnswer } from '../child/engineJobs';
import { JobFailure, PoolClosed } from '../pool/jobFailure';
import { fileOf } from './fileOf';
import { holdLease } from './holdLease';
import type { WorkContext } from './WorkContext';
import { claimFrame, handBack, MAX_ATTEMPTS, readPlaces, readRunsWaitingFor, type FrameClaim } from './workRepository';

type Look = { answer: InspectAnswer; plane: Buffer; tone: Buffer } | { reason: FailureReason; problem: string };

const GIVEN_UP: Look = {
  reason: 'unreadable',
  problem: `Looking at this file broke the worker ${MAX_ATTEMPTS} times. Send the frame as plain TIFF or PNG.`,
};

/**
 * Looks at a stored frame: size, health, the plane for the screen and the tone of its thumbnail, or why it cannot be
 * used. Then it queues the runs that waited for it. Doing it twice does no harm: only the holder of the lease ends it.
 */
export async function inspectStoredFrame(context: WorkContext, frameId: string): Promise<void> {
  const { database, owner, log } = context;
  const claim = await claimFrame(database, frameId, owner);
  if (claim === null) return;
  const release = holdLease(database, 'frame', frameId, owner, log);
  try {
    const look = claim.attempts > MAX_ATTEMPTS ? GIVEN_UP : await lookAt(context, claim);
    await finish(context, claim, look);
  } catch (error) {
    if (!(error instanceof PoolClosed)) throw error;
    await handBack(database, 'frame', frameId, owner);
  } finally {
    release();
  }
}

async function lookAt({ database, pool }: WorkContext, claim: FrameClaim): Promise<Look> {
  const laboratory = scoped(database, claim.laboratoryId);
  const camera: CameraRecord = await readCameraOf(laboratory, claim.id);
  try {
    const file = fileOf(laboratory, { frameId: claim.id, ...claim });
    const { answer, blobs } = await pool.run('inspect', { camera }, [file]);
    const [plane, tone] = blobs;
    if (!plane || !tone) throw new Error('An inspection answered without its planes.');
    return { answer, plane, tone };
  } catch (error) {
    if (error instanceof JobFailure) return { reason: error.reason, problem: error.message };
    throw error;
  }
}

async function finish({ database, queue, owner, metrics }: WorkContext, claim: FrameClaim, look: Look): Promise<void> {
  const { id: frameId, laboratoryId } = claim;
  await inLaboratory(database, laboratoryId, async (laboratory, transaction) => {
    const usable = 'answer' in look;
    const { thumbnail, health, ...found } = usable ? look.answer : {};
    const done = await laboratory.update(
      FrameEntity,
      { id: frameId, state: 'stored', leaseOwner: owner },
      {
        ...found,
        ...health,
        state: usable ? 'ready' : 'unusable',
        problem: usable ? null : look.problem,
        leaseOwner: null,
        leaseUntil: null,
      },
    );
    if (done === 0) return;
    if (usable && thumbnail) {
      const { widthPx, heightPx } = look.answer;
      await addFrameRendition(laboratory, frameId, {
        kind: 'plane',
        widthPx,
        heightPx,
        encoding: 'uint16-le+gzip',
        bytes: look.plane,
      });
      await addFrameRendition(laboratory, frameId, {
        kind: 'thumbnail',
        ...thumbnail,
        encoding: 'tone8',
        bytes: look.tone,
      });
    }
    const state = usable ? 'ready' : 'unusable';
    const events: ProgressEvent[] = [];
    for (const place of await readPlaces(transaction, laboratoryId, frameId)) {
      events.push({ type: 'frame', ...place, frameId, state });
    }
    for (const { id, isOwn, captureId, captureFrameId } of await readRunsWaitingFor(
      transaction,
      laboratoryId,
      frameId,
    )) {
      if (usable || !isOwn) {
        await queue.send(transaction, 'run-measurement', id);
      } else {
        await endRun(laboratory, id, 'waiting', failedOutput(id, look.reason, look.problem));
        events.push({
          type: 'measurement',
          captureId,
          captureFrameId,
          measurementId: id,
          state: 'failed',
          stage: null,
        });
      }
    }
    await publishProgress(transaction, laboratoryId, events);
    metrics.frameDone(state);
  });
}
