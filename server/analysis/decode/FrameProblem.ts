import type { FailureReason } from '../../../shared/contracts/measureResult';

/** Why a file cannot be used as a frame. The message says what is wrong and what to send instead. */
export class FrameProblem extends Error {
  readonly reason: Extract<FailureReason, 'unreadable' | 'unsupported' | 'too-large' | 'bad-case'>;

  constructor(reason: FrameProblem['reason'], message: string) {
    super(message);
    this.name = 'FrameProblem';
    this.reason = reason;
  }
}
