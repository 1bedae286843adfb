import { readFileSync } from 'node:fs';
import { dirname, resolve } from 'node:path';
import { parseArgs } from 'node:util';

/** The command was called wrongly: nothing is measured, the exit status is 2. */
export class UsageError extends Error {
  override readonly name = 'UsageError';
}

export const USAGE = `Measures apertures from the frames of a sensor; prints one JSON object a line for each case.

  npm run --silent measure -- --manifest cases.json
  npm run --silent measure -- --frame f.tif --pattern pinhole --wavelength-nm 632.8 --distance-mm 500 --pixel-pitch-um 5.2

A manifest is {"cases": [{"id": …, "frame": …, …}]}; paths in it are relative to it. Flags of a single case are the
fields of a case in kebab case; inner fields follow a dot (--camera.bit-depth 12, --uncertainty.distance-mm 0.25,
--illumination.kind gaussian). --dark, --flat and --frames may be given more than once.`;

/** Text fields of a case and of what is inside it; all others are numbers. */
const TEXTS = new Set([
  'id',
  'frame',
  'scan',
  'pattern',
  'mosaic',
  'encoding',
  'illumination.kind',
  'raw.byteOrder',
  'raw.packing',
]);
const NUMBERS = [
  'wavelengthNm',
  'distanceMm',
  'pixelPitchUm',
  'nominalSizeUm',
  'detectorApertureMm',
  'chordOffsetMm',
  'uncertainty.wavelengthNm',
  'uncertainty.distanceMm',
  'uncertainty.pixelPitchUm',
  'illumination.sourceDistanceMm',
  'illumination.beamRadiusUm',
  'camera.bitDepth',
  'camera.electronsPerCount',
  'camera.readNoiseElectrons',
  'camera.blackCount',
  'camera.whiteCount',
  'camera.coverGlassMm',
  'camera.coverGlassIndex',
  'raw.width',
  'raw.height',
  'raw.bitsPerSample',
  'raw.offsetBytes',
];
const LISTS: Record<string, string> = {
  dark: 'darks',
  darks: 'darks',
  flat: 'flats',
  flats: 'flats',
  frames: 'frames',
};

export interface CaseList {
  /** As they were given, not yet checked. */
  cases: unknown[];
  /** Folder that the paths are relative to. */
  folder: string;
}

const kebab = (name: string) => name.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`);

/**
 * The cases that the command line asks for.
 * @throws UsageError when it cannot be understood
 */
export function readCases(argv: string[]): CaseList {
  const fields = [...TEXTS, ...NUMBERS];
  const options: Record<string, { type: 'string' | 'boolean'; multiple?: boolean }> = {
    manifest: { type: 'string' },
    help: { type: 'boolean' },
  };
  for (const field of fields) options[kebab(field)] = { type: 'string' };
  for (const list of Object.keys(LISTS)) options[list] = { type: 'string', multiple: true };
  let values: Record<string, string | boolean | (string | boolean)[] | undefined>;
  try {
    ({ values } = parseArgs({ args: argv, options, strict: true, allowPositionals: false }));
  } catch (error) {
    throw new UsageError(error instanceof Error ? error.message : String(error));
  }
  if (values.help === true) throw new UsageError('');
  const given = Object.keys(values).filter((name) => name !== 'manifest');
  if (typeof values.manifest === 'string') {
    if (given.length > 0) throw new UsageError(`--manifest stands alone; --${given[0]} belongs into the manifest.`);
    return readManifest(values.manifest);
  }
  if (given.length === 0) throw new UsageError('Nothing to measure: give --manifest or --frame.');
  const single: Record<string, unknown> = {};
  for (const field of fields) {
    const text = values[kebab(field)];
    if (typeof text !== 'string') continue;
    const value = TEXTS.has(field) ? text : Number(text);
    if (typeof value === 'number' && (text.trim() === '' || !Number.isFinite(value)))
      throw new UsageError(`--${kebab(field)} needs a number, not “${text}”.`);
    const [outer, inner] = field.split('.') as [string, string | undefined];
    if (inner === undefined) single[outer] = value;
    else single[outer] = { ...(single[outer] as object | undefined), [inner]: value };
  }
  for (const [flag, field] of Object.entries(LISTS)) {
    const list = values[flag];
    if (Array.isArray(list)) single[field] = [...((single[field] as string[] | undefined) ?? []), ...list];
  }
  single.id ??= typeof single.frame === 'string' ? single.frame : 'frame';
  return { cases: [single], folder: process.cwd() };
}

function readManifest(path: string): CaseList {
  let content: unknown;
  try {
    content = JSON.parse(readFileSync(path, 'utf8'));
  } catch (error) {
    const why = error instanceof Error ? error.message : String(error);
    throw new UsageError(`The manifest ${path} could not be read: ${why}`);
  }
  const cases = typeof content === 'object' && content !== null ? (content as { cases?: unknown }).cases : undefined;
  if (!Array.isArray(cases)) throw new UsageError(`The manifest ${path} holds no list “cases”.`);
  return { cases, folder: dirname(resolve(path)) };
}
