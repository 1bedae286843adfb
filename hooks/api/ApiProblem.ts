import { problemSchema, problemTypes, type ProblemType } from '@/shared/contracts/common';

/** `network`: no answer came; `unexpected`: an answer that the contract does not know. */
export type ProblemKind = ProblemType | 'network' | 'unexpected';

/** The one error of the API client. Decide by `kind`, never by the wording. */
export class ApiProblem extends Error {
  override readonly name = 'ApiProblem';

  constructor(
    readonly kind: ProblemKind,
    /** What is wrong and what to do, for the person. */
    message: string,
    /** Number to quote; the same stands in the server's log. Null where no answer came. */
    readonly id: string | null,
    /** What is wrong with single fields, by their dotted name. */
    readonly fields: Record<string, string>,
    /** HTTP status; null where no answer came. */
    readonly status: number | null,
  ) {
    super(message);
  }

  /** True where the same request may work later. */
  get temporary(): boolean {
    return this.kind === 'network' || this.kind === 'too-many-requests' || (this.status !== null && this.status >= 500);
  }
}

export function networkProblem(): ApiProblem {
  return new ApiProblem(
    'network',
    'No answer from the laboratory’s server. Check the network, then try again.',
    null,
    {},
    null,
  );
}

function kindOf(type: string, status: number): ProblemKind {
  const last = type.split(/[/:#]/).pop() ?? type;
  const known = problemTypes.find((kind) => kind === last);
  if (known) return known;
  if (status === 401) return 'not-signed-in';
  if (status === 403) return 'forbidden';
  if (status === 404) return 'not-found';
  return status >= 500 ? 'internal' : 'unexpected';
}

/** Turns the body of a refused request (problem details, RFC 9457) into a problem. */
export function problemFrom(status: number, bodyText: string): ApiProblem {
  let body: unknown;
  try {
    body = JSON.parse(bodyText);
  } catch {
    body = null;
  }
  const parsed = problemSchema.safeParse(body);
  if (!parsed.success) {
    return new ApiProblem(
      kindOf('', status),
      `The server answered with status ${status} and no explanation.`,
      null,
      {},
      status,
    );
  }
  const { type, title, detail, id, fields } = parsed.data;
  return new ApiProblem(kindOf(type, status), detail || title, id, fields ?? {}, status);
}
