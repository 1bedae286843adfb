import * as DocumentPicker from 'expo-document-picker';
import * as ImagePicker from 'expo-image-picker';
import { FRAME_EXTENSIONS } from '@/shared/contracts/captures';
import { fileSource } from './fileSource.web';
import type { FrameSource } from './frameSource';
import { snapName } from './snapName';

/** What choosing files came to: the files, none when it was called off, or why it cannot be done. */
export interface Picked {
  sources: FrameSource[];
  problem: string | null;
}

const NO_FILE = 'The browser gave no file. Use Add stills instead.';

/** The picker has drawn each picture once to know its size; its addresses are not needed any more. */
function sourcesOf(
  assets: readonly ImagePicker.ImagePickerAsset[],
  nameOf: (asset: ImagePicker.ImagePickerAsset) => string,
): Picked {
  assets.forEach((asset) => {
    if (asset.uri.startsWith('blob:')) URL.revokeObjectURL(asset.uri);
  });
  const sources = assets.flatMap((asset) => (asset.file ? [fileSource(asset.file, nameOf(asset))] : []));
  return { sources, problem: sources.length < assets.length ? NO_FILE : null };
}

/** Takes one picture with the camera of a phone; a desk is offered its files instead. */
export async function snapFrame(): Promise<Picked> {
  const result = await ImagePicker.launchCameraAsync({ mediaTypes: ['images'], quality: 1 });
  return sourcesOf(result.assets ?? [], (asset) => snapName(new Date(), asset.file?.name, asset.mimeType));
}

/** Chooses pictures from the phone's library. */
export async function pickFromLibrary(): Promise<Picked> {
  const result = await ImagePicker.launchImageLibraryAsync({
    mediaTypes: ['images'],
    allowsMultipleSelection: true,
    quality: 1,
  });
  return sourcesOf(result.assets ?? [], (asset) => asset.file?.name ?? 'picture.jpg');
}

/** Chooses files, camera stills such as 16-bit TIFF among them. */
export async function pickStills(): Promise<Picked> {
  const result = await DocumentPicker.getDocumentAsync({
    type: ['image/*', ...FRAME_EXTENSIONS],
    multiple: true,
    base64: false,
  });
  const assets = result.assets ?? [];
  const sources = assets.flatMap((asset) => (asset.file ? [fileSource(asset.file)] : []));
  return { sources, problem: sources.length < assets.length ? NO_FILE : null };
}
