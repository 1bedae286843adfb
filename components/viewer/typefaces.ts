import { Skia, type SkTypeface } from '@shopify/react-native-skia';
import { Asset } from 'expo-asset';
import text400 from '@/assets/fonts/B612-400.ttf';
import text700 from '@/assets/fonts/B612-700.ttf';

export interface Typefaces {
  regular: SkTypeface;
  bold: SkTypeface;
}

let loading: Promise<Typefaces> | undefined;

/** The text face in its two weights, fetched from this site once for all drawings and kept. */
export function loadTypefaces(): Promise<Typefaces> {
  loading ??= Promise.all([fetchTypeface(text400), fetchTypeface(text700)])
    .then(([regular, bold]) => ({ regular, bold }))
    .catch((error: unknown) => {
      loading = undefined;
      throw error;
    });
  return loading;
}

async function fetchTypeface(module: number): Promise<SkTypeface> {
  const data = await Skia.Data.fromURI(Asset.fromModule(module).uri);
  const face = Skia.Typeface.MakeFreeTypeFaceFromData(data);
  if (!face) throw new Error('The text face could not be read.');
  return face;
}
