import type { WeatherSummary } from '@noonwell/schema';
import { readWeatherFile, type WeatherHeader, type WeatherProblem } from '@noonwell/weather';

/** What the page shows before anything is sent: the server reads the file again for the truth. */
export type WeatherPreview =
  | {
      readonly kind: 'accepted';
      readonly format: string;
      readonly header: WeatherHeader;
      readonly latitudeDeg: number;
      readonly longitudeDeg: number;
      readonly altitudeM: number;
      readonly utcOffsetHours: number;
      readonly summary: WeatherSummary;
      readonly sunOffsetMinutes: number | null;
      readonly warnings: readonly string[];
    }
  | {
      readonly kind: 'refused';
      readonly problems: readonly WeatherProblem[];
      readonly problemCount: number;
    };

/** Reads a file where it is called (a worker, in the app) and leaves the hourly columns behind. */
export async function readForPreview(
  file: File,
  onProgress?: (fraction: number) => void,
): Promise<WeatherPreview> {
  const bytes = new Uint8Array(await file.arrayBuffer());
  const result = readWeatherFile(bytes, file.name, onProgress === undefined ? {} : { onProgress });
  if (result.kind === 'refused') {
    return { kind: 'refused', problems: result.problems, problemCount: result.problemCount };
  }
  const { latitudeDeg, longitudeDeg, altitudeM, utcOffsetHours } = result.year;
  const { format, header, summary, sunOffsetMinutes, warnings } = result;
  return {
    kind: 'accepted',
    format,
    header,
    latitudeDeg,
    longitudeDeg,
    altitudeM,
    utcOffsetHours,
    summary,
    sunOffsetMinutes,
    warnings,
  };
}
