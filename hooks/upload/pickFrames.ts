import * as DocumentPicker from 'expo-document-picker';
import * as ImagePicker from 'expo-image-picker';
import { fileSource } from './fileSource';
import type { FrameSource } from './frameSource';
import { snapName } from './snapName';

/** What choosing files came to: the files, none when it was called off, or why it cannot be done. */
export interface Picked {
  sources: FrameSource[];
  problem: string | null;
}

/** Takes one picture with the device's camera. */
export async function snapFrame(): Promise<Picked> {
  const permission = await ImagePicker.requestCameraPermissionsAsync();
  if (!permission.granted)
    return { sources: [], problem: 'The camera is not allowed. Allow it in the settings of this device.' };
  const result = await ImagePicker.launchCameraAsync({ mediaTypes: ['images'], quality: 1, exif: true });
  const assets = result.assets ?? [];
  return {
    sources: assets.map((asset) =>
      fileSource(asset.uri, snapName(new Date(), asset.fileName, asset.mimeType), asset.mimeType),
    ),
    problem: null,
  };
}

/** Chooses pictures from the device's library. */
export async function pickFromLibrary(): Promise<Picked> {
  const result = await ImagePicker.launchImageLibraryAsync({
    mediaTypes: ['images'],
    allowsMultipleSelection: true,
    quality: 1,
  });
  const assets = result.assets ?? [];
  return {
    sources: assets.map((asset, i) => fileSource(asset.uri, asset.fileName ?? `picture-${i + 1}.jpg`, asset.mimeType)),
    problem: null,
  };
}

/** Chooses files, camera stills such as 16-bit TIFF among them. */
export async function pickStills(): Promise<Picked> {
  const result = await DocumentPicker.getDocumentAsync({ type: '*/*', multiple: true, copyToCacheDirectory: true });
  const assets = result.assets ?? [];
  return { sources: assets.map((asset) => fileSource(asset.uri, asset.name, asset.mimeType)), problem: null };
}
