import type { z } from 'zod';
import { notFound, ProblemError } from './ProblemError';

/** Parameters of the path: one that cannot be a key names nothing. */
export function validParams<Schema extends z.ZodType>(schema: Schema, value: unknown): z.output<Schema> {
  const parsed = schema.safeParse(value);
  if (!parsed.success) throw notFound('record');
  return parsed.data;
}

/** Query or body; what is wrong is told field by field, the first message of each. */
export function valid<Schema extends z.ZodType>(schema: Schema, value: unknown): z.output<Schema> {
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  const fields: Record<string, string> = {};
  for (const issue of parsed.error.issues) fields[issue.path.join('.')] ??= issue.message;
  const whole = fields[''];
  delete fields[''];
  throw new ProblemError('invalid', whole ?? 'Check the marked fields.', { fields });
}
