import type { CaptureFrame, FrameKind } from '@/shared/contracts/captures';
import { formatNumber, formatPercent, formatQuantity } from '@/shared/units/format';
import { refusalName } from '@/components/measurement/words/refusalWords';

/** A file on its way to the laboratory, as far as a row shows it. */
export interface SendingFile {
  id: string;
  name: string;
  kind: FrameKind;
  state:
    | 'checking'
    | 'unfit'
    | 'hashing'
    | 'hashed'
    | 'ready'
    | 'sending'
    | 'offline'
    | 'stored'
    | 'known'
    | 'failed'
    | 'cancelled';
  sha256: string | null;
  part: number;
  secondsLeft: number | null;
  problem: string | null;
}

export type CaptureRow =
  { type: 'frame'; key: string; frame: CaptureFrame } | { type: 'sending'; key: string; file: SendingFile };

const kindOf = (row: CaptureRow): FrameKind => (row.type === 'frame' ? row.frame.kind : row.file.kind);

/**
 * Rows of a capture: the frames it holds in the order in which they came, then the files that are still on their way.
 * A file that has arrived stands in one of them only.
 */
export function captureRows(frames: readonly CaptureFrame[], files: readonly SendingFile[]): CaptureRow[] {
  const held = new Set(frames.map((frame) => frame.sha256));
  const arrived = (file: SendingFile) =>
    (file.state === 'stored' || file.state === 'known') && file.sha256 !== null && held.has(file.sha256);
  return [
    ...[...frames]
      .sort((a, b) => a.createdAt.localeCompare(b.createdAt) || a.name.localeCompare(b.name, 'en', { numeric: true }))
      .map((frame): CaptureRow => ({ type: 'frame', key: frame.id, frame })),
    ...files.filter((file) => !arrived(file)).map((file): CaptureRow => ({ type: 'sending', key: file.id, file })),
  ];
}

export const lightRows = (rows: readonly CaptureRow[]): CaptureRow[] => rows.filter((row) => kindOf(row) === 'light');
export const calibrationRows = (rows: readonly CaptureRow[]): CaptureRow[] =>
  rows.filter((row) => kindOf(row) !== 'light');

/** Share of clipped pixels from which a frame is named clipped. Common practice; the engine masks what is clipped. */
const CLIPPED_FRACTION = 0.002;

export interface Attention {
  title: string;
  detail: string;
}

/** Exposure at which a clipped peak should come down to about eight tenths of full scale, when it can be told. */
function shorterExposure(frame: CaptureFrame): string {
  if (frame.exposureMs === null) return 'Shorten the exposure, or attenuate before the sensor';
  return `Set ${formatQuantity(frame.exposureMs * 0.6, 'ms', { significant: 2 })}`;
}

/** Why a frame needs a person, and what to do; null where it needs none. */
export function attentionOf(frame: CaptureFrame): Attention | null {
  if (frame.leftOut) return null;
  if (frame.state === 'unusable') {
    return { title: `${frame.name} cannot be used`, detail: frame.problem ?? 'Send it again, or take it again.' };
  }
  const { measurement, health } = frame;
  const clipped = (health?.clippedFraction ?? 0) >= CLIPPED_FRACTION;
  const share = formatPercent(health?.clippedFraction);
  if (measurement?.state === 'refused' && measurement.reason === 'clipped') {
    return { title: `${frame.name} is clipped, ${share}`, detail: `${shorterExposure(frame)}, then take it again.` };
  }
  if (measurement?.state === 'refused' || measurement?.state === 'failed') {
    return {
      title: `${frame.name}: ${refusalName(measurement.reason).toLowerCase()}`,
      detail: measurement.message ?? 'No size is given.',
    };
  }
  if (frame.kind === 'light' && clipped) {
    const detail = `${shorterExposure(frame)} and take it again, or leave it out.`;
    return { title: `${frame.name} is clipped, ${share} of the pixels`, detail };
  }
  return null;
}

/** What a file on its way is doing, in words. */
export function sendingWords(file: SendingFile): string {
  switch (file.state) {
    case 'checking':
    case 'hashed':
      return 'waits its turn';
    case 'hashing':
      return file.part > 0 ? `reading, ${formatPercent(file.part, { places: 0 })}` : 'reading';
    case 'ready':
      return 'waits its turn';
    case 'sending': {
      if (file.part >= 1) return 'sent, being stored';
      const left =
        file.secondsLeft === null ? '' : `, ${formatNumber(Math.max(1, file.secondsLeft), { places: 0 })} s left`;
      return `${formatPercent(file.part, { places: 0 })}${left}`;
    }
    case 'offline':
      return 'waits for the network';
    case 'stored':
    case 'known':
      return file.state === 'known' ? 'stored before' : 'stored';
    case 'cancelled':
      return 'called off';
    case 'unfit':
    case 'failed':
      return 'not sent';
  }
}
