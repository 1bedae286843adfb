import type { FailureReason, MeasureResult, RadialProfile } from '../../../shared/contracts/measureResult';
import type { LaboratoryScope } from '../../database/LaboratoryScope';
import { MeasurementEntity } from '../../entities/MeasurementEntity';
import { ProfileEntity } from '../../entities/ProfileEntity';
import { RenditionEntity } from '../../entities/RenditionEntity';

/** What the engine made of a run. */
export interface RunOutput {
  result: MeasureResult;
  radialProfile: RadialProfile | null;
  misfit: { widthPx: number; heightPx: number; encoding: string; bytes: Buffer } | null;
}

/** Whoever may end a run: the worker that holds its lease, or nobody's run that still waits. */
export type RunHolder = { leaseOwner: string } | 'waiting';

/**
 * Ends a run with its result, once and for all; to be called in a transaction. Does nothing and answers false when
 * the run is no longer in the hands of the given holder: another has it, or it has ended.
 */
export async function endRun(
  laboratory: LaboratoryScope,
  measurementId: string,
  holder: RunHolder,
  { result, radialProfile, misfit }: RunOutput,
): Promise<boolean> {
  const measured = result.status === 'measured' ? result : null;
  const ended = await laboratory.update(
    MeasurementEntity,
    holder === 'waiting'
      ? { id: measurementId, state: 'waiting' }
      : { id: measurementId, state: 'measuring', leaseOwner: holder.leaseOwner },
    {
      state: result.status,
      stage: null,
      result,
      sizeUm: measured?.sizeUm ?? null,
      standardUncertaintyUm: measured?.standardUncertaintyUm ?? null,
      fitUncertaintyUm: measured?.fitUncertaintyUm ?? null,
      expandedUncertaintyUm: measured?.expandedUncertaintyUm ?? null,
      coverageFactor: measured?.coverageFactor ?? null,
      reason: result.status === 'measured' ? null : result.reason,
      message: result.status === 'measured' ? null : result.message,
      flags: measured?.flags ?? [],
      leaseOwner: null,
      leaseUntil: null,
      finishedAt: new Date(),
    },
  );
  if (ended === 0) return false;
  if (radialProfile) await laboratory.insert(ProfileEntity, { measurementId, ...radialProfile });
  if (misfit) await laboratory.insert(RenditionEntity, { measurementId, frameId: null, kind: 'misfit', ...misfit });
  return true;
}

/** A run that ended without having been measured. */
export function failedOutput(measurementId: string, reason: FailureReason, message: string): RunOutput {
  return { result: { id: measurementId, status: 'failed', reason, message }, radialProfile: null, misfit: null };
}
