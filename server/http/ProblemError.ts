import type { ProblemType } from '../../shared/contracts/common';

export const problemStatus: Record<ProblemType, number> = {
  invalid: 400,
  'not-signed-in': 401,
  forbidden: 403,
  'not-found': 404,
  conflict: 409,
  'too-large': 413,
  'unsupported-format': 415,
  'too-many-requests': 429,
  internal: 500,
};

export interface ProblemOptions {
  /** What is wrong with single fields of the body or query, by their dotted name. */
  fields?: Record<string, string>;
  cause?: unknown;
}

/** Something that the person or program that called can understand and put right. */
export class ProblemError extends Error {
  readonly status: number;
  readonly fields: Record<string, string> | undefined;

  constructor(
    readonly type: ProblemType,
    detail: string,
    options: ProblemOptions = {},
  ) {
    super(detail, { cause: options.cause });
    this.status = problemStatus[type];
    this.fields = options.fields;
  }
}

/** The same words whether a row does not exist or belongs to another laboratory. */
export const notFound = (what: string): ProblemError =>
  new ProblemError('not-found', `There is no such ${what}, or it belongs to another laboratory.`);

/** Returns the value, or throws {@link notFound}. */
export function found<Value>(value: Value | null | undefined, what: string): Value {
  if (value === null || value === undefined) throw notFound(what);
  return value;
}
