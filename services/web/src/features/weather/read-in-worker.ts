import { problemOfSize } from '@noonwell/weather';
import { proxy, wrap } from 'comlink';
import type { WeatherWorker } from '../../workers/weather.worker.js';
import type { WeatherPreview } from '../../workers/read-for-preview.js';

/**
 * Reads a weather file in a Web Worker, so that the page stays alive while 64 MiB are read. Each file has
 * its own worker, ended with it: a file that is dropped while another is read does not wait.
 */
export async function readInWorker(
  file: File,
  onProgress: (fraction: number) => void,
  signal: AbortSignal,
): Promise<WeatherPreview> {
  // Too large or empty is known without reading.
  const problem = problemOfSize(file.size);
  if (problem !== null) return { kind: 'refused', problems: [problem], problemCount: 1 };

  const worker = new Worker(new URL('../../workers/weather.worker.ts', import.meta.url), {
    type: 'module',
    name: 'weather reader',
  });
  const broken = new Promise<never>((_, reject) => {
    worker.addEventListener('error', (event) => {
      reject(new Error(event.message === '' ? 'the reader could not be started' : event.message));
    });
    signal.addEventListener('abort', () => {
      reject(new DOMException('The reading was cancelled.', 'AbortError'));
    });
  });
  try {
    return await Promise.race([wrap<WeatherWorker>(worker).readForPreview(file, proxy(onProgress)), broken]);
  } finally {
    worker.terminate();
  }
}
