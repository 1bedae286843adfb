import { endpoints } from '../../../shared/contracts/endpoints';
import type { Api } from '../../http/Api';
import { lineProfileCsv } from '../../reports/lineProfileCsv';
import type { FrameService } from './frameService';
import { isPacked, unpacked } from './unpacked';

const fileType = { tiff: 'image/tiff', png: 'image/png', jpeg: 'image/jpeg' } as const;

export function frameRoutes(api: Api, frames: FrameService): void {
  api.registerFile(endpoints.original, async ({ actor, params }) => {
    const { frame, content } = await frames.original(actor, params.frameId);
    const { sha256, byteSize, format } = frame;
    const known = format === 'tiff' || format === 'png' || format === 'jpeg' ? format : null;
    return {
      content,
      byteLength: byteSize,
      fileName: `${sha256?.slice(0, 12)}${known === null ? '' : `.${known}`}`,
      contentType: known === null ? undefined : fileType[known],
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
