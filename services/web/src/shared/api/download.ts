import type { RouteKey } from '@noonwell/schema';
import { requestRaw, type RouteCall } from './client.js';

type FileRoute = Extract<RouteKey, `GET ${string}/export` | `GET ${string}/original`>;

/** Fetches a file with the bearer header and hands it to the browser to save, byte for byte. */
export async function download(
  route: FileRoute,
  call: RouteCall<FileRoute>,
  fileName: string,
): Promise<void> {
  const response = await requestRaw(route, { ...call, headers: { accept: '*/*' } });
  saveBlob(await response.blob(), fileName);
}

/** Hands bytes made in the page to the browser to save. */
export function saveBlob(blob: Blob, fileName: string): void {
  const url = URL.createObjectURL(blob);
  const link = document.createElement('a');
  link.href = url;
  link.download = fileName;
  link.click();
  // The click has started the saving; the address is freed when that task is over.
  setTimeout(() => {
    URL.revokeObjectURL(url);
  }, 0);
}
