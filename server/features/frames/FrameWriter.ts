import { createHash, randomUUID } from 'node:crypto';
import type { Transaction } from '../../database/Database';
import { scoped, type LaboratoryScope } from '../../database/LaboratoryScope';
import { CHUNK_BYTES } from '../../entities/FrameChunkEntity';
import { FrameEntity } from '../../entities/FrameEntity';

/** A file whose bytes are in the database, and its name by content. */
export interface WrittenFrame {
  frameId: string;
  sha256: string;
  byteSize: number;
  /** False when the laboratory held the same bytes already. */
  isNew: boolean;
}

/**
 * Writes a file into frame_chunk while it arrives, within the given transaction, and hashes it on the
 * way. Never more than one chunk is held. Nothing counts until the transaction commits.
 */
export class FrameWriter {
  private readonly frameId = randomUUID();
  private readonly hash = createHash('sha256');
  private chunk = Buffer.allocUnsafe(CHUNK_BYTES);
  private filled = 0;
  private chunkCount = 0;
  private byteSize = 0;

  private readonly laboratory: LaboratoryScope;

  constructor(
    private readonly transaction: Transaction,
    laboratoryId: string,
  ) {
    this.laboratory = scoped(transaction, laboratoryId);
  }

  /** Opens the row that the chunks belong to. */
  async begin(): Promise<void> {
    await this.laboratory.insert(FrameEntity, { id: this.frameId, state: 'storing' });
  }

  async write(piece: Buffer): Promise<void> {
    this.hash.update(piece);
    this.byteSize += piece.length;
    for (let taken = 0; taken < piece.length;) {
      const copied = piece.copy(this.chunk, this.filled, taken);
      taken += copied;
      this.filled += copied;
      if (this.filled === CHUNK_BYTES) await this.flush();
    }
  }

  /**
   * Ends the file: the frame is `stored` under its hash, or, where the laboratory holds the same bytes already, the
   * earlier frame is taken and the new chunks go. Two transactions that end the same file at once do so one after
   * the other.
   */
  async finish(): Promise<WrittenFrame> {
    if (this.filled > 0) await this.flush();
    const sha256 = this.hash.digest('hex');
    const { transaction, laboratory, byteSize } = this;
    const lock = `frame ${laboratory.laboratoryId} ${sha256}`;
    await transaction.query('select pg_advisory_xact_lock(hashtextextended($1, 0))', [lock]);
    const held = await laboratory.findOne(FrameEntity, { where: { sha256 } });
    if (held) {
      await laboratory.delete(FrameEntity, { id: this.frameId });
      return { frameId: held.id, sha256, byteSize, isNew: false };
    }
    const stored = { sha256, byteSize, chunkCount: this.chunkCount, state: 'stored' } as const;
    await laboratory.update(FrameEntity, { id: this.frameId }, stored);
    return { frameId: this.frameId, sha256, byteSize, isNew: true };
  }

  private async flush(): Promise<void> {
    await this.transaction.query('insert into frame_chunk (frame_id, position, bytes) values ($1, $2, $3)', [
      this.frameId,
      this.chunkCount,
      this.chunk.subarray(0, this.filled),
    ]);
    this.chunkCount += 1;
    this.filled = 0;
  }
}
