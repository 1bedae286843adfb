import type { ProblemType } from '../../shared/contracts/common';
import { ProblemError } from '../http/ProblemError';

export interface ConstraintProblem {
  type: Extract<ProblemType, 'conflict' | 'invalid'>;
  /** Dotted name of the field of the body that broke the constraint. */
  field: string;
  message: string;
}

/**
 * Runs the work and turns the named constraints of the database, where it breaks one, into problems that a person can
 * put right. So a rule that the database keeps is not checked a second time before.
 */
export async function withConstraintProblems<Result>(
  problems: Record<string, ConstraintProblem>,
  work: () => Promise<Result>,
): Promise<Result> {
  try {
    return await work();
  } catch (error) {
    const constraint = brokenConstraint(error);
    const problem = constraint === null ? undefined : problems[constraint];
    if (problem === undefined) throw error;
    throw new ProblemError(problem.type, problem.message, {
      fields: { [problem.field]: problem.message },
      cause: error,
    });
  }
}

/** SQLSTATE class 23: integrity constraint violation. */
const INTEGRITY = /^23/;

/** Name of the constraint that a statement broke, or null for any other error. */
export function brokenConstraint(error: unknown): string | null {
  if (!(error instanceof Error) || !('driverError' in error)) return null;
  const cause: unknown = error.driverError;
  if (typeof cause !== 'object' || cause === null || !('code' in cause) || !('constraint' in cause)) return null;
  return INTEGRITY.test(String(cause.code)) && typeof cause.constraint === 'string' ? cause.constraint : null;
}
