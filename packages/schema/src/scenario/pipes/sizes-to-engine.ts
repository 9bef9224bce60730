/** Sizes of a pipe from the document's units to the engine's. */
export function toSizes(pipe: {
  readonly lengthM: number;
  readonly boreMm: number;
  readonly wallMm: number;
  readonly insulationMm: number;
  readonly insulationConductivityWmK: number;
}) {
  return {
    lengthM: pipe.lengthM,
    boreM: pipe.boreMm / 1000,
    wallM: pipe.wallMm / 1000,
    insulationM: pipe.insulationMm / 1000,
    insulationConductivityWmK: pipe.insulationConductivityWmK,
  };
}
