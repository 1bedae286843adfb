import { ZodError } from 'zod';
import type { MeasurementState, ProgressEvent } from '../../../shared/contracts/measurements';
import type { Stage } from '../../../shared/contracts/measureResult';
import { inLaboratory, scoped } from '../../database/LaboratoryScope';
import { publishProgress } from '../../features/events/publishProgress';
import { endRun, failedOutput, type RunOutput } from '../../features/measurements/endRun';
import { readRunInputs, type RunInputs } from '../../features/measurements/readRunInputs';
import { measureAnswerSchema } from '../child/engineJobs';
import { JobFailure, PoolClosed } from '../pool/jobFailure';
import { fileOf } from './fileOf';
import { holdLease } from './holdLease';
import type { WorkContext } from './WorkContext';
import { claimRun, findFreeRun, handBack, MAX_ATTEMPTS, noteStage } from './workRepository';

/**
 * Runs the engine over a frame, with the darks that its capture holds when the run begins. While a dark of the capture
 * is still to be looked at, the run goes on waiting: the end of that inspection queues it again. Doing it twice does
 * no harm: only the holder of the lease writes the result.
 */
export async function runMeasurement(context: WorkContext, measurementId: string): Promise<void> {
  const { database, owner, log } = context;
  const laboratoryId = await findFreeRun(database, measurementId);
  if (laboratoryId === null) return;
  const inputs = await readRunInputs(scoped(database, laboratoryId), measurementId);
  if (inputs === null || inputs.light.state === 'stored' || inputs.calibrationPending) return;
  const claim = await claimRun(database, measurementId, owner, {
    inputs: inputs.measureCase,
    darkCount: inputs.darks.length,
  });
  if (claim === null) return;
  const release = holdLease(database, 'measurement', measurementId, owner, log);
  try {
    const run = new Run(context, measurementId, laboratoryId, inputs);
    await run.tell('measuring', null);
    await run.end(claim.attempts > MAX_ATTEMPTS ? run.failed('unreadable', GIVEN_UP) : await run.outcome());
  } catch (error) {
    if (!(error instanceof PoolClosed)) throw error;
    await handBack(database, 'measurement', measurementId, owner);
  } finally {
    release();
  }
}

const GIVEN_UP = `Measuring this frame broke the worker ${MAX_ATTEMPTS} times. Take the frame again.`;
const NOT_A_LIGHT = 'This frame is not a light any more, so there is nothing to measure on it.';
const NO_ANSWER = 'The engine could not put what it found on this frame into numbers. Take the frame again.';

/** One run in this worker's hands. */
class Run {
  /** Stages are written one after the other, and all before the end. */
  private stages: Promise<void> = Promise.resolve();

  constructor(
    private readonly context: WorkContext,
    private readonly id: string,
    private readonly laboratoryId: string,
    private readonly inputs: RunInputs,
  ) {}

  failed(...[reason, message]: [Parameters<typeof failedOutput>[1], string]): RunOutput {
    return failedOutput(this.id, reason, message);
  }

  /** What the engine makes of the frame. */
  async outcome(): Promise<RunOutput> {
    const { light, darks, flats, kind, measureCase } = this.inputs;
    if (kind !== 'light') return this.failed('bad-case', NOT_A_LIGHT);
    const laboratory = scoped(this.context.database, this.laboratoryId);
    const files = [light, ...darks, ...flats].map((file) => fileOf(laboratory, file));
    const data = { measureCase, frameCount: 1, darkCount: darks.length };
    try {
      const { answer, blobs } = await this.context.pool.run('measure', data, files, (stage) => this.reached(stage));
      const [bytes] = blobs;
      const { result, radialProfile } = measureAnswerSchema.parse(answer);
      const misfit = answer.misfit && bytes ? { ...answer.misfit, encoding: 'misfit8+gzip', bytes } : null;
      return { result, radialProfile, misfit };
    } catch (error) {
      if (error instanceof JobFailure) return this.failed(error.reason, error.message);
      if (error instanceof ZodError) {
        this.context.log.error({ err: error, measurementId: this.id }, 'the engine gave an answer that is none');
        return this.failed('unsupported', NO_ANSWER);
      }
      throw error;
    }
  }

  async end(output: RunOutput): Promise<void> {
    await this.stages;
    const { database, owner, metrics, log } = this.context;
    const state = output.result.status;
    const written = await inLaboratory(database, this.laboratoryId, async (laboratory, transaction) => {
      const ended = await endRun(laboratory, this.id, { leaseOwner: owner }, output);
      if (ended) await publishProgress(transaction, this.laboratoryId, [this.event(state, null)]);
      return ended;
    });
    if (!written) {
      log.warn({ measurementId: this.id }, 'a result came too late: another worker has the run');
      return;
    }
    metrics.runDone(output.result);
  }

  async tell(state: MeasurementState, stage: Stage | null): Promise<void> {
    await publishProgress(this.context.database.manager, this.laboratoryId, [this.event(state, stage)]);
  }

  private reached(stage: Stage): void {
    const { database, owner, log } = this.context;
    this.stages = this.stages
      .then(async () => {
        if (await noteStage(database.manager, this.id, owner, stage)) await this.tell('measuring', stage);
      })
      .catch((error: unknown) => log.error({ err: error, measurementId: this.id }, 'a stage could not be noted'));
  }

  private event(state: MeasurementState, stage: Stage | null): ProgressEvent {
    const { captureId, captureFrameId } = this.inputs;
    return { type: 'measurement', captureId, captureFrameId, measurementId: this.id, state, stage };
  }
}
