import type { FailureReason } from '../../../shared/contracts/measureResult';

/** Why a job has no answer, in the contract's closed list and in words for the person who waits for it. */
export class JobFailure extends Error {
  override readonly name = 'JobFailure';

  constructor(
    readonly reason: FailureReason,
    message: string,
  ) {
    super(message);
  }
}

/** The pool was closed before the job had an answer; nothing is known about the job, it may be run again. */
export class PoolClosed extends Error {
  override readonly name = 'PoolClosed';

  constructor() {
    super('The pool was closed before the job was done.');
  }
}
