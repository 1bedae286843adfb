import type { MeasurementDetail } from '../contracts/measurements';

/** What a file of a measurement holds. */
export type CsvPart = 'radial-profile' | 'rings';

/** A name that says which aperture and which run a file is of, safe on every file system. */
export function csvFileName(
  { lotNumber, apertureSerial, id }: Pick<MeasurementDetail, 'lotNumber' | 'apertureSerial' | 'id'>,
  part: CsvPart,
): string {
  const words = [lotNumber, apertureSerial, part, id.slice(0, 8)];
  return `${words.map((word) => word.replace(/[^\p{L}\p{N}.-]+/gu, '_')).join('-')}.csv`;
}
