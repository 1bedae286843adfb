import { endpoints } from '../../../shared/contracts/endpoints';
import type { Api } from '../../http/Api';
import { lineProfileCsv } from '../../reports/lineProfileCsv';
import type { FrameService } from './frameService';
import { isPacked, unpacked } from './unpacked';

/** Ending and content type of a file, by the first word of what the inspection found it to be (`TIFF, 16-bit`). */
const fileTypes: Record<string, { ending: string; contentType: string }> = {
  TIFF: { ending: '.tif', contentType: 'image/tiff' },
  PNG: { ending: '.png', contentType: 'image/png' },
  JPEG: { ending: '.jpg', contentType: 'image/jpeg' },
};
const unknownType = { ending: '', contentType: undefined };

export function frameRoutes(api: Api, frames: FrameService): void {
  api.registerFile(endpoints.original, async ({ actor, params }) => {
    const { frame, content } = await frames.original(actor, params.frameId);
    const { sha256, byteSize, format } = frame;
    const { ending, contentType } = fileTypes[format?.split(/[ ,]/)[0] ?? ''] ?? unknownType;
    return {
      content,
      byteLength: byteSize,
      fileName: `${sha256?.slice(0, 12)}${ending}`,
      contentType,
      etag: `${sha256}`,
      immutable: true,
    };
  });
  api.registerFile(endpoints.plane, async ({ actor, params, request }) => {
    const { frame, plane: stored } = await frames.plane(actor, params.frameId);
    const plane = request.acceptsEncodings('gzip') ? stored : await unpacked(stored);
    return {
      content: plane.bytes,
      etag: `${frame.sha256}-plane`,
      immutable: true,
      headers: {
        Vary: 'Accept-Encoding',
        ...(isPacked(plane) && { 'Content-Encoding': 'gzip' }),
        'X-Width': String(plane.widthPx),
        'X-Height': String(plane.heightPx),
        'X-Black': String(frame.blackCount ?? 0),
        'X-White': String(frame.whiteCount ?? 65_535),
      },
    };
  });
  api.registerFile(endpoints.thumbnail, async ({ actor, params, query }) => ({
    content: await frames.thumbnail(actor, params.frameId, query.wavelengthNm ?? null, query.theme),
    immutable: true,
  }));
  api.register(endpoints.lineProfile, ({ actor, params, query }) => frames.lineProfile(actor, params.frameId, query));
  api.registerFile(endpoints.lineProfileCsv, async ({ actor, params, query }) => ({
    content: lineProfileCsv(await frames.lineProfile(actor, params.frameId, query), query.pixelPitchUm ?? null),
    fileName: `line-profile-${params.frameId.slice(0, 8)}.csv`,
  }));
}
