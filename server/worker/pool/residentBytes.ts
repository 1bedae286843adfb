import { readFile } from 'node:fs/promises';

const PAGE_BYTES = 4096;

/**
 * Memory that a process holds now (resident set), bytes, from Linux's /proc/PID/statm; null when the process has
 * ended or the system has no such file.
 */
export async function residentBytes(pid: number): Promise<number | null> {
  try {
    const pages = (await readFile(`/proc/${pid}/statm`, 'latin1')).split(' ')[1];
    return Number(pages) * PAGE_BYTES;
  } catch {
    return null;
  }
}
