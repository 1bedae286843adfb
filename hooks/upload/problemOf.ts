import { ApiProblem } from '@/hooks/api/ApiProblem';
import { UploadProblem } from './uploadProblem';

/** What a failed call means for a file on its way. */
export function problemOf(cause: unknown): UploadProblem {
  if (cause instanceof UploadProblem) return cause;
  if (!(cause instanceof ApiProblem)) return new UploadProblem('refused', 'The file cannot be read. Choose it again.');
  if (cause.kind === 'network') return new UploadProblem('network', 'No network.');
  const words =
    cause.id === null
      ? cause.message
      : cause.status !== null && cause.status >= 500
        ? `${cause.message} Number ${cause.id}.`
        : cause.message;
  return new UploadProblem(cause.temporary ? 'busy' : 'refused', words);
}
