import { useFonts as useExpoFonts } from 'expo-font';
import ArchivoWide300 from '@/assets/fonts/ArchivoWide-300.ttf';
import ArchivoWide400 from '@/assets/fonts/ArchivoWide-400.ttf';
import ArchivoWide500 from '@/assets/fonts/ArchivoWide-500.ttf';
import B612Regular from '@/assets/fonts/B612-400.ttf';
import B612Bold from '@/assets/fonts/B612-700.ttf';

/** The typefaces that ship with the application. True as soon as they are there, or cannot be had. */
export function useFonts(): boolean {
  const [loaded, error] = useExpoFonts({
    'ArchivoWide-300': ArchivoWide300,
    'ArchivoWide-400': ArchivoWide400,
    'ArchivoWide-500': ArchivoWide500,
    'B612-400': B612Regular,
    'B612-700': B612Bold,
  });
  return loaded || error !== null;
}
