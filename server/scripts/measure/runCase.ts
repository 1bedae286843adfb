import { readFile, stat } from 'node:fs/promises';
import { resolve } from 'node:path';
import { measureCaseSchema } from '../../../shared/contracts/measureCase';
import { measureResultSchema, type Failed, type MeasureResult } from '../../../shared/contracts/measureResult';
import { MAX_FILE_BYTES } from '../../analysis/decode/limits';
import type { Pool } from '../../worker/pool/createPool';
import { JobFailure } from '../../worker/pool/jobFailure';
import type { MeasureJobs } from './measureJobs';

class CaseFailure extends Error {
  constructor(
    readonly reason: Failed['reason'],
    message: string,
  ) {
    super(message);
  }
}

/** Checks, reads and measures one case. Whatever is wrong with it ends as `failed`, never as an exception. */
export async function runCase(
  given: unknown,
  position: number,
  folder: string,
  pool: Pool<MeasureJobs>,
): Promise<MeasureResult> {
  const id = idOf(given, position);
  const failed = (reason: Failed['reason'], message: string): Failed => ({ id, status: 'failed', reason, message });
  const parsed = measureCaseSchema.safeParse(given);
  if (!parsed.success) {
    const issue = parsed.error.issues[0];
    const field = issue.path.join('.') || 'case';
    return failed('bad-case', `${field}: ${issue.message}`);
  }
  const measureCase = parsed.data;
  const frames = measureCase.frames ?? [measureCase.frame ?? measureCase.scan ?? ''];
  try {
    const files: Buffer[] = [];
    for (const path of [...frames, ...measureCase.darks, ...measureCase.flats])
      files.push(await read(resolve(folder, path), path));
    const sources = files.map((bytes) => ({ byteLength: bytes.byteLength, pieces: [bytes] }));
    const { answer } = await pool.run(
      'measure',
      { measureCase, frameCount: frames.length, darkCount: measureCase.darks.length },
      sources,
    );
    return measureResultSchema.parse(answer);
  } catch (error) {
    if (error instanceof CaseFailure || error instanceof JobFailure) return failed(error.reason, error.message);
    return failed('unreadable', error instanceof Error ? error.message : String(error));
  }
}

function idOf(given: unknown, position: number): string {
  const id = typeof given === 'object' && given !== null ? (given as { id?: unknown }).id : undefined;
  return typeof id === 'string' && id !== '' ? id : `case-${position + 1}`;
}

async function read(path: string, name: string): Promise<Buffer> {
  try {
    const { size } = await stat(path);
    if (size > MAX_FILE_BYTES)
      throw new CaseFailure(
        'too-large',
        `${name} is larger than ${MAX_FILE_BYTES / 1024 / 1024} MB. Send a region of the sensor around the pattern.`,
      );
    return await readFile(path);
  } catch (error) {
    if (error instanceof CaseFailure) throw error;
    throw new CaseFailure('unreadable', `${name} could not be opened. Check the path.`);
  }
}
