import { createContext, useCallback, useContext, useEffect, useMemo, useState, type ReactNode } from 'react';
import { readChoice, writeChoice } from './deviceStore';

export type ThemeName = 'dark' | 'light';

/** The bench whose laser lights the screen. */
export interface BenchLight {
  /** In air; null: no bench, no hue. */
  wavelengthNm: number | null;
  /** Stands beside the wavelength rule on a phone, for example “Bench 2”. */
  label: string | null;
}
const noLight: BenchLight = { wavelengthNm: null, label: null };

interface ThemeState {
  theme: ThemeName;
  setTheme: (theme: ThemeName) => void;
  light: BenchLight;
  setLight: (light: BenchLight) => void;
}

const ThemeContext = createContext<ThemeState>({
  theme: 'dark',
  setTheme: () => undefined,
  light: noLight,
  setLight: () => undefined,
});

/** Keeps the theme of this device (dark unless chosen otherwise) and the light of the screen shown. */
export function ThemeProvider({ children }: { children: ReactNode }) {
  const [theme, setThemeState] = useState<ThemeName>(() => (readChoice('theme') === 'light' ? 'light' : 'dark'));
  const [light, setLightState] = useState<BenchLight>(noLight);
  const setTheme = useCallback((next: ThemeName) => {
    writeChoice('theme', next);
    setThemeState(next);
  }, []);
  const setLight = useCallback((next: BenchLight) => {
    setLightState((now) => (now.wavelengthNm === next.wavelengthNm && now.label === next.label ? now : next));
  }, []);
  const state = useMemo(() => ({ theme, setTheme, light, setLight }), [theme, setTheme, light, setLight]);
  return <ThemeContext.Provider value={state}>{children}</ThemeContext.Provider>;
}

export function useThemeState(): ThemeState {
  return useContext(ThemeContext);
}

/** Lights the shell with a bench's laser as long as the screen is shown. */
export function useBenchLight(wavelengthNm: number | null, label: string | null): void {
  const { setLight } = useThemeState();
  useEffect(() => {
    setLight({ wavelengthNm, label });
  }, [wavelengthNm, label, setLight]);
  useEffect(() => () => setLight(noLight), [setLight]);
}
