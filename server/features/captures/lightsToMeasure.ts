import type { MeasurementSettings, SettingsChange } from '../../../shared/contracts/measurements';
import type { LightRow } from './captureRepository';

/** A light that is to be measured, and how. */
export interface LightToMeasure {
  captureFrameId: string;
  frameId: string;
  settings: MeasurementSettings;
}

const ended = ({ state }: LightRow): boolean => state === 'measured' || state === 'refused' || state === 'failed';

const canBeMeasured = ({ leftOut, frameState }: LightRow): boolean => !leftOut && frameState !== 'unusable';

/** Whether the newest run of a light has ended with fewer darks than there are now, though it was to use them. */
export function isOutdated(light: LightRow, darkCount: number): boolean {
  const usesDarks = light.settings?.useDarks ?? true;
  return canBeMeasured(light) && ended(light) && usesDarks && (light.darkCount ?? 0) < darkCount;
}

/**
 * Whether a light has no run that says anything of it: it has none at all, or when its run began the frame was no light
 * or did not fit its darks and flats.
 */
export function wantsFirstRun(light: LightRow): boolean {
  return canBeMeasured(light) && (light.state === null || light.reason === 'bad-case');
}

/**
 * The lights that want a run: those without one, those whose newest run used fewer darks than there are now, and those
 * whose settings are to change. Lights that are left out, cannot be read or are under way are not among them.
 */
export function lightsToMeasure(
  lights: readonly LightRow[],
  darkCount: number,
  defaults: MeasurementSettings,
  change: SettingsChange,
): LightToMeasure[] {
  return lights.flatMap((light) => {
    const before = light.settings ?? defaults;
    const settings = { ...before, ...change };
    const keys = Object.keys(settings) as (keyof MeasurementSettings)[];
    const changes = ended(light) && keys.some((key) => settings[key] !== before[key]);
    const wanted = canBeMeasured(light) && (wantsFirstRun(light) || changes || isOutdated(light, darkCount));
    return wanted ? [{ captureFrameId: light.captureFrameId, frameId: light.frameId, settings }] : [];
  });
}
