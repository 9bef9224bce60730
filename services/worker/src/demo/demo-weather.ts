import {
  encodeWeatherYear,
  generateSyntheticYear,
  readWeatherFile,
  syntheticPlaceSchema,
  writeEpw,
  type WeatherAccepted,
} from '@noonwell/weather';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';

/** From src and from dist alike. */
const DATASETS = join(__dirname, '..', '..', '..', '..', 'datasets', 'synthetic');

export interface DemoWeather {
  readonly name: string;
  readonly fileName: string;
  readonly file: Uint8Array;
  readonly read: WeatherAccepted;
  readonly encoded: Uint8Array;
}

/** An invented year as the file an upload would bring, marked synthetic in it, read the way an upload is. */
export function demoWeather(place: string): DemoWeather {
  const descriptor = syntheticPlaceSchema.parse(
    JSON.parse(readFileSync(join(DATASETS, `${place}.json`), 'utf8')),
  );
  const text = writeEpw(generateSyntheticYear(descriptor), {
    header: { city: descriptor.name, region: '-', country: '-', source: 'synthetic', wmo: '000000' },
    comment: descriptor.note,
  });
  const file = new TextEncoder().encode(text);
  const fileName = `${place}-synthetic.epw`;
  const read = readWeatherFile(file, fileName);
  if (read.kind === 'refused') {
    throw new Error(
      `The weather year made for ${descriptor.name} is refused: ${JSON.stringify(read.problems[0])}`,
    );
  }
  return {
    name: descriptor.name,
    fileName,
    file,
    read,
    encoded: encodeWeatherYear(read.year),
  };
}
