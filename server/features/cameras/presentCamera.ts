import type { Camera } from '../../../shared/contracts/benches';
import type { CameraEntity } from '../../entities/CameraEntity';

export function presentCamera(camera: CameraEntity): Camera {
  return {
    id: camera.id,
    name: camera.name,
    serial: camera.serial,
    pixelPitchUm: camera.pixelPitchUm,
    pixelPitchUncertaintyUm: camera.pixelPitchUncertaintyUm,
    widthPx: camera.widthPx,
    heightPx: camera.heightPx,
    bitDepth: camera.bitDepth,
    electronsPerCount: camera.electronsPerCount,
    readNoiseElectrons: camera.readNoiseElectrons,
    blackCount: camera.blackCount,
    whiteCount: camera.whiteCount,
    coverGlassMm: camera.coverGlassMm,
    coverGlassIndex: camera.coverGlassIndex,
    note: camera.note,
    createdAt: camera.createdAt.toISOString(),
  };
}
