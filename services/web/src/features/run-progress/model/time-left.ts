/** When a run was first and last seen moving; the clock is the reader's own, so no clocks are compared. */
export interface Pace {
  readonly firstProgress: number;
  readonly firstAtMs: number;
  readonly progress: number;
  readonly atMs: number;
}

/** The pace with one more sight of it. A progress that has fallen is a new attempt and starts over. */
export function observe(pace: Pace | undefined, progress: number, atMs: number): Pace {
  if (!pace || progress < pace.progress) return { firstProgress: progress, firstAtMs: atMs, progress, atMs };
  return progress === pace.progress ? pace : { ...pace, progress, atMs };
}

/** Seconds left if it goes on as it has gone; null until there is anything to judge by. */
export function secondsLeft(pace: Pace | undefined): number | null {
  if (!pace) return null;
  const done = pace.progress - pace.firstProgress;
  const tookMs = pace.atMs - pace.firstAtMs;
  if (!(done > 0) || !(tookMs > 0)) return null;
  return ((1 - pace.progress) * (tookMs / done)) / 1000;
}

/** In words that do not flicker: whole seconds up to a minute, then whole minutes. */
export function timeLeftWords(seconds: number | null): string | null {
  if (seconds === null) return null;
  if (seconds < 1) return 'about a second left';
  if (seconds < 60) return `about ${Math.ceil(seconds)} s left`;
  return `about ${Math.ceil(seconds / 60)} min left`;
}
