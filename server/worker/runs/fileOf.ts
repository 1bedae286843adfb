import type { LaboratoryScope } from '../../database/LaboratoryScope';
import { readChunks } from '../../features/frames/frameRepository';
import type { FileSource } from '../pool/warmChild';

/** A stored file on its way to a child: read from the database chunk by chunk while it is sent. */
export function fileOf(
  laboratory: LaboratoryScope,
  file: { frameId: string; byteSize: number; chunkCount: number },
): FileSource {
  return { byteLength: file.byteSize, pieces: readChunks(laboratory, file.frameId, file.chunkCount) };
}
