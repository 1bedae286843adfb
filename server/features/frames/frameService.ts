import type { Readable } from 'node:stream';
import type { z } from 'zod';
import type { LineProfile, lineProfileQuery } from '../../../shared/contracts/lineProfile';
import { lineProfile, type CountPlane } from '../../../shared/optics/lineProfile';
import type { Theme } from '../../../shared/optics/ownColour';
import type { Database } from '../../database/Database';
import { scoped, type LaboratoryScope } from '../../database/LaboratoryScope';
import type { FrameEntity } from '../../entities/FrameEntity';
import type { Actor } from '../../http/Actor';
import { found, ProblemError } from '../../http/ProblemError';
import { colourThumbnail } from './colourThumbnail';
import { findFrame, readFrameRendition, streamOriginal, type StoredRendition } from './frameRepository';
import { toCountPlane } from './toCountPlane';
import { unpacked } from './unpacked';

type LineQuery = z.output<typeof lineProfileQuery>;

/** A line may reach past the frame, but not so far that its profile is mostly empty: diagonals of the frame. */
const MAX_DIAGONALS = 2;

export type FrameService = ReturnType<typeof createFrameService>;

/** Frames as files, planes, pictures and line profiles. What a request needs was made when the frame arrived. */
export function createFrameService(database: Database) {
  async function stored(laboratory: LaboratoryScope, frameId: string): Promise<FrameEntity> {
    return found(await findFrame(laboratory, frameId), 'frame');
  }

  /** A rendition; a frame that is still being looked at, or that cannot be read, has none. */
  async function rendition(
    laboratory: LaboratoryScope,
    frameId: string,
    kind: 'plane' | 'thumbnail',
  ): Promise<StoredRendition> {
    const frame = await stored(laboratory, frameId);
    if (frame.state === 'unusable') throw new ProblemError('not-found', `There is no picture: ${frame.problem}`);
    const made = await readFrameRendition(laboratory, frameId, kind);
    if (made === null)
      throw new ProblemError('not-found', 'The frame has not been decoded yet. Try again in a moment.');
    return made;
  }

  return {
    /** The file byte for byte, as a stream. */
    async original(actor: Actor, frameId: string): Promise<{ frame: FrameEntity; content: Readable }> {
      const laboratory = scoped(database, actor.laboratoryId);
      const frame = await stored(laboratory, frameId);
      return { frame, content: streamOriginal(laboratory, frame) };
    },

    /** Decoded counts with what the viewer needs to show them; packed, if that is how they are stored. */
    async plane(actor: Actor, frameId: string): Promise<{ frame: FrameEntity; plane: StoredRendition }> {
      const laboratory = scoped(database, actor.laboratoryId);
      const frame = await stored(laboratory, frameId);
      return { frame, plane: await rendition(laboratory, frameId, 'plane') };
    },

    /** A PNG in the own colour of a wavelength. */
    async thumbnail(actor: Actor, frameId: string, wavelengthNm: number | null, theme: Theme): Promise<Buffer> {
      const tone = await rendition(scoped(database, actor.laboratoryId), frameId, 'thumbnail');
      return colourThumbnail(await unpacked(tone), wavelengthNm, theme);
    },

    async lineProfile(actor: Actor, frameId: string, query: LineQuery): Promise<LineProfile> {
      const laboratory = scoped(database, actor.laboratoryId);
      const plane = toCountPlane(await unpacked(await rendition(laboratory, frameId, 'plane')));
      requireReach(plane, query);
      return lineProfile(plane, query);
    },
  };
}

function requireReach({ widthPx, heightPx }: CountPlane, { x0, y0, x1, y1 }: LineQuery): void {
  const reachPx = MAX_DIAGONALS * Math.hypot(widthPx, heightPx);
  const fields: Record<string, string> = {};
  for (const [name, value] of Object.entries({ x0, y0, x1, y1 })) {
    if (Math.abs(value) > reachPx) fields[name] = 'The end of the line is too far outside the frame.';
  }
  if (Object.keys(fields).length > 0)
    throw new ProblemError('invalid', 'The line does not lie on the frame.', { fields });
}
