import { z } from 'zod';

export const id = z.uuid();
/** A point in time as ISO 8601 text with offset. */
export const instant = z.iso.datetime({ offset: true });
/** A calendar day, `2026-03-04`. */
export const day = z.iso.date();
/** SHA-256 of a file as 64 lower-case hexadecimal digits. */
export const sha256 = z.string().regex(/^[0-9a-f]{64}$/, 'must be 64 hexadecimal digits');

/** A text that a person types: trimmed, not empty. */
export const shortText = (what: string, max = 80) =>
  z.string().trim().min(1, `Enter ${what}.`).max(max, `Keep ${what} within ${max} characters.`);
export const note = z.string().trim().max(2000, 'Keep the note within 2000 characters.');

const midSentence = (what: string) => what.charAt(0).toLowerCase() + what.slice(1);

/** A quantity that must be above zero; the message names it with its unit. */
export const positive = (what: string, unit: string, max: number) =>
  z
    .number({ error: `Enter ${midSentence(what)} in ${unit} as a number.` })
    .gt(0, `${what} must be more than 0 ${unit}.`)
    .max(max, `${what} must be at most ${max} ${unit}.`);
/** A quantity that may be zero. */
export const notNegative = (what: string, unit: string, max: number) =>
  z
    .number({ error: `Enter ${midSentence(what)} in ${unit} as a number.` })
    .min(0, `${what} cannot be negative.`)
    .max(max, `${what} must be at most ${max} ${unit}.`);

/** Problem details (RFC 9457) as this API sends them. */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string(),
  /** Number to quote; the same stands in the log. */
  id: z.string(),
  /** What is wrong with single fields, by their dotted name. */
  fields: z.record(z.string(), z.string()).optional(),
});
export type Problem = z.infer<typeof problemSchema>;

export const problemTypes = [
  'invalid',
  'not-signed-in',
  'forbidden',
  'not-found',
  'conflict',
  'too-large',
  'unsupported-format',
  'too-many-requests',
  'internal',
] as const;
export type ProblemType = (typeof problemTypes)[number];
