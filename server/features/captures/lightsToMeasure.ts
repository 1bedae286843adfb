import type { MeasurementSettings, SettingsChange } from '../../../shared/contracts/measurements';
import type { LightRow } from './captureRepository';

/** A light that is to be measured, and how. */
export interface LightToMeasure {
  captureFrameId: string;
  frameId: string;
  settings: MeasurementSettings;
}

const ended = ({ state }: LightRow): boolean => state === 'measured' || state === 'refused' || state === 'failed';

/** Whether the newest run of a light has ended with fewer darks than there are now, though it was to use them. */
export function isOutdated(light: LightRow, darkCount: number): boolean {
  return !light.leftOut && ended(light) && (light.settings?.useDarks ?? true) && (light.darkCount ?? 0) < darkCount;
}

/**
 * The lights that want a run: those without one, those whose newest run used fewer darks than there are now, and those
 * whose settings are to change. Lights that are left out or under way are not among them.
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
    const wanted = !light.leftOut && (light.state === null || changes || isOutdated(light, darkCount));
    return wanted ? [{ captureFrameId: light.captureFrameId, frameId: light.frameId, settings }] : [];
  });
}
