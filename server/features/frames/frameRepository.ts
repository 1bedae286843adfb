import { Readable } from 'node:stream';
import type { LaboratoryScope } from '../../database/LaboratoryScope';
import { FrameEntity } from '../../entities/FrameEntity';
import { RenditionEntity, type RenditionKind } from '../../entities/RenditionEntity';

/** A frame that is stored, or null. */
export async function findFrame(laboratory: LaboratoryScope, frameId: string): Promise<FrameEntity | null> {
  const frame = await laboratory.findOne(FrameEntity, { where: { id: frameId } });
  return frame?.state === 'storing' ? null : frame;
}

/** The file of a frame, chunk by chunk; no connection is held between two chunks. */
export async function* readChunks(
  laboratory: LaboratoryScope,
  frameId: string,
  chunkCount: number,
): AsyncGenerator<Buffer> {
  for (let position = 0; position < chunkCount; position += 1) {
    const [row] = await laboratory.query<{ bytes: Buffer }>(
      `select chunk.bytes from frame_chunk chunk join frame on frame.id = chunk.frame_id
       where frame.laboratory_id = $1 and chunk.frame_id = $2 and chunk.position = $3`,
      [frameId, position],
    );
    if (!row) throw new Error(`Chunk ${position} of frame ${frameId} is missing.`);
    yield row.bytes;
  }
}

/** The file of a frame as a stream. */
export function streamOriginal(laboratory: LaboratoryScope, frame: FrameEntity): Readable {
  return Readable.from(readChunks(laboratory, frame.id, frame.chunkCount), { objectMode: false });
}

export interface StoredRendition {
  widthPx: number;
  heightPx: number;
  encoding: string;
  bytes: Buffer;
}

/** A rendition of a frame with its bytes, or null. */
export async function readFrameRendition(
  laboratory: LaboratoryScope,
  frameId: string,
  kind: RenditionKind,
): Promise<StoredRendition | null> {
  const [row] = await laboratory.query<StoredRendition>(
    `select width_px as "widthPx", height_px as "heightPx", encoding, bytes from rendition
     where laboratory_id = $1 and frame_id = $2 and kind = $3`,
    [frameId, kind],
  );
  return row ?? null;
}

/** Stores a rendition of a frame. */
export async function addFrameRendition(
  laboratory: LaboratoryScope,
  frameId: string,
  rendition: StoredRendition & { kind: RenditionKind },
): Promise<void> {
  await laboratory.insert(RenditionEntity, { frameId, measurementId: null, ...rendition });
}
