import { formatFixed } from './number.js';

/** "34.85° N, 116.80° W" */
export function formatCoordinates(latitudeDeg: number, longitudeDeg: number): string {
  const latitude = `${formatFixed(Math.abs(latitudeDeg), 2)}°\u00a0${latitudeDeg < 0 ? 'S' : 'N'}`;
  const longitude = `${formatFixed(Math.abs(longitudeDeg), 2)}°\u00a0${longitudeDeg < 0 ? 'W' : 'E'}`;
  return `${latitude}, ${longitude}`;
}

/** "UTC−8", "UTC+5:30" */
export function formatUtcOffset(hours: number): string {
  const size = Math.abs(hours);
  const minutes = Math.round((size % 1) * 60);
  const sign = hours < 0 ? '\u2212' : '+';
  return `UTC${sign}${Math.trunc(size)}${minutes === 0 ? '' : `:${String(minutes).padStart(2, '0')}`}`;
}

/** "1.72 MB" (decimal, as file managers show it) */
export function formatBytes(bytes: number): string {
  if (bytes < 1000) return `${formatFixed(bytes)}\u00a0B`;
  if (bytes < 1e6) return `${formatFixed(bytes / 1e3, 0)}\u00a0kB`;
  return `${formatFixed(bytes / 1e6, 2)}\u00a0MB`;
}
